import { describe, expect, it } from "vitest";
import { chartMonths } from "@/lib/indicators/chart-points";
import { chartQuarters } from "@/lib/indicators/chart-quarters";
import { limitsAt, sideBeyond } from "@/lib/indicators/chart-limits-at";
import { addMonths, asMonth, type Month } from "@/lib/indicators/month";
import { assembleSeries, type SeriesFacts } from "@/lib/indicators/series";
import { evaluateSeries, type LimitMethod } from "@/lib/limits";
import type { LimitBasis } from "@/lib/limits/limit-basis";

const START = asMonth("2025-01");
const month = (offset: number): Month => addMonths(START, offset);

function drawn(pairs: readonly (readonly [number, number] | null)[], over: Partial<SeriesFacts> = {}) {
  const series = assembleSeries({
    indicator: { kind: "proportion", betterWhen: "lower", limits: "auto", rules: [], matureAfterDays: 0 },
    definitionBreaks: [],
    baselines: [],
    tallies: pairs.flatMap((pair, index) =>
      pair
        ? [
            {
              month: month(index),
              charted: true,
              numerator: pair[0],
              denominator: pair[1],
              notCollected: null,
              awaited: null,
            },
          ]
        : [],
    ),
    showUntil: null,
    today: "2027-01-01",
    ...over,
  });
  const evaluation = evaluateSeries(series.input);
  const months = chartMonths(series, evaluation);
  return { months, quarters: chartQuarters(months, evaluation, series.input), evaluation };
}

const usual = Array.from({ length: 12 }, () => [10, 100] as const);

describe("chartMonths", () => {
  it("gives null for what doesn't exist, and each month its segment", () => {
    const { months } = drawn([[10, 100], null, [30, 100], [0, 0]], { definitionBreaks: [month(2)] });
    expect(months[1]).toMatchObject({
      state: "missing",
      value: null,
      z: null,
      upperAction: null,
      segment: 0,
    });
    expect(months[3]).toMatchObject({ state: "nothing-to-count", denominator: 0, value: null, segment: 1 });
    expect(months.map((each) => each.segment)).toEqual([0, 0, 1, 1]);
    expect(months[2]?.centre).toBe(0.3);
  });

  it("names the side that a month is beyond, and counts that as past the warning limit", () => {
    const { months } = drawn([...usual, [31, 100], [17, 100]]);
    expect(months[12]).toMatchObject({ beyond: "upper", pastWarning: "upper" });
    expect(months[13]).toMatchObject({ beyond: null, pastWarning: null });
  });

  it("marks months left out of a baseline", () => {
    const baseline = {
      id: "b",
      from: month(0),
      to: month(11),
      appliesFrom: null,
      leftOut: [{ month: month(4), reason: "flood" }],
      limits: "three-sigma" as const,
    };
    const { months } = drawn(usual, { baselines: [baseline] });
    expect(months.flatMap((each, index) => (each.leftOut ? [index] : []))).toEqual([4]);
  });
});

describe("chartQuarters", () => {
  it("adds up counts, keeps the centre line and narrows the limits", () => {
    const { months, quarters } = drawn(usual);
    expect(quarters.map((each) => each.quarter)).toEqual(["2025-Q1", "2025-Q2", "2025-Q3", "2025-Q4"]);
    expect(quarters[0]).toMatchObject({ numerator: 30, denominator: 300, value: 0.1, centre: 0.1, z: 0 });
    expect(quarters[0]?.upperAction).toBeCloseTo(0.1 + 3 * Math.sqrt((0.1 * 0.9) / 300), 12);
    expect(quarters[0]?.upperAction ?? 1).toBeLessThan(months[0]?.upperAction ?? 0);
  });

  it("says which months are in it and that one lacks", () => {
    const { quarters } = drawn(
      [null, ...usual.slice(0, 4), null, [10, 100]].map((pair) => pair as [number, number]),
    );
    expect(quarters.map(({ months, incomplete }) => [months.length, incomplete])).toEqual([
      [2, true],
      [2, true],
      [1, true],
    ]);
  });

  it("keeps a quarter without a counted month as a place without a point", () => {
    const { quarters } = drawn([...usual.slice(0, 3), null, null, null, [10, 100]]);
    expect(quarters[1]).toMatchObject({
      quarter: "2025-Q2",
      state: "missing",
      value: null,
      upperAction: null,
    });
  });

  it("never pools across a definition that can't be compared", () => {
    const { quarters } = drawn(usual, { definitionBreaks: [month(4)] });
    expect(quarters.slice(1, 3)).toMatchObject([
      { quarter: "2025-Q2", months: ["2025-04"], until: "2025-04", segment: 0 },
      { quarter: "2025-Q2", months: ["2025-05", "2025-06"], until: "2025-06", segment: 1 },
    ]);
  });

  it("finds a shift that no single month shows", () => {
    const shifted = [...usual, [17, 100], [17, 100], [17, 100]] as const;
    const baseline = {
      id: "b",
      from: month(0),
      to: month(11),
      appliesFrom: null,
      leftOut: [],
      limits: "three-sigma" as const,
    };
    const { months, quarters } = drawn(shifted, { baselines: [baseline] });
    expect(months.every((each) => each.beyond === null)).toBe(true);
    expect(quarters.at(-1)).toMatchObject({ beyond: "upper" });
  });
});

describe("limitsAt", () => {
  const basis = (method: LimitMethod, model: LimitBasis["model"] = "binomial"): LimitBasis => ({
    model,
    centre: 0.05,
    method,
    sigmaZ: 1.5,
  });

  it("agrees with the limits that the months of a chart get", () => {
    const { months, evaluation } = drawn(usual);
    const segment = evaluation.segments[0];
    const own: LimitBasis = {
      model: "binomial",
      centre: segment?.centre ?? 0,
      method: "three-sigma",
      sigmaZ: null,
    };
    expect(limitsAt(own, 100, "action")).toEqual({
      lower: months[0]?.lowerAction,
      upper: months[0]?.upperAction,
    });
    expect(limitsAt(own, 100, "warning")).toEqual({
      lower: months[0]?.lowerWarning,
      upper: months[0]?.upperWarning,
    });
  });

  it.each(["three-sigma", "exact", "overdispersed"] as const)("%s: beyond is strictly outside", (method) => {
    for (const model of ["binomial", "poisson"] as const) {
      const own = basis(method, model);
      const { lower, upper } = limitsAt(own, 200, "action");
      const [last, first] = [Math.floor(upper * 200 + 1e-9), Math.ceil(lower * 200 - 1e-9)];
      expect(sideBeyond(own, last, 200, "action")).toBeNull();
      expect(sideBeyond(own, last + 1, 200, "action")).toBe("upper");
      expect(sideBeyond(own, first, 200, "action")).toBeNull();
      if (first > 0) expect(sideBeyond(own, first - 1, 200, "action")).toBe("lower");
    }
  });
});
