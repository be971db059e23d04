import { describe, expect, it } from "vitest";
import { and, count, eq, gt } from "drizzle-orm";
import {
  auditEntries,
  baselines,
  indicators,
  signals,
  tallies,
  tallyRevisions,
  wardReturns,
  wards,
} from "@/db/schema";
import { seedDemo } from "@/lib/demo/seed";
import { addMonths, asMonth, dateInZone } from "@/lib/indicators/month";
import { systemActor } from "@/lib/policy";
import { verifyChain } from "@/lib/services/audit";
import { PGlite } from "@electric-sql/pglite";
import { wrapEmbedded } from "@/db/client";
import { uuidv7 } from "uuidv7";
import { makeDataFolder } from "../../support/sheets";

/** The first hour of a month, the last day of a quarter, and a leap day. */
const days = ["2026-12-01T00:30:00Z", "2027-03-31T12:00:00Z", "2028-02-29T12:00:00Z"];

describe("the invented hospital", () => {
  it.each(days)("is told up to the month before %s, and once only", async (day) => {
    const dropFolder = await makeDataFolder();
    const store = await wrapEmbedded(await PGlite.create());
    const { db } = store;
    const now = new Date(day);
    try {
      await seedDemo({ db, now });
      const last = addMonths(asMonth(day.slice(0, 7)), -1);
      const returns = await db.select().from(wardReturns);
      expect(
        returns
          .map((row) => row.month)
          .sort()
          .at(-1),
      ).toBe(last);
      expect(returns.map((row) => row.month).sort()[0]).toBe(addMonths(last, -35));
      expect(await db.$count(wards)).toBe(14);
      expect(await db.$count(indicators)).toBe(12);

      // Nothing happened after now, and something of every kind happened.
      expect(await db.$count(tallyRevisions, gt(tallyRevisions.at, now))).toBe(0);
      expect(await db.$count(auditEntries, gt(auditEntries.at, now))).toBe(0);
      expect(returns.filter((row) => row.status === "open")).toHaveLength(1);
      const isLate = ({ firstSubmittedAt, dueOn }: (typeof returns)[number]) =>
        firstSubmittedAt !== null && dateInZone(firstSubmittedAt, "Europe/London") > dueOn;
      expect(returns.filter(isLate)).toHaveLength(1);
      expect(await db.$count(tallies, eq(tallies.corrected, true))).toBe(1);
      expect(await db.$count(signals, eq(signals.withdrawnWhy, "correction"))).toBeGreaterThan(0);
      expect(await db.$count(signals, eq(signals.status, "new"))).toBeGreaterThan(5);
      const later = await db
        .select()
        .from(baselines)
        .where(and(eq(baselines.state, "decided")));
      const proposed = later.filter((baseline) => baseline.appliesFrom !== null);
      expect(proposed).toHaveLength(1);
      expect(proposed[0]?.decidedBy).not.toBe(proposed[0]?.proposedBy);
      const ctx = { actor: systemActor("test"), db, now, requestId: uuidv7() };
      expect(await verifyChain({ ctx })).toMatchObject({ intact: true });

      const entries = await db.select({ entries: count() }).from(auditEntries);
      await seedDemo({ db, now });
      expect(await db.select({ entries: count() }).from(auditEntries)).toEqual(entries);
    } finally {
      await store.close();
      await dropFolder();
    }
  });
}, 300_000);
