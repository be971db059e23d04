import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { evaluateSeries, type SeriesEvaluation, type SeriesInput } from "@/lib/limits";
import { column, maskOf, seriesOf } from "./series-builder";

const columnsOf = (evaluation: SeriesEvaluation) => [
  evaluation.z,
  evaluation.lowerAction,
  evaluation.upperAction,
  evaluation.lowerWarning,
  evaluation.upperWarning,
];

function signalsOf(input: SeriesInput): string[] {
  return evaluateSeries(input).signals.map(
    ({ rule, side, first, last, segment }) => `${segment} ${rule} ${side} ${first}-${last}`,
  );
}

describe("evaluateSeries", () => {
  it("judges months that are left out of the baseline like the others", () => {
    const input = seriesOf([10, 10, 60, 10], 100, { baseline: [0, 1, 3] });
    const { segments, beyondAction, signals } = evaluateSeries(input);
    expect(segments[0]).toMatchObject({
      centre: 0.1,
      baselineMonths: 3,
      baselineExpected: 30,
      hasLimits: true,
    });
    expect([...beyondAction]).toEqual([0, 0, 1, 0]);
    expect(signals).toEqual([
      { rule: "beyond-action", side: "upper", first: 2, last: 2, segment: 0, spansGap: false },
    ]);
  });

  it("flags nothing that touches its limit: 28 against 28", () => {
    const input = seriesOf([16, 28, 29, 4, 3], 1, { model: "poisson", baseline: [0] });
    const { upperAction, lowerAction, beyondAction } = evaluateSeries(input);
    expect(upperAction[1]).toBe(28);
    expect(lowerAction[3]).toBe(4);
    expect([...beyondAction]).toEqual([0, 0, 1, 0, -1]);
  });

  it("has no limits and no signals at centre 0 or 1 or without a baseline", () => {
    const none = [
      seriesOf([0, 0, 5], 10, { baseline: [0, 1] }),
      seriesOf([10, 10, 5], 10, { baseline: [0, 1], method: "exact" }),
      seriesOf([0, 0, 5], 10, { baseline: [0], model: "poisson", method: "auto" }),
      seriesOf([1, 2, 5], 10, { baseline: [], method: "auto" }),
      seriesOf([1, 1, 9], 10, { baseline: [0, 1], method: "overdispersed" }),
    ];
    for (const input of none) {
      const evaluation = evaluateSeries(input);
      expect(evaluation.segments[0]?.hasLimits).toBe(false);
      for (const one of columnsOf(evaluation)) expect(one).toEqual(column([null, null, null]));
      expect([...evaluation.beyondAction, ...evaluation.belowDetection]).toEqual([0, 0, 0, 0, 0, 0]);
      expect(evaluation.signals).toEqual([]);
    }
    expect(evaluateSeries(none[0] as SeriesInput).centre).toEqual(column([0, 0, 0]));
    expect(evaluateSeries(none[3] as SeriesInput).segments[0]?.centre).toBeNull();
    // A rate of 1 a unit is nothing special.
    expect(evaluateSeries(seriesOf([10], 10, { model: "poisson" })).segments[0]?.hasLimits).toBe(true);
  });

  it("takes empty, single, all-zero and all-missing series", () => {
    const empty = evaluateSeries(seriesOf([], []));
    expect([empty.values.length, empty.signals.length]).toEqual([0, 0]);
    expect(evaluateSeries(seriesOf([], [], { segments: [] })).segments).toEqual([]);
    const single = evaluateSeries(seriesOf([3], [30]));
    expect(single.segments[0]).toMatchObject({ centre: 0.1, sigmaZ: null, hasLimits: true });
    expect(single.z[0]).toBe(0);
    const missing = evaluateSeries(seriesOf([null, 0, 3], [10, 0, null]));
    expect(missing.values).toEqual(column([null, null, null]));
    expect(missing.segments[0]?.hasLimits).toBe(false);
    expect(evaluateSeries(seriesOf([0, 0], [5, 6])).values).toEqual(column([0, 0]));
  });

  it("gives no limits to a month without a point, though its denominator is known", () => {
    for (const method of ["three-sigma", "exact"] as const) {
      const { upperAction, z } = evaluateSeries(seriesOf([5, null], [50, 50], { method }));
      expect(upperAction[0]).toBeGreaterThan(0.1);
      expect([upperAction[1], z[1]]).toEqual([NaN, NaN]);
    }
  });

  it("settles auto by the baseline and then keeps one kind for all months", () => {
    const input = (small: number) =>
      seriesOf([20, 20, 1], [200, small, 5], { baseline: [0, 1], method: "auto" });
    expect(evaluateSeries(input(200)).segments[0]?.method).toBe("three-sigma");
    expect(evaluateSeries(input(20)).segments[0]?.method).toBe("exact");
  });

  it("uses exact limits for the warning rule where they are in use", () => {
    // p̄ = 0.02, n = 30: 3 lies beyond 2σ, but P(X ≥ 3) = 0.0217 and P(X > 2) ≤ 0.02275 put U at 2: beyond; 2 isn't.
    const base = { baseline: [0], rules: [{ name: "two-of-three" as const }] };
    expect(signalsOf(seriesOf([20, 3, 3], [1000, 30, 30], { ...base, method: "exact" }))).toEqual([
      "0 two-of-three upper 1-2",
    ]);
    expect(signalsOf(seriesOf([20, 2, 2], [1000, 30, 30], { ...base, method: "exact" }))).toEqual([]);
  });

  it("widens limits and rules by sigma z where they allow for overdispersion", () => {
    const numerators = [40, 160, 40, 160, 40, 160, 260];
    const input = (method: "three-sigma" | "overdispersed") =>
      seriesOf(numerators, 1000, { baseline: [0, 1, 2, 3, 4, 5], method });
    const plain = evaluateSeries(input("three-sigma"));
    const wide = evaluateSeries(input("overdispersed"));
    const sigmaZ = wide.segments[0]?.sigmaZ ?? NaN;
    expect(sigmaZ).toBe(plain.segments[0]?.sigmaZ);
    expect(sigmaZ).toBeGreaterThan(5);
    expect([...plain.beyondAction]).toEqual([-1, 1, -1, 1, -1, 1, 1]);
    expect([...wide.beyondAction]).toEqual([0, 0, 0, 0, 0, 0, 0]);
    expect(wide.z).toEqual(plain.z);
    expect(wide.zRules[6]).toBeCloseTo((wide.z[6] ?? NaN) / sigmaZ, 12);
    expect(plain.zRules).toEqual(plain.z);
  });

  it("ends every run at a new segment and judges each by its own centre", () => {
    const numerators = [...Array<number>(10).fill(100), ...Array<number>(10).fill(130)];
    const both = [
      { end: 10, inBaseline: maskOf(20, [0, 1, 2, 3]) },
      { start: 10, inBaseline: maskOf(20, [10, 11, 12, 13]) },
    ];
    const oneSide = { rules: [{ name: "one-side" as const }] };
    expect(signalsOf(seriesOf(numerators, 1000, { ...oneSide, baseline: [0, 1, 2, 3] }))).toEqual([
      "0 one-side upper 10-19",
    ]);
    const cut = seriesOf(numerators, 1000, { ...oneSide, segments: both });
    expect(signalsOf(cut)).toEqual([]);
    expect(evaluateSeries(cut).centre[9]).toBe(0.1);
    expect(evaluateSeries(cut).centre[10]).toBe(0.13);
    const moved = seriesOf(numerators, 1000, {
      ...oneSide,
      segments: [
        { end: 15, inBaseline: maskOf(20, [0, 1]) },
        { start: 15, inBaseline: maskOf(20, [0, 1]) },
      ],
    });
    expect(signalsOf(moved)).toEqual([]);
  });

  it("leaves slots outside every segment with a value only", () => {
    const input = seriesOf([50, 10, 10], 100, { segments: [{ start: 1, inBaseline: maskOf(3, [1, 2]) }] });
    const { values, centre, upperAction, beyondAction } = evaluateSeries(input);
    expect(values[0]).toBe(0.5);
    expect([centre[0], upperAction[0], beyondAction[0]]).toEqual([NaN, NaN, 0]);
  });

  it("marks months that are too small to show an improvement", () => {
    const input = seriesOf([100, 0, 0, 0], [1000, 81, 82, 10], { baseline: [0] });
    expect([...evaluateSeries(input).belowDetection]).toEqual([0, 1, 0, 1]);
    expect([...evaluateSeries({ ...input, betterWhen: "neither" }).belowDetection]).toEqual([0, 1, 0, 1]);
    expect([...evaluateSeries({ ...input, betterWhen: "higher" }).belowDetection]).toEqual([0, 0, 0, 0]);
    const exact = seriesOf([100, 0, 0, 0], [1000, 62, 63, 10], { baseline: [0], method: "exact" });
    expect([...evaluateSeries(exact).belowDetection]).toEqual([0, 1, 0, 1]);
    const high = seriesOf([900, 81, 82, 10], [1000, 81, 82, 10], { baseline: [0], betterWhen: "higher" });
    expect([...evaluateSeries(high).belowDetection]).toEqual([0, 1, 0, 1]);
  });

  it("gives the figures of a u chart on any exposure", () => {
    const input = seriesOf([14, 12], [10, 8.5], { model: "poisson", method: "exact" });
    const { upperAction } = evaluateSeries(input);
    expect((upperAction[1] ?? NaN) * 8.5).toBeCloseTo(Math.round((upperAction[1] ?? NaN) * 8.5), 10);
  });

  it("stays right at ten million and one in a thousand million", () => {
    const large = seriesOf([5_000_000, 4_995_257, 4_995_256, 1], [1e7, 1e7, 1e7, 1], {
      baseline: [0],
      method: "exact",
    });
    expect([...evaluateSeries(large).beyondAction]).toEqual([0, 0, -1, 0]);
    const rare = seriesOf([1, 1, 2, 0], [1e9, 1e7, 1e7, 1], { baseline: [0], method: "auto" });
    const evaluation = evaluateSeries(rare);
    expect(evaluation.segments[0]).toMatchObject({ centre: 1e-9, method: "exact" });
    expect([...evaluation.beyondAction]).toEqual([0, 0, 1, 0]);
  });
});

