import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/policy";
import { signalPageSchema, signalQuery } from "@/lib/schemas/signal";
import { chartQuery } from "@/lib/schemas/chart";
import { getChartPage, listCharts } from "@/lib/services/charts";
import type { SeriesKey } from "@/lib/services/series";
import { listSignals, listSignalsInWords } from "@/lib/services/signals";
import { poissonUpperTail } from "@/lib/limits";
import { chartCounts, correctMonth, newSeries, on, steadyCounts } from "@/tests/support/series";
import { makeTestStore, type TestStore } from "@/tests/support/store";

let store: TestStore;
let own: SeriesKey;
let rare: SeriesKey;

beforeAll(async () => {
  store = await makeTestStore();
  own = await newSeries(store, "OWN");
  const other = await newSeries(store, "OTHER", { team: "infection_control" });
  rare = await newSeries(store, "RARE", {
    kind: "rate",
    per: 1000,
    numeratorLabel: "Infections",
    denominatorLabel: "Catheter days",
  });
  await chartCounts(store, own, "2024-01", [...steadyCounts, [30, 100]], on("2026-02-03"));
  await chartCounts(store, other, "2024-01", [...steadyCounts, [35, 100]], on("2026-02-04"));
  const few = Array.from({ length: 24 }, (_, index) => [index % 3 === 0 ? 1 : index % 3, 250] as const);
  await chartCounts(store, rare, "2024-01", [...few, [9, 268]], on("2026-02-05"));
  await correctMonth(store, other, "2026-01", [10, 100], on("2026-03-01"));
});
afterAll(() => store.close());

async function list(query: Record<string, string> = {}, actor: Actor = store.lead) {
  return signalPageSchema.parse(
    await listSignals({ ctx: store.ctxFor(actor), input: signalQuery.parse(query) }),
  );
}

const wardsOf = (page: { items: { ward: string }[] }) => page.items.map((item) => item.ward);

describe("listSignals", () => {
  it("lists all on record, newest first, withdrawn ones with why", async () => {
    const page = await list();
    expect(wardsOf(page)).toEqual(["RARE", "OTHER", "OWN"]);
    expect(page.nextCursor).toBeNull();
    expect(page.items[1]).toMatchObject({ status: "withdrawn", withdrawnWhy: "correction", from: "2026-01" });
    expect(page.items[2]).toMatchObject({
      indicator: "OWN-I",
      rule: "beyond-action",
      from: "2026-01",
      to: "2026-01",
      side: "upper",
      towards: "adverse",
      status: "new",
      version: 1,
      withdrawnWhy: null,
      bornAt: "2026-02-03T10:00:00.000Z",
      onNewest: true,
      spansGap: false,
    });
  });

  it("keeps to a status, a team, a ward, an indicator", async () => {
    expect(wardsOf(await list({ status: "new" }))).toEqual(["RARE", "OWN"]);
    expect(wardsOf(await list({ status: "withdrawn" }))).toEqual(["OTHER"]);
    expect(wardsOf(await list({ status: "new,withdrawn" }))).toEqual(["RARE", "OTHER", "OWN"]);
    expect(wardsOf(await list({ team: "infection_control" }))).toEqual(["OTHER"]);
    expect(wardsOf(await list({ ward: "own" }))).toEqual(["OWN"]);
    expect(wardsOf(await list({ indicator: "RARE-I" }))).toEqual(["RARE"]);
  });

  it("pages without losing or repeating any", async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof list>> = await list({
        limit: "1",
        ...(cursor ? { cursor } : {}),
      });
      expect(page.items).toHaveLength(1);
      seen.push(...wardsOf(page));
      cursor = page.nextCursor;
    } while (cursor);
    expect(seen).toEqual(["RARE", "OTHER", "OWN"]);
  });

  it("refuses what it can't read", () => {
    const path = (query: Record<string, string>) => signalQuery.safeParse(query).error?.issues[0]?.path[0];
    expect(path({ status: "old" })).toBe("status");
    expect(path({ team: "nobody" })).toBe("team");
    expect(path({ cursor: "x" })).toBe("cursor");
    expect(path({ limit: "0" })).toBe("limit");
  });

  it("shows a nurse their own wards, others not at all, and nothing to a board member", async () => {
    const nurse = store.nurseOf(own.wardId);
    expect(wardsOf(await list({}, nurse))).toEqual(["OWN"]);
    await expect(list({ ward: "OTHER" }, nurse)).rejects.toMatchObject({ code: "not-found" });
    expect(wardsOf(await list({}, store.nurseOf()))).toEqual([]);
    expect(wardsOf(await list({}, store.infection))).toHaveLength(3);
    await expect(list({}, store.board)).rejects.toMatchObject({ code: "forbidden" });
  });
});

