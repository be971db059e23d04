import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { addMonths, asMonth } from "@/lib/indicators/month";
import { chartQuery, type ChartReply } from "@/lib/schemas/chart";
import { createAnnotation } from "@/lib/services/annotations";
import { getChart } from "@/lib/services/charts";
import { listSignals } from "@/lib/services/signals";
import { saveTally } from "@/lib/services/tallies";
import { purchaseOrderCounts, purchaseOrders } from "@/tests/support/published-example";
import { chartCounts, CHARTED_AT, chartOf, newSeries, sendMonth } from "@/tests/support/series";
import { makeTestStore, TEST_NOW, type TestStore } from "@/tests/support/store";

let store: TestStore;
beforeAll(async () => {
  store = await makeTestStore();
});
afterAll(() => store.close());

describe("the published example of unequal subgroups, entered month by month", () => {
  const FROM = asMonth("2024-11");

  beforeAll(async () => {
    await newSeries(store, "ORDERS");
    for (const [index, [numerator, denominator]] of purchaseOrderCounts.entries()) {
      const line = { ward: "ORDERS", indicator: "ORDERS-I", numerator, denominator };
      await sendMonth(store, addMonths(FROM, index), line, TEST_NOW);
    }
  }, 120_000);

  it("has the published centre line and limits, each month's on its own denominator", async () => {
    const chart = await chartOf(store, "ORDERS");
    expect(chart.centre).toBeCloseTo(purchaseOrders.centre, 12);
    expect(chart.points).toHaveLength(25);
    chart.points.forEach((point, index) => {
      const size = purchaseOrders.denominators[index] ?? 0;
      const [lowerAction, upperAction, lowerWarning, upperWarning] = purchaseOrders.limits.get(size) ?? [];
      expect(point.value).toBe((purchaseOrders.numerators[index] ?? 0) / size);
      expect(point.lowerAction).toBeCloseTo(lowerAction ?? Number.NaN, 12);
      expect(point.upperAction).toBeCloseTo(upperAction ?? Number.NaN, 12);
      expect(point.lowerWarning).toBeCloseTo(lowerWarning ?? Number.NaN, 12);
      expect(point.upperWarning).toBeCloseTo(upperWarning ?? Number.NaN, 12);
    });
  });

  it("flags the one month beyond, on the chart and as a signal on record", async () => {
    const chart = await chartOf(store, "ORDERS");
    const places = (test: (point: ChartReply["points"][number]) => boolean) =>
      chart.points.flatMap((point, index) => (test(point) ? [index] : []));
    expect(places((point) => point.beyond === "upper")).toEqual(purchaseOrders.beyondUpper);
    expect(places((point) => point.beyond === "lower")).toEqual([]);
    expect(places((point) => point.pastWarning !== null)).toEqual(purchaseOrders.pastWarning);

    const month = addMonths(FROM, 10);
    const beyond = chart.signals.filter((signal) => signal.rule === "beyond-action");
    expect(beyond).toEqual([
      expect.objectContaining({ from: month, to: month, side: "upper", towards: "adverse", status: "new" }),
    ]);
    const stored = await listSignals({ ctx: store.ctxFor(store.lead), input: { ward: "ORDERS" } });
    expect(stored.items.map((signal) => signal.id)).toContain(beyond[0]?.id);
    expect(chart.signals.every((signal) => signal.id !== null)).toBe(true);
  });

  it("says that its limits are trial ones, and from which months", async () => {
    const chart = await chartOf(store, "ORDERS");
    expect(chart).toMatchObject({ kind: "proportion", per: 100, limits: "three-sigma", hasLimits: true });
    expect(chart.baseline).toMatchObject({
      status: "trial",
      from: "2024-11",
      to: "2026-11",
      leftOut: [],
      months: 25,
    });
  });
});

