import { readFile } from "node:fs/promises";
import { PGlite } from "@electric-sql/pglite";
import { Client } from "pg";
import { uuidv7 } from "uuidv7";
import { openServer, wrapEmbedded, type Store } from "@/db/client";
import { assignments, hospital, indicatorDefinitions, indicators, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { asMonth, type Month } from "@/lib/indicators/month";
import { defaultRules } from "@/lib/indicators/vocabulary";
import type { Actor, PersonActor } from "@/lib/policy";
import { person } from "./actors";
import { imagePath, makeImage } from "./image";

/** The instant at which tests happen unless they say otherwise. */
export const TEST_NOW = new Date("2026-12-07T09:00:00.000Z");

type IndicatorInput = Partial<typeof indicators.$inferInsert> & {
  numeratorLabel?: string;
  denominatorLabel?: string;
};

/**
 * A hospital of its own for one suite, on a copy of the migrated embedded image, or on a database of its own where
 * TEST_DATABASE_URL names a PostgreSQL server.
 */
export async function makeTestStore() {
  const opened = process.env.TEST_DATABASE_URL
    ? await openOnServer(process.env.TEST_DATABASE_URL)
    : await openEmbeddedCopy();
  const { db } = opened.store;
  await db
    .insert(hospital)
    .values({ id: 1, name: "Test hospital", timeZone: "UTC", dueDay: 7, holidays: [] });

  const lead = person("quality_lead", "Test lead");
  const secondLead = person("quality_lead", "Second lead");
  const infection = person("infection_control", "Test infection control");
  const board = person("board_member", "Test board");
  const nurseOf = (...wardIds: string[]): PersonActor => person("ward_nurse", "Test nurse", wardIds);
  const ctxFor = (actor: Actor, at: Date = TEST_NOW): Ctx => ({ actor, db, now: at, requestId: uuidv7() });

  async function addWard(code: string, values: Partial<typeof wards.$inferInsert> = {}) {
    const row = {
      id: uuidv7(),
      code,
      name: `${code} ward`,
      division: "Medicine",
      openFrom: asMonth("2020-01"),
      ...values,
    };
    const [ward] = await db.insert(wards).values(row).returning();
    if (!ward) throw new Error("no ward was made");
    return ward;
  }

  async function addIndicator(code: string, values: IndicatorInput = {}) {
    const { numeratorLabel = "Events", denominatorLabel = "Discharges", ...rest } = values;
    const [indicator] = await db
      .insert(indicators)
      .values({
        id: uuidv7(),
        code,
        name: `${code} indicator`,
        kind: "proportion",
        per: 100,
        betterWhen: "lower",
        team: "quality",
        rules: defaultRules,
        ...rest,
      })
      .returning();
    if (!indicator) throw new Error("no indicator was made");
    await db.insert(indicatorDefinitions).values({
      id: uuidv7(),
      indicatorId: indicator.id,
      number: 1,
      effectiveFrom: asMonth("1990-01"),
      numeratorLabel,
      denominatorLabel,
      comparable: true,
      reason: "First definition",
      decidedBy: "Test lead",
      decidedAt: TEST_NOW,
    });
    return indicator;
  }

  async function assign(wardId: string, indicatorId: string, from = "2020-01", to: Month | null = null) {
    await db
      .insert(assignments)
      .values({ id: uuidv7(), wardId, indicatorId, fromMonth: asMonth(from), toMonth: to });
  }

  return {
    ...opened.store,
    lead,
    secondLead,
    infection,
    board,
    nurseOf,
    ctxFor,
    addWard,
    addIndicator,
    assign,
    close: opened.close,
  };
}

export type TestStore = Awaited<ReturnType<typeof makeTestStore>>;

async function openEmbeddedCopy(): Promise<{ store: Store; close: () => Promise<void> }> {
  await makeImage();
  const image = new Blob([new Uint8Array(await readFile(await imagePath()))]);
  const store = await wrapEmbedded(await PGlite.create({ loadDataDir: image }));
  return { store, close: store.close };
}

async function openOnServer(url: string): Promise<{ store: Store; close: () => Promise<void> }> {
  const name = `test_${uuidv7().replaceAll("-", "")}`;
  await onServer(url, `create database ${name}`);
  const own = new URL(url);
  own.pathname = `/${name}`;
  const store = await openServer(own.toString());
  const close = async () => {
    await store.close();
    await onServer(url, `drop database ${name} with (force)`);
  };
  return { store, close };
}

async function onServer(url: string, statement: string): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  await client.query(statement);
  await client.end();
}
