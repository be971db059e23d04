import { and, asc, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { uuidv7 } from "uuidv7";
import {
  assignments,
  indicatorDefinitions,
  indicators,
  seriesState,
  signalHistory,
  signals,
  tallies,
} from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { lastDueMonth, reevaluateSeries, type SeriesKey } from "@/lib/services/series";
import { auditRows } from "@/tests/support/audit";
import {
  chartCounts,
  chartOf,
  correctMonth,
  newSeries,
  on,
  reevaluate,
  steadyCounts,
} from "@/tests/support/series";
import { makeTestStore, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

async function signalsOf({ wardId, indicatorId }: SeriesKey) {
  return store.db
    .select()
    .from(signals)
    .where(and(eq(signals.wardId, wardId), eq(signals.indicatorId, indicatorId)))
    .orderBy(asc(signals.bornAt), asc(signals.id));
}

async function stateOf({ wardId, indicatorId }: SeriesKey) {
  const [row] = await store.db
    .select()
    .from(seriesState)
    .where(and(eq(seriesState.wardId, wardId), eq(seriesState.indicatorId, indicatorId)));
  return row;
}

describe("the life of a signal", () => {
  it("is born with a sending, and withdrawn with its reason when a correction takes its evidence", async () => {
    const key = await newSeries(store, "BORN");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], on("2026-02-05"));
    expect(await signalsOf(key)).toMatchObject([
      {
        rule: "beyond-action",
        side: "upper",
        towards: "adverse",
        status: "new",
        fromMonth: "2026-01",
        onNewest: true,
      },
    ]);

    const changes = await correctMonth(store, key, "2026-01", [10, 100], on("2026-03-01"));
    expect(changes).toMatchObject({ withdrawn: 1, born: 0 });
    const [gone] = await signalsOf(key);
    expect(gone).toMatchObject({ status: "withdrawn", withdrawnWhy: "correction", version: 2 });

    await correctMonth(store, key, "2026-01", [30, 100], on("2026-03-02"));
    const back = await signalsOf(key);
    expect(back).toMatchObject([{ id: gone?.id, status: "new", withdrawnWhy: null, version: 3 }]);

    const history = await store.db
      .select()
      .from(signalHistory)
      .where(eq(signalHistory.signalId, gone?.id ?? ""))
      .orderBy(asc(signalHistory.at));
    expect(history.map((each) => each.change)).toEqual(["born", "withdrawn", "came-back"]);
  });

  it("is noted in the audit with why", async () => {
    const entries = (await auditRows(store.db)).filter((each) => each.action === "signal.change");
    expect(entries.at(-1)?.after).toMatchObject({ cameBack: 1, why: "correction", series: 1 });
  });

  it("grows as one run, and says when it spans a month without a point", async () => {
    const key = await newSeries(store, "GROWS");
    await chartCounts(
      store,
      key,
      "2023-01",
      [...steadyCounts, ...steadyCounts.slice(0, 1)],
      on("2025-02-05"),
    );
    const low = Array.from({ length: 8 }, () => [7, 100] as const);
    await chartCounts(store, key, "2025-02", low, on("2025-10-05"));
    const [run] = await signalsOf(key);
    expect(run).toMatchObject({ rule: "one-side", side: "lower", towards: "favourable", spansGap: false });
    expect([run?.fromMonth, run?.toMonth]).toEqual(["2025-01", "2025-09"]);

    await chartCounts(store, key, "2025-11", [[7, 100]], on("2025-12-05"));
    const grown = await signalsOf(key);
    expect(grown).toHaveLength(1);
    expect(grown[0]).toMatchObject({ id: run?.id, toMonth: "2025-11", spansGap: true, version: 2 });
  });

  it("keeps the elder when two merge", async () => {
    const key = await newSeries(store, "MERGE", { rules: [{ name: "beyond-action" }] });
    await chartCounts(
      store,
      key,
      "2023-01",
      [...steadyCounts, ...steadyCounts.slice(0, 1), [30, 100], [10, 100]],
      on("2025-04-05"),
    );
    await chartCounts(store, key, "2025-04", [[30, 100]], on("2025-05-05"));
    const [elder, younger] = await signalsOf(key);
    expect([elder?.fromMonth, younger?.fromMonth]).toEqual(["2025-02", "2025-04"]);
    await correctMonth(store, key, "2025-03", [30, 100], on("2025-06-05"));
    expect(await signalsOf(key)).toMatchObject([
      { id: elder?.id, fromMonth: "2025-02", toMonth: "2025-04", status: "new" },
      { id: younger?.id, status: "withdrawn" },
    ]);
  });

  it("takes the other direction when the indicator's better one changes", async () => {
    const key = await newSeries(store, "TURNS");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], on("2026-02-05"));
    await store.db.update(indicators).set({ betterWhen: "higher" }).where(eq(indicators.id, key.indicatorId));
    await reevaluate(store, key, on("2026-03-05"), "rules");
    expect(await signalsOf(key)).toMatchObject([{ status: "new", towards: "favourable", version: 2 }]);
  });

  it("isn't called newest when a correction brings it to light on an older month", async () => {
    const key = await newSeries(store, "OLDER");
    await chartCounts(store, key, "2024-01", steadyCounts, on("2026-01-05"));
    await correctMonth(store, key, "2025-06", [35, 100], on("2026-02-05"));
    expect(await signalsOf(key)).toMatchObject([{ fromMonth: "2025-06", onNewest: false }]);
  });

  it("leaves nothing behind when the transaction that touched it fails", async () => {
    const key = await newSeries(store, "FAILS");
    await chartCounts(store, key, "2024-01", steadyCounts, on("2026-01-05"));
    const before = await stateOf(key);
    await expect(
      store.db.transaction(async (db) => {
        const tx = { ...store.ctxFor(store.lead), db, audit: [] };
        await db.update(tallies).set({ chartedNumerator: 50 }).where(eq(tallies.wardId, key.wardId));
        await reevaluateSeries(tx, { pairs: [key], why: "correction" });
        throw new Error("the rest failed");
      }),
    ).rejects.toThrow("the rest failed");
    expect(await stateOf(key)).toEqual(before);
    expect(await signalsOf(key)).toEqual([]);
  });
});