describe("properties of a series", () => {
  const month = fc.integer({ min: 1, max: 300 }).chain((n) => fc.tuple(fc.nat(n), fc.constant(n)));
  const series = fc.record({
    months: fc.array(month, { minLength: 1, maxLength: 40 }),
    at: fc.nat(),
    method: fc.constantFrom<"auto" | "three-sigma" | "exact">("auto", "three-sigma", "exact"),
    model: fc.constantFrom<"binomial" | "poisson">("binomial", "poisson"),
  });
  const rules = (
    ["beyond-action", "two-of-three", "one-side", "four-of-five", "trend", "within-one-sigma"] as const
  ).map((name) => ({ name, ...(name === "within-one-sigma" || name === "trend" ? { length: 4 } : {}) }));

  it("an empty month changes no run and no other month's limits", () => {
    fc.assert(
      fc.property(series, fc.constantFrom(null, 0), ({ months, at, method, model }, emptySize) => {
        const place = at % (months.length + 1);
        const numerators: (number | null)[] = months.map(([x]) => x);
        const sizes: (number | null)[] = months.map(([, n]) => n);
        const plain = evaluateSeries(seriesOf(numerators, sizes, { method, model, rules }));
        const holed = evaluateSeries(
          seriesOf(numerators.toSpliced(place, 0, 0), sizes.toSpliced(place, 0, emptySize), {
            method,
            model,
            rules,
          }),
        );
        const moved = (slot: number) => (slot >= place ? slot + 1 : slot);
        columnsOf(plain).forEach((one, index) => {
          const other = columnsOf(holed)[index];
          one.forEach((value, slot) => expect(other?.[moved(slot)]).toBe(value));
          expect(other?.[place]).toBeNaN();
        });
        expect(holed.signals.map(({ rule, side, first, last }) => ({ rule, side, first, last }))).toEqual(
          plain.signals.map(({ rule, side, first, last }) => ({
            rule,
            side,
            first: moved(first),
            last: moved(last),
          })),
        );
        for (const { first, last, spansGap } of holed.signals) {
          expect(spansGap).toBe(first < place && place < last);
        }
      }),
    );
  });

  it("a signal begins and ends at plotted months of its segment", () => {
    fc.assert(
      fc.property(series, ({ months, method, model }) => {
        const input = seriesOf(
          months.map(([x]) => x),
          months.map(([, n]) => n),
          { method, model, rules },
        );
        const { signals, values } = evaluateSeries(input);
        for (const { first, last } of signals) {
          expect(first).toBeLessThanOrEqual(last);
          expect(values[first]).not.toBeNaN();
          expect(values[last]).not.toBeNaN();
        }
      }),
    );
  });
});

