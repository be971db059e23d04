import { and, asc, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { seriesState, signals } from "@/db/schema";
import { systemActor } from "@/lib/policy";
import {
  columnsOf,
  evaluateFacts,
  loadSeries,
  rebuildSeries,
  ripenSeries,
  type SeriesKey,
} from "@/lib/services/series";
import { auditRows } from "@/tests/support/audit";
import { chartCounts, chartOf, newSeries, on, steadyCounts } from "@/tests/support/series";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const system = (at: Date = TEST_NOW) => store.ctxFor(systemActor("tests"), at);

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

describe("ripening", () => {
  it("takes a month in once its days are over, and finds nothing more to do", async () => {
    const key = await newSeries(store, "RIPE", { matureAfterDays: 30 });
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], on("2026-02-05"));
    expect((await stateOf(key))?.newestMonth).toBe("2025-12");
    expect(await signalsOf(key)).toEqual([]);
    const early = await chartOf(store, "RIPE", {}, { at: on("2026-02-06") });
    expect(early.points[24]).toMatchObject({
      state: "ripening",
      numerator: 30,
      value: null,
      upperAction: null,
    });

    expect(await ripenSeries({ ctx: system(on("2026-03-01")) })).toMatchObject({ series: 0 });
    expect(await ripenSeries({ ctx: system(on("2026-03-02")) })).toMatchObject({ series: 1, born: 1 });
    expect((await stateOf(key))?.newestMonth).toBe("2026-01");
    expect(await signalsOf(key)).toMatchObject([{ fromMonth: "2026-01", onNewest: true }]);
    expect(await ripenSeries({ ctx: system(on("2026-03-02")) })).toMatchObject({ series: 0 });
    const entry = (await auditRows(store.db)).findLast((each) => each.action === "series.ripen");
    expect(entry).toMatchObject({ actorName: "tests", after: { series: 1, born: 1 } });
  });

  it("is the system's own work", async () => {
    for (const actor of [store.lead, store.infection, store.board, store.nurseOf()]) {
      await expect(ripenSeries({ ctx: store.ctxFor(actor) })).rejects.toMatchObject({ code: "forbidden" });
    }
  });
});

describe("rebuildSeries", () => {
  it("finds nothing to change right after normal use, and says so in the audit", async () => {
    await rebuildSeries({ ctx: system() });
    const key = await newSeries(store, "REBUILD");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], TEST_NOW);
    const result = await rebuildSeries({ ctx: system() });
    expect(result).toMatchObject({ states: 0, born: 0, moved: 0, cameBack: 0, withdrawn: 0 });
    expect(result.series).toBeGreaterThan(0);
    const entry = (await auditRows(store.db)).at(-1);
    expect(entry).toMatchObject({ action: "series.rebuild", actorName: "tests", after: result });
  });

  it("puts a lost state and lost signals right", async () => {
    const key = await newSeries(store, "LOST");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [30, 100]], TEST_NOW);
    const before = await stateOf(key);
    await store.db.delete(seriesState).where(eq(seriesState.wardId, key.wardId));
    await store.db
      .update(signals)
      .set({ status: "withdrawn", withdrawnWhy: "rules" })
      .where(eq(signals.wardId, key.wardId));
    expect(await rebuildSeries({ ctx: system() })).toMatchObject({ states: 1, cameBack: 1 });
    expect(await stateOf(key)).toEqual(before);
    expect(await rebuildSeries({ ctx: system() })).toMatchObject({ states: 0, cameBack: 0 });
  });

  it("is nobody's by role", async () => {
    for (const actor of [store.lead, store.infection, store.board, store.nurseOf()]) {
      await expect(rebuildSeries({ ctx: store.ctxFor(actor) })).rejects.toMatchObject({ code: "forbidden" });
    }
  });
});

describe("series_state", () => {
  it("holds what an evaluation from the figures gives, number for number", async () => {
    const key = await newSeries(store, "STATE");
    await chartCounts(
      store,
      key,
      "2024-01",
      [...steadyCounts.slice(0, 9), null, [3, 17], [0, 4], [40, 97]],
      TEST_NOW,
    );
    const [loaded] = await loadSeries(store.ctxFor(store.lead), [key]);
    if (!loaded) throw new Error("no series");
    const evaluated = evaluateFacts(loaded.facts);
    const state = await stateOf(key);
    expect(state?.columns).toEqual(columnsOf(evaluated));
    expect(state).toMatchObject({ baselineStatus: "trial", hasLimits: true, newestMonth: "2025-01" });
    expect(state?.activeSignals).toBe(evaluated.signals.length);
  });

  it("loads many series at once, and one that is named twice as one", async () => {
    const keys: SeriesKey[] = [];
    for (const code of ["MANY-A", "MANY-B", "MANY-C"]) {
      const key = await newSeries(store, code);
      await chartCounts(store, key, "2025-01", steadyCounts.slice(0, 12), TEST_NOW);
      keys.push(key);
    }
    const loaded = await loadSeries(store.ctxFor(store.lead), [...keys, ...keys]);
    expect(loaded).toHaveLength(6);
    expect(new Set(loaded.map((each) => each.facts.tallies.length))).toEqual(new Set([12]));
    expect(await loadSeries(store.ctxFor(store.lead), [])).toEqual([]);
  });
});