describe("signals in words", () => {
  it("says what was counted, what was to be expected, and the exact chance of it", async () => {
    const { items } = await listSignalsInWords({ ctx: store.ctxFor(store.lead), input: { ward: "RARE" } });
    const [item] = items;
    const page = await getChartPage({
      ctx: store.ctxFor(store.lead),
      input: { ward: "RARE", indicator: "RARE-I", ...chartQuery.parse({}) },
    });
    const centre = page.view.evaluated.evaluation.segments[0]?.centre ?? 0;
    expect(item?.evidence).toMatchObject({ observed: 9, denominator: 268 });
    expect(item?.evidence?.expected).toBeCloseTo(268 * centre, 10);
    expect(item?.evidence?.chance).toBeCloseTo(poissonUpperTail(9, 268 * centre), 12);
    expect(item?.words.sentences[0]).toBe("9 infections in 268 catheter days, 33.6 per 1000.");
    expect(item?.words.odds).toMatch(/^1 in /);
  });

  it("says of a withdrawn one that its evidence has gone", async () => {
    const { items } = await listSignalsInWords({ ctx: store.ctxFor(store.lead), input: { ward: "OTHER" } });
    expect(items[0]).toMatchObject({ evidence: null, words: { odds: null } });
    expect(items[0]?.words.sentences[0]).toBe("Withdrawn: the counts were corrected. It stays on record.");
  });

  it("is guarded like the list", async () => {
    await expect(listSignalsInWords({ ctx: store.ctxFor(store.board), input: {} })).rejects.toMatchObject({
      code: "forbidden",
    });
  });
});

describe("the chart page in words", () => {
  const page = (code: string, query: Record<string, string> = {}) =>
    getChartPage({
      ctx: store.ctxFor(store.lead),
      input: { ward: code, indicator: `${code}-I`, ...chartQuery.parse(query) },
    });

  it("names the signal, the missing months since, and the limits in use", async () => {
    const { shows, quiet, limits, detection } = await page("OWN");
    const signal = shows.find((each) => each.mark === "above");
    expect(signal).toMatchObject({
      lead: "Above the upper action limit, January 2026.",
      small: "away from better",
    });
    expect(signal?.text).toContain("30 events in 100 discharges, 30.0%.");
    expect(shows.filter((each) => each.mark === "missing").map((each) => each.month)).toContain("2026-10");
    expect(quiet).toBeNull();
    expect(limits.join(" ")).toContain("three standard errors");
    expect(limits.join(" ")).toContain("Trial limits, because no baseline is set");
    expect(detection).toBeNull();
  });

  it("says how blind a quiet month was, and that no signal is no proof", async () => {
    const { quiet } = await page("OTHER");
    expect(quiet).toMatch(
      /^No signal in January 2026\. A rise to [\d.]+% in one month would probably have shown\. No signal is no proof of safety\.$/,
    );
  });

  it("says exact limits, the guard for runs and what is below detection where counts are small", async () => {
    const { limits, detection, data } = await page("RARE");
    expect(limits[0]).toBe("Exact limits, because a baseline month expects fewer than 5.");
    expect(limits.join(" ")).toContain("1 in 256 such stretches");
    expect(detection?.title).toBe("Too small to show a fall");
    expect(data.points[0]).toMatchObject({ belowDetection: true, lowerAction: null });
    expect(data.unitWords).toBe("per 1000 catheter days");
  });

  it("draws quarters without runs or months below detection", async () => {
    const { data, detection } = await page("RARE", { by: "quarter" });
    expect(data.points[0]).toMatchObject({ month: "2024-01", label: "Jan to Mar 2024" });
    expect(data.runs).toEqual([]);
    expect(detection).toBeNull();
  });
});

describe("listCharts", () => {
  it("lists the charts in scope with the newest counted month and its marks", async () => {
    const charts = await listCharts({ ctx: store.ctxFor(store.lead), input: {} });
    expect(charts.map((chart) => chart.ward.code)).toEqual(["OTHER", "OWN", "RARE"]);
    expect(charts[1]).toMatchObject({
      indicator: { code: "OWN-I" },
      newest: { month: "2026-01", numerator: 30, denominator: 100, value: 0.3 },
      status: "trial",
      marks: ["above"],
      isProposed: false,
    });
    expect(charts[0]?.marks).toEqual([]);
  });

  it("keeps to a ward, and to the nurse's own", async () => {
    const nurse = store.ctxFor(store.nurseOf(own.wardId));
    expect((await listCharts({ ctx: nurse, input: {} })).map((chart) => chart.ward.code)).toEqual(["OWN"]);
    await expect(listCharts({ ctx: nurse, input: { ward: "OTHER" } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(listCharts({ ctx: store.ctxFor(store.board), input: {} })).rejects.toMatchObject({
      code: "forbidden",
    });
  });
});