describe("views of a chart", () => {
  beforeAll(async () => {
    const key = await newSeries(store, "VIEWS");
    await chartCounts(store, key, "2024-11", purchaseOrderCounts);
  });

  it("shows a window of months with the whole chart's limits", async () => {
    const whole = await chartOf(store, "VIEWS");
    const chart = await chartOf(store, "VIEWS", { from: "2025-03", to: "2025-08" });
    expect(chart.points.map((point) => point.month)).toEqual([
      "2025-03",
      "2025-04",
      "2025-05",
      "2025-06",
      "2025-07",
      "2025-08",
    ]);
    expect(chart.points).toEqual(whole.points.slice(4, 10));
    expect(chart.centre).toBe(whole.centre);
    expect(chart.signals).toEqual([]);
  });

  it("takes other limits for viewing, and leaves what is on record", async () => {
    const exact = await chartOf(store, "VIEWS", { limits: "exact" });
    expect(exact.limits).toBe("exact");
    const tenth = exact.points[10];
    // Exact limits are counts over the denominator.
    expect(Number.isInteger(Math.round((tenth?.upperAction ?? 0) * 110 * 1e9) / 1e9)).toBe(true);
    expect(exact.limitsChosen).toBe("auto");
    const wide = await chartOf(store, "VIEWS", { limits: "overdispersed" });
    const ratio =
      ((wide.points[0]?.upperAction ?? 0) - (wide.centre ?? 0)) / (0.18368571343549223 - 0.09551020408163265);
    expect(ratio).toBeCloseTo(wide.sigmaZ ?? 0, 9);
    expect((await chartOf(store, "VIEWS")).limits).toBe("three-sigma");
  });

  it("pools quarters against the same centre line", async () => {
    const months = await chartOf(store, "VIEWS");
    const chart = await chartOf(store, "VIEWS", { by: "quarter" });
    expect(chart.points.map((point) => point.month)).toEqual([
      ...["2024-Q4", "2025-Q1", "2025-Q2", "2025-Q3", "2025-Q4", "2026-Q1", "2026-Q2", "2026-Q3", "2026-Q4"],
    ]);
    expect(chart.centre).toBe(months.centre);
    const quarter = chart.points[1];
    expect(quarter).toMatchObject({
      numerator: 6 + 9 + 10,
      denominator: 80 + 100 + 110,
      incomplete: false,
      months: ["2025-01", "2025-02", "2025-03"],
    });
    const sigma = Math.sqrt((purchaseOrders.centre * (1 - purchaseOrders.centre)) / 290);
    expect(quarter?.upperAction).toBeCloseTo(purchaseOrders.centre + 3 * sigma, 12);
    expect(quarter?.lowerWarning).toBeCloseTo(purchaseOrders.centre - 2 * sigma, 12);
    expect(chart.points[0]).toMatchObject({ months: ["2024-11", "2024-12"], incomplete: true });
    const total = (points: ChartReply["points"]) =>
      points.reduce((sum, point) => sum + (point.numerator ?? 0), 0);
    expect(total(chart.points)).toBe(total(months.points));
  });

  it("refuses what it can't read", () => {
    const issues = (query: Record<string, string>) =>
      chartQuery.safeParse(query).error?.issues.map((issue) => issue.path.join("."));
    expect(issues({ from: "2025-13" })).toEqual(["from"]);
    expect(issues({ from: "2025-05", to: "2025-04" })).toEqual(["to"]);
    expect(issues({ limits: "wide" })).toEqual(["limits"]);
    expect(issues({ by: "week" })).toEqual(["by"]);
    expect(issues({ asOf: "yesterday" })).toEqual(["asOf"]);
    expect(issues({ asOf: "2026-02-30" })).toEqual(["asOf"]);
  });

  it("refuses a day that hasn't begun, and takes today", async () => {
    expect(await chartOf(store, "VIEWS", { asOf: "1900-01-01" })).toMatchObject({ points: [], signals: [] });
    await expect(chartOf(store, "VIEWS", { asOf: "2026-12-08" })).rejects.toMatchObject({
      code: "invalid",
      errors: [{ path: "asOf" }],
    });
    await expect(chartOf(store, "VIEWS", { asOf: "2026-12-07T09:00:01Z" })).rejects.toMatchObject({
      code: "invalid",
    });
    const today = await chartOf(store, "VIEWS", { asOf: "2026-12-07" });
    expect(today.asOf).toBe(TEST_NOW.toISOString());
  });
});