describe("as known on a day", () => {
  it("draws a chart before and after a correction, signals included", async () => {
    const key = await newSeries(store, "KNOWN");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], on("2026-02-05"));
    await correctMonth(store, key, "2026-01", [10, 100], on("2026-03-10"));

    const now = await chartOf(store, "KNOWN");
    expect(now.points[24]).toMatchObject({ numerator: 10, beyond: null, corrected: true });
    expect(now.signals).toEqual([]);
    const then = await chartOf(store, "KNOWN", { asOf: "2026-03-09" });
    expect(then.points[24]).toMatchObject({ numerator: 30, beyond: "upper", corrected: false });
    expect(then.signals).toMatchObject([{ rule: "beyond-action", status: "new", withdrawnWhy: null }]);
    expect(then.signals[0]?.id).toBe((await signalsOf(key))[0]?.id);
    expect((await chartOf(store, "KNOWN", { asOf: "2026-03-10" })).points[24]).toMatchObject({
      numerator: 10,
    });
    expect((await chartOf(store, "KNOWN", { asOf: "2026-02-04" })).points).toEqual([]);
  });

  it("leaves out a definition that was decided later", async () => {
    const key = await newSeries(store, "REDEFINED");
    await chartCounts(store, key, "2024-01", steadyCounts, on("2026-01-05"));
    await addDefinition(key, "2025-01", on("2026-02-05"));
    expect((await chartOf(store, "REDEFINED")).segments).toHaveLength(2);
    expect((await chartOf(store, "REDEFINED", { asOf: "2026-02-04" })).segments).toHaveLength(1);
  });
});

describe("a definition that can't be compared", () => {
  it("ends runs and begins new trial limits", async () => {
    const key = await newSeries(store, "CUT");
    const low = Array.from({ length: 10 }, () => [4, 100] as const);
    await chartCounts(store, key, "2023-01", [...steadyCounts, ...low], on("2025-11-05"));
    expect((await signalsOf(key)).map((each) => each.rule)).toContain("one-side");

    await addDefinition(key, "2025-01", on("2025-12-05"));
    await reevaluate(store, key, on("2025-12-05"), "definition");
    const all = await signalsOf(key);
    expect(all.every((each) => each.status === "withdrawn" && each.withdrawnWhy === "definition")).toBe(true);
    const chart = await chartOf(store, "CUT");
    expect(chart.segments).toMatchObject([
      { begins: "first", centre: 0.1, baseline: { status: "trial", to: "2024-12" } },
      { begins: "definition", from: "2025-01", centre: 0.04, baseline: { status: "trial", from: "2025-01" } },
    ]);
    expect(chart.centre).toBe(0.04);
  });
});

describe("which months a chart goes up to", () => {
  it("shows a month as missing only once its return is due", () => {
    expect(lastDueMonth("2026-12-07", 7, [])).toBe("2026-10");
    expect(lastDueMonth("2026-12-08", 7, [])).toBe("2026-11");
    // The 7th is a Sunday and the 8th a holiday: due on the 9th.
    expect(lastDueMonth("2026-06-09", 7, ["2026-06-08"])).toBe("2026-04");
    expect(lastDueMonth("2026-06-10", 7, ["2026-06-08"])).toBe("2026-05");
  });

  it("ends where the ward stopped reporting", async () => {
    const key = await newSeries(store, "ENDED");
    await chartCounts(store, key, "2026-01", steadyCounts.slice(0, 3), on("2026-04-05"));
    expect((await chartOf(store, "ENDED")).points.at(-1)?.month).toBe("2026-10");
    await store.db
      .update(assignments)
      .set({ toMonth: asMonth("2026-05") })
      .where(eq(assignments.wardId, key.wardId));
    expect((await chartOf(store, "ENDED")).points.map((each) => each.state)).toEqual([
      ...["counted", "counted", "counted", "missing", "missing"],
    ]);
  });
});

async function addDefinition({ indicatorId }: SeriesKey, from: string, decidedAt: Date): Promise<void> {
  await store.db.insert(indicatorDefinitions).values({
    id: uuidv7(),
    indicatorId,
    number: 2,
    effectiveFrom: asMonth(from),
    numeratorLabel: "Events, counted otherwise",
    denominatorLabel: "Discharges",
    comparable: false,
    reason: "Another way of counting",
    decidedBy: "Test lead",
    decidedAt,
  });
}
