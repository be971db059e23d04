import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { uuidv7 } from "uuidv7";
import { indicatorDefinitions, indicators, signals } from "@/db/schema";
import { asMonth } from "@/lib/indicators/month";
import { systemActor } from "@/lib/policy";
import { setBaselineSchema } from "@/lib/schemas/baseline";
import { rebuildSeries } from "@/lib/services/series";
import { auditRows, withBrokenAudit } from "@/tests/support/audit";
import { lowerCounts, put } from "@/tests/support/baselines";
import { purchaseOrderCounts, purchaseOrders } from "@/tests/support/published-example";
import { chartCounts, chartOf, newSeries, on, steadyCounts } from "@/tests/support/series";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

const before = { from: "2024-01", to: "2024-12" };

describe("the first baseline", () => {
  it("turns trial limits into set ones, with the left-out month judged but not counted in", async () => {
    const key = await newSeries(store, "FIRST");
    await chartCounts(store, key, "2024-11", purchaseOrderCounts);
    expect((await chartOf(store, "FIRST")).baseline.status).toBe("trial");

    const leftOut = [{ month: "2025-09", reason: "A supplier's strike" }];
    const set = await put(store, "FIRST", { from: "2024-11", to: "2026-11", leftOut });
    const centre = (234 - 20) / (2450 - 110);
    expect(set).toMatchObject({
      state: "decided",
      limits: "three-sigma",
      months: 24,
      appliesFrom: null,
      version: 1,
    });
    expect(set.centre).toBeCloseTo(centre, 14);

    const chart = await chartOf(store, "FIRST");
    expect(chart.centre).toBeCloseTo(centre, 14);
    expect(chart.baseline).toMatchObject({
      status: "set",
      from: "2024-11",
      to: "2026-11",
      leftOut,
      months: 24,
    });
    expect(chart.points[10]).toMatchObject({ month: "2025-09", leftOut: true, beyond: "upper" });
    expect(chart.points[10]?.upperAction).toBeCloseTo(
      centre + 3 * Math.sqrt((centre * (1 - centre)) / 110),
      12,
    );
  });

  it("keeps the published limits where all months are in it", async () => {
    const key = await newSeries(store, "WHOLE");
    await chartCounts(store, key, "2024-11", purchaseOrderCounts);
    await put(store, "WHOLE", { from: "2024-11", to: "2026-11" });
    const chart = await chartOf(store, "WHOLE");
    expect(chart.centre).toBeCloseTo(purchaseOrders.centre, 14);
    expect(chart.points.flatMap((point, index) => (point.beyond ? [index] : []))).toEqual(
      purchaseOrders.beyondUpper,
    );
  });

  it("is provisional under twenty months or twenty events, and stays put when months come in", async () => {
    const key = await newSeries(store, "SHORT");
    await chartCounts(store, key, "2024-01", steadyCounts);
    await put(store, "SHORT", before);
    const chart = await chartOf(store, "SHORT");
    expect(chart.baseline).toMatchObject({ status: "provisional", months: 12, expected: 120 });
    await chartCounts(store, key, "2026-01", [[50, 100]], TEST_NOW);
    expect((await chartOf(store, "SHORT")).centre).toBe(chart.centre);
  });

  it("settles auto on its own months, and takes another choice as it is", async () => {
    const key = await newSeries(store, "SETTLE");
    await chartCounts(store, key, "2024-01", [...steadyCounts, [1, 12]]);
    expect(await put(store, "SETTLE", before)).toMatchObject({ limits: "three-sigma" });
    const chosen = await newSeries(store, "CHOSEN", { limits: "overdispersed" });
    await chartCounts(store, chosen, "2024-01", steadyCounts);
    expect(await put(store, "CHOSEN", before)).toMatchObject({ limits: "overdispersed" });
    // A later change of the choice leaves what was decided alone.
    await store.db.update(indicators).set({ limits: "exact" }).where(eq(indicators.id, chosen.indicatorId));
    expect((await chartOf(store, "CHOSEN")).limits).toBe("overdispersed");
  });

  it("changes nothing when it is said again", async () => {
    const key = await newSeries(store, "AGAIN");
    await chartCounts(store, key, "2024-01", steadyCounts);
    const set = await put(store, "AGAIN", before);
    const entries = (await auditRows(store.db)).length;
    expect(await put(store, "AGAIN", { ...before, reason: "Other words" })).toEqual(set);
    expect(await auditRows(store.db)).toHaveLength(entries);
  });

  it("withdraws and bears signals in the same transaction, with why, and writes one audit entry of its own", async () => {
    const key = await newSeries(store, "SIGNALS");
    await chartCounts(store, key, "2024-01", [...steadyCounts.slice(0, 12), ...lowerCounts, ...lowerCounts]);
    const storedOf = () =>
      store.db
        .select()
        .from(signals)
        .where(and(eq(signals.wardId, key.wardId), eq(signals.indicatorId, key.indicatorId)));
    const trial = (await storedOf()).filter((each) => each.status !== "withdrawn");
    await put(store, "SIGNALS", before);
    const after = await storedOf();
    expect(
      after.some((each) => each.status === "new" && each.rule === "one-side" && each.side === "lower"),
    ).toBe(true);
    for (const gone of after.filter((each) => each.status === "withdrawn")) {
      expect(gone.withdrawnWhy).toBe("baseline");
      expect(trial.map((each) => each.id)).toContain(gone.id);
    }
    const entry = (await auditRows(store.db)).findLast((each) => each.action === "baseline.set");
    expect(entry).toMatchObject({
      actorName: "Test lead",
      before: null,
      after: { ward: "SIGNALS", state: "decided" },
    });
    const rebuilt = await rebuildSeries({ ctx: store.ctxFor(systemActor("tests")) });
    expect(rebuilt).toMatchObject({ born: 0, moved: 0, withdrawn: 0, cameBack: 0 });
  });

  it("leaves nothing behind when its audit entry can't be written", async () => {
    const key = await newSeries(store, "ROLLBACK");
    await chartCounts(store, key, "2024-01", steadyCounts);
    await withBrokenAudit(store.db, async () => {
      await expect(put(store, "ROLLBACK", before)).rejects.toThrow();
    });
    expect((await chartOf(store, "ROLLBACK")).baseline.status).toBe("trial");
  });
});