describe("months without a point", () => {
  it("keeps a place for every calendar month and says what each is", async () => {
    const key = await newSeries(store, "GAPS");
    const counts = [
      ...purchaseOrderCounts.slice(0, 4),
      null,
      [0, 0] as const,
      ...purchaseOrderCounts.slice(6, 10),
    ];
    await chartCounts(store, key, "2026-01", counts);
    const chart = await chartOf(store, "GAPS");
    expect(chart.points.map((point) => point.state)).toEqual([
      ...["counted", "counted", "counted", "counted", "missing", "nothing-to-count", "counted", "counted"],
      ...["counted", "counted"],
    ]);
    for (const place of [4, 5]) {
      expect(chart.points[place]).toMatchObject({
        value: null,
        z: null,
        upperAction: null,
        lowerAction: null,
        beyond: null,
        belowDetection: false,
      });
    }
  });

  it("draws an open return hollow: its value without verdict or limits", async () => {
    const key = await newSeries(store, "OPEN");
    await chartCounts(store, key, "2026-01", purchaseOrderCounts.slice(0, 8));
    const before = await chartOf(store, "OPEN");
    const input = {
      ward: "OPEN",
      month: asMonth("2026-11"),
      indicator: "OPEN-I",
      numerator: 60,
      denominator: 80,
      version: 0,
    };
    await saveTally({ ctx: store.ctxFor(store.lead), input });
    const chart = await chartOf(store, "OPEN");
    expect(chart.points.at(-1)).toMatchObject({
      month: "2026-11",
      state: "open",
      value: 0.75,
      upperAction: null,
      beyond: null,
    });
    expect(chart.centre).toBe(before.centre);
    expect(chart.signals).toEqual(before.signals);
  });

  it("has no limits where the baseline has no events, and flags no first event", async () => {
    const key = await newSeries(store, "RARE");
    await chartCounts(store, key, "2023-01", [
      ...Array<readonly [number, number]>(30).fill([0, 40]),
      [1, 40],
    ]);
    const chart = await chartOf(store, "RARE");
    expect(chart).toMatchObject({ centre: 0, hasLimits: false, signals: [] });
    expect(chart.points.at(30)).toMatchObject({ numerator: 1, upperAction: null, beyond: null });
  });

  it("answers with no points where nothing was counted yet", async () => {
    await newSeries(store, "EMPTY");
    const chart = await chartOf(store, "EMPTY");
    expect(chart).toMatchObject({ points: [], centre: null, hasLimits: false, signals: [] });
    expect(chart.baseline).toMatchObject({ status: "none", from: null, to: null });
  });
});

describe("marks beside the figures", () => {
  it("shows notes, as known on the day asked for", async () => {
    const key = await newSeries(store, "NOTED");
    await chartCounts(store, key, "2026-01", purchaseOrderCounts.slice(0, 6));
    await createAnnotation({
      ctx: store.ctxFor(store.lead, new Date("2026-07-01T10:00:00Z")),
      input: { ward: "NOTED", indicator: "NOTED-I", month: asMonth("2026-03"), text: "New trolley" },
    });
    expect((await chartOf(store, "NOTED")).points[2]?.notes).toEqual(["New trolley"]);
    expect((await chartOf(store, "NOTED", { asOf: "2026-06-30" })).points[2]?.notes).toEqual([]);
  });

  it("marks a return as late by its first sending", async () => {
    await newSeries(store, "LATE");
    const line = { ward: "LATE", indicator: "LATE-I", numerator: 3, denominator: 90 };
    await sendMonth(store, "2026-09", line, new Date("2026-10-07T20:00:00Z"));
    await sendMonth(store, "2026-10", line, new Date("2026-11-10T08:00:00Z"));
    const chart = await chartOf(store, "LATE");
    expect(chart.points.slice(0, 2).map((point) => point.late)).toEqual([false, true]);
  });
});

describe("who sees a chart", () => {
  beforeAll(async () => {
    const key = await newSeries(store, "SCOPE");
    await chartCounts(store, key, "2026-01", purchaseOrderCounts.slice(0, 3));
  });

  it("is there for the ward's nurse, infection control and a lead", async () => {
    const ward = await store.db.query.wards.findFirst({ where: (wards, { eq }) => eq(wards.code, "SCOPE") });
    for (const actor of [store.nurseOf(ward?.id ?? ""), store.infection, store.lead]) {
      expect((await chartOf(store, "SCOPE", {}, { actor: actor })).points).toHaveLength(10);
    }
  });

  it("is not there for a nurse of another ward, and forbidden to a board member", async () => {
    const other = await store.addWard("ELSEWHERE");
    await expect(chartOf(store, "SCOPE", {}, { actor: store.nurseOf(other.id) })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(chartOf(store, "SCOPE", {}, { actor: store.nurseOf() })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(chartOf(store, "SCOPE", {}, { actor: store.board })).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("is not there for a pair that was never counted, or for unknown codes", async () => {
    const read = (ward: string, indicator: string) =>
      getChart({ ctx: store.ctxFor(store.lead), input: { ward, indicator, ...chartQuery.parse({}) } });
    await expect(read("SCOPE", "VIEWS-I")).rejects.toMatchObject({ code: "not-found" });
    await expect(read("SCOPE", "NOTHING")).rejects.toMatchObject({ code: "not-found" });
    await expect(read("NOWHERE", "SCOPE-I")).rejects.toMatchObject({ code: "not-found" });
    await expect(read("scope", "scope-i")).resolves.toMatchObject({ ward: "SCOPE", indicator: "SCOPE-I" });
  });

  it("knows nothing before the first sending", async () => {
    const chart = await chartOf(store, "SCOPE", { asOf: CHARTED_AT.toISOString().replace("08:00", "07:59") });
    expect(chart).toMatchObject({ points: [], centre: null });
  });
});
