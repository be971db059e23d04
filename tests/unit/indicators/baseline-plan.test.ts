import { describe, expect, it } from "vitest";
import { planBaseline, type BaselineDraft } from "@/lib/indicators/baseline-plan";
import { addMonths, asMonth, type Month } from "@/lib/indicators/month";
import type { SeriesFacts } from "@/lib/indicators/series";

const START = asMonth("2024-01");
const month = (offset: number): Month => addMonths(START, offset);

function facts(
  count: number,
  over: Partial<SeriesFacts> = {},
  pair: [number, number] = [10, 100],
): SeriesFacts {
  return {
    indicator: { kind: "proportion", betterWhen: "lower", limits: "auto", rules: [], matureAfterDays: 0 },
    definitionBreaks: [],
    baselines: [],
    tallies: Array.from({ length: count }, (_, index) => ({
      month: month(index),
      charted: true,
      numerator: pair[0],
      denominator: pair[1],
      notCollected: null,
      awaited: null,
    })),
    showUntil: null,
    today: "2026-12-07",
    ...over,
  };
}

function draft(from: number, to: number, over: Partial<BaselineDraft> = {}): BaselineDraft {
  return { from: month(from), to: month(to), leftOut: [], appliesFrom: null, ...over };
}

const paths = (series: SeriesFacts, given: BaselineDraft) =>
  planBaseline(series, given).problems.map((problem) => problem.path);

describe("planBaseline", () => {
  it("adds up the months' counts without those left out", () => {
    const leftOut = [{ month: month(2), reason: "flood" }];
    const plan = planBaseline(facts(24), draft(0, 11, { leftOut }));
    expect(plan.problems).toEqual([]);
    expect(plan.line).toEqual({ numerator: 110, denominator: 1100, months: 11, centre: 0.1 });
  });

  it("settles auto by the baseline's smallest expectation, and keeps a choice", () => {
    expect(planBaseline(facts(24, {}, [5, 100]), draft(0, 11)).limits).toBe("three-sigma");
    expect(planBaseline(facts(24, {}, [4, 100]), draft(0, 11)).limits).toBe("exact");
    const chosen = { ...facts(1).indicator, limits: "overdispersed" as const };
    expect(planBaseline(facts(24, { indicator: chosen }, [4, 100]), draft(0, 11)).limits).toBe(
      "overdispersed",
    );
  });

  it("refuses months that aren't on the chart", () => {
    expect(paths(facts(0), draft(0, 3))).toEqual(["from"]);
    expect(paths(facts(12), draft(0, 12))).toEqual(["to"]);
    expect(paths(facts(12), draft(-8, -3))).toEqual(["from"]);
  });

  it("refuses a baseline without one counted month", () => {
    const leftOut = [0, 1].map((offset) => ({ month: month(offset), reason: "flood" }));
    expect(paths(facts(12), draft(0, 1, { leftOut }))).toEqual(["from"]);
  });

  it("lets a change begin inside the chart alone", () => {
    const change = (appliesFrom: Month) => paths(facts(12), draft(6, 11, { appliesFrom }));
    expect(change(month(6))).toEqual([]);
    expect(change(month(0))).toEqual(["appliesFrom"]);
    expect(change(month(12))).toEqual(["appliesFrom"]);
  });

  it("never takes months together across a definition that can't be compared", () => {
    const series = facts(24, { definitionBreaks: [month(10)] });
    expect(paths(series, draft(4, 12))).toEqual(["from"]);
    expect(paths(series, draft(4, 9))).toEqual([]);
    expect(paths(series, draft(12, 20))).toEqual(["appliesFrom"]);
    expect(paths(series, draft(12, 20, { appliesFrom: month(10) }))).toEqual([]);
    expect(paths(series, draft(12, 20, { appliesFrom: month(8) }))).toEqual(["appliesFrom"]);
  });
});