describe("what can't be a baseline", () => {
  it("is refused at its field by the schema", () => {
    const issues = (body: object) =>
      setBaselineSchema
        .safeParse({ from: "2024-01", to: "2024-12", reason: "Steady", ...body })
        .error?.issues.map((issue) => issue.path.join("."));
    expect(issues({ to: "2023-12" })).toEqual(["to"]);
    expect(issues({ appliesFrom: "2024-02" })).toEqual(["appliesFrom"]);
    expect(issues({ leftOut: [{ month: "2025-01", reason: "flood" }] })).toEqual(["leftOut.0.month"]);
    expect(issues({ leftOut: [{ month: "2024-03", reason: " " }] })).toEqual(["leftOut.0.reason"]);
    const twice = { month: "2024-03", reason: "flood" };
    expect(issues({ leftOut: [twice, twice] })).toEqual(["leftOut.1.month"]);
    expect(issues({ reason: "" })).toEqual(["reason"]);
    expect(issues({ from: "2024-1" })).toContain("from");
  });

  it("is refused where the chart has no such months", async () => {
    const key = await newSeries(store, "BOUNDS");
    await chartCounts(store, key, "2024-01", steadyCounts);
    await expect(put(store, "BOUNDS", { from: "2023-01", to: "2023-12" })).rejects.toMatchObject({
      errors: [{ path: "from" }],
    });
    await expect(put(store, "BOUNDS", { from: "2024-01", to: "2027-12" })).rejects.toMatchObject({
      errors: [{ path: "to" }],
    });
    await newSeries(store, "NOTHING");
    await expect(put(store, "NOTHING", before)).rejects.toMatchObject({
      code: "invalid",
      errors: [{ path: "from" }],
    });
  });

  it("never spans a definition that can't be compared", async () => {
    const key = await newSeries(store, "DEFINED");
    await chartCounts(store, key, "2024-01", steadyCounts);
    await store.db.insert(indicatorDefinitions).values({
      id: uuidv7(),
      indicatorId: key.indicatorId,
      number: 2,
      effectiveFrom: asMonth("2025-01"),
      numeratorLabel: "Counted otherwise",
      denominatorLabel: "Discharges",
      comparable: false,
      reason: "Another way",
      decidedBy: "Test lead",
      decidedAt: on("2026-01-01"),
    });
    await expect(put(store, "DEFINED", { from: "2024-06", to: "2025-06" })).rejects.toMatchObject({
      errors: [{ path: "from" }],
    });
    const own = await put(store, "DEFINED", { from: "2025-01", to: "2025-12", appliesFrom: "2025-01" });
    expect(own).toMatchObject({ state: "proposed", centre: 0.1 });
  });
});
