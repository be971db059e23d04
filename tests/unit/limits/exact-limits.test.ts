import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  ACTION_TAIL,
  exactLimit,
  lowerTail,
  markExactLimits,
  midPSignals,
  upperTail,
  type CountModel,
} from "@/lib/limits";
import { column } from "./series-builder";

const models = fc.constantFrom<CountModel>("binomial", "poisson");
const centres = fc.oneof(
  fc.double({ min: 1e-9, max: 1, noNaN: true }),
  fc.double({ min: 1e-6, max: 0.05, noNaN: true }),
);
const sizes = fc.oneof(fc.integer({ min: 1, max: 500 }), fc.integer({ min: 1, max: 200_000 }));
const tails = fc.double({ min: 1e-6, max: 0.4, noNaN: true });

describe("exactLimit", () => {
  it("is the smallest count that satisfies its inequality", () => {
    fc.assert(
      fc.property(models, sizes, centres, tails, (model, n, centre, tail) => {
        const lower = exactLimit(model, "lower", n, centre, tail);
        const upper = exactLimit(model, "upper", n, centre, tail);
        const slack = 1e-11;
        expect(lowerTail(model, lower, n, centre)).toBeGreaterThanOrEqual(tail * (1 - slack));
        expect(lowerTail(model, lower - 1, n, centre)).toBeLessThan(tail);
        expect(upperTail(model, upper + 1, n, centre)).toBeLessThanOrEqual(tail * (1 + slack));
        if (upper > 0) expect(upperTail(model, upper, n, centre)).toBeGreaterThan(tail);
        expect(lower).toBeLessThanOrEqual(upper);
      }),
      { numRuns: 300 },
    );
  });

  it("widens as the tail shrinks, and rises with the centre", () => {
    fc.assert(
      fc.property(models, sizes, centres, centres, tails, tails, (model, n, c1, c2, t1, t2) => {
        const [small, large] = t1 < t2 ? [t1, t2] : [t2, t1];
        const [less, more] = c1 < c2 ? [c1, c2] : [c2, c1];
        const of = (side: "lower" | "upper", centre: number, tail: number) =>
          exactLimit(model, side, n, centre, tail);
        expect(of("lower", c1, small)).toBeLessThanOrEqual(of("lower", c1, large));
        expect(of("upper", c1, small)).toBeGreaterThanOrEqual(of("upper", c1, large));
        expect(of("lower", less, t1)).toBeLessThanOrEqual(of("lower", more, t1));
        expect(of("upper", less, t1)).toBeLessThanOrEqual(of("upper", more, t1));
      }),
    );
  });

  it("holds at the extremes", () => {
    const both = (model: CountModel, n: number, centre: number) => [
      exactLimit(model, "lower", n, centre, ACTION_TAIL),
      exactLimit(model, "upper", n, centre, ACTION_TAIL),
    ];
    expect(both("binomial", 1, 0)).toEqual([0, 0]);
    expect(both("binomial", 10_000_000, 0)).toEqual([0, 0]);
    expect(both("binomial", 10_000_000, 1)).toEqual([10_000_000, 10_000_000]);
    expect(both("binomial", 10_000_000, 1e-9)).toEqual([0, 1]);
    expect(both("binomial", 1, 0.5)).toEqual([0, 1]);
    expect(both("poisson", 100, 0)).toEqual([0, 0]);
    expect(both("poisson", 1, 1e6)).toEqual([997_001, 1_003_001]);
    expect(both("poisson", 0.5, 222)).toEqual(both("poisson", 1, 111));
  });

  it("counts a tail that is α but for rounding as α", () => {
    expect(exactLimit("binomial", "upper", 1, 0.00135, 0.00135)).toBe(0);
    expect(exactLimit("binomial", "lower", 1, 1 - 0.00135, 0.00135)).toBe(0);
  });

  it("refuses arguments outside their domain", () => {
    expect(() => exactLimit("binomial", "lower", 0, 0.5, 0.01)).toThrow(RangeError);
    expect(() => exactLimit("binomial", "lower", 10.5, 0.5, 0.01)).toThrow(RangeError);
    expect(() => exactLimit("binomial", "lower", 10, 1.5, 0.01)).toThrow(RangeError);
    expect(() => exactLimit("poisson", "upper", 10, 0.5, 0)).toThrow(RangeError);
    expect(() => exactLimit("poisson", "upper", 10, 0.5, 1)).toThrow(RangeError);
  });
});

describe("markExactLimits", () => {
  it("gives each month its own limits and verdict, sharing equal denominators", () => {
    const counts = { numerators: column([0, 3, null, 2, 3, 0]), denominators: column([12, 3, 10, 3, 3, 0]) };
    const verdicts = new Int8Array(6);
    const { lower, upper } = markExactLimits("binomial", counts, 4 / 66, ACTION_TAIL, verdicts);
    expect([...verdicts]).toEqual([0, 1, 0, 0, 1, 0]);
    expect(upper).toEqual(column([4 / 12, 2 / 3, null, 2 / 3, 2 / 3, null]));
    expect(lower).toEqual(column([0, 0, null, 0, 0, null]));
  });

  it("flags low counts strictly below the limit", () => {
    const counts = { numerators: column([905, 906, 1096, 1097]), denominators: column([1, 1, 1, 1]) };
    const verdicts = new Int8Array(4);
    markExactLimits("poisson", counts, 1000, ACTION_TAIL, verdicts);
    expect([...verdicts]).toEqual([-1, 0, 0, 1]);
  });
});

describe("midPSignals", () => {
  it("lies on the exact limit or one beyond it", () => {
    fc.assert(
      fc.property(models, sizes, centres, (model, n, centre) => {
        const { low, high } = midPSignals(model, n, centre, ACTION_TAIL);
        const lower = exactLimit(model, "lower", n, centre, ACTION_TAIL);
        const upper = exactLimit(model, "upper", n, centre, ACTION_TAIL);
        expect([lower - 1, lower]).toContain(low ?? -1);
        expect([upper, upper + 1]).toContain(high ?? n + 1);
      }),
    );
  });
});