describe("what can't be charted is refused", () => {
  it.each([
    ["columns of different lengths", seriesOf([1, 2], [1])],
    ["a negative numerator", seriesOf([-1], [10])],
    ["half an event", seriesOf([0.5], [10])],
    ["a numerator above the denominator of a proportion", seriesOf([11], [10])],
    ["half a unit of a proportion", seriesOf([1], [10.5])],
    ["a negative denominator", seriesOf([1], [-1], { model: "poisson" })],
    ["an endless denominator", seriesOf([1], [Infinity], { model: "poisson" })],
    ["a segment beyond the series", seriesOf([1], [10], { segments: [{ end: 2 }] })],
    ["overlapping segments", seriesOf([1, 1], [10, 10], { segments: [{}, { start: 1 }] })],
    [
      "a segment that ends before it starts",
      seriesOf([1, 1], [10, 10], { segments: [{ start: 1, end: 0 }] }),
    ],
    ["a mask of another length", seriesOf([1], [10], { segments: [{ inBaseline: maskOf(2) }] })],
  ])("%s", (_, input) => {
    expect(() => evaluateSeries(input)).toThrow(RangeError);
  });

  it("but more events than units are fine for a rate", () => {
    expect(evaluateSeries(seriesOf([11], [10], { model: "poisson" })).values[0]).toBe(1.1);
  });
});
