import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cChartLimits, npChartLimits, pChartLimits, sigmaVerdict, uChartLimits, zScore } from "@/lib/limits";
import { column } from "./series-builder";

const centres = fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true });
const sizes = fc.integer({ min: 1, max: 10_000_000 });

describe("p and u chart limits", () => {
  it("narrow as the denominator grows, around the same centre", () => {
    fc.assert(
      fc.property(centres, sizes, sizes, fc.double({ min: 0.5, max: 9, noNaN: true }), (centre, a, b, k) => {
        const ordered = column([Math.min(a, b), Math.max(a, b)]);
        for (const limits of [pChartLimits, uChartLimits]) {
          const { lower, upper } = limits(centre, ordered, k);
          expect(lower[1]).toBeGreaterThanOrEqual(lower[0] ?? NaN);
          expect(upper[1]).toBeLessThanOrEqual(upper[0] ?? NaN);
          expect(lower[1]).toBeLessThanOrEqual(centre);
          expect(upper[1]).toBeGreaterThanOrEqual(centre);
        }
      }),
    );
  });

  it("widen with k", () => {
    const narrow = pChartLimits(0.3, column([100]), 2);
    const wide = pChartLimits(0.3, column([100]), 3);
    expect(wide.upper[0]).toBeCloseTo(0.3 + 3 * Math.sqrt(0.0021), 12);
    expect(narrow.upper[0]).toBeCloseTo(0.3 + 2 * Math.sqrt(0.0021), 12);
    expect(wide.lower[0]).toBeLessThan(narrow.lower[0] ?? NaN);
  });

  it("are clipped, and don't exist without a denominator", () => {
    expect(pChartLimits(0.95, column([5, 0, null]), 3).upper).toEqual(column([1, null, null]));
    expect(pChartLimits(0.05, column([5]), 3).lower[0]).toBe(0);
    expect(uChartLimits(0.001, column([5, 0]), 3).lower).toEqual(column([0, null]));
  });

  it("end in 0 where the formula does but for rounding", () => {
    // k²(1 − p̄)/p̄ is 81 exactly at p̄ = 0.1.
    expect(pChartLimits(0.1, column([81, 82]), 3).lower[0]).toBe(0);
    expect(pChartLimits(0.1, column([81, 82]), 3).lower[1]).toBeGreaterThan(0);
    expect(uChartLimits(0.1, column([90, 91]), 3).lower[0]).toBe(0);
  });

  it("collapse at the ends and refuse what lies outside", () => {
    expect(pChartLimits(1, column([10]), 3)).toEqual({ lower: column([1]), upper: column([1]) });
    expect(uChartLimits(0, column([10]), 3)).toEqual({ lower: column([0]), upper: column([0]) });
    expect(() => pChartLimits(1.1, column([10]), 3)).toThrow(RangeError);
    expect(() => pChartLimits(NaN, column([10]), 3)).toThrow(RangeError);
    expect(() => pChartLimits(0.1, column([10]), 0)).toThrow(RangeError);
    expect(() => uChartLimits(-1, column([10]), 3)).toThrow(RangeError);
    expect(() => uChartLimits(1, column([10]), Infinity)).toThrow(RangeError);
  });
});

describe("np and c charts", () => {
  it("are the p and u charts on the scale of counts", () => {
    const np = npChartLimits(0.2, 50, 3);
    const p = pChartLimits(0.2, column([50]), 3);
    expect(np).toEqual({
      centre: 10,
      sigma: Math.sqrt(8),
      lower: 50 * (p.lower[0] ?? NaN),
      upper: 50 * (p.upper[0] ?? NaN),
    });
    expect(cChartLimits(16, 3)).toEqual({ centre: 16, sigma: 4, lower: 4, upper: 28 });
  });

  it("refuse sizes that aren't whole", () => {
    expect(() => npChartLimits(0.2, 0, 3)).toThrow(RangeError);
    expect(() => npChartLimits(0.2, 1.5, 3)).toThrow(RangeError);
  });
});

describe("sigmaVerdict", () => {
  it("doesn't flag a count that touches its limit", () => {
    expect(sigmaVerdict("poisson", 28, 1, 16, 3)).toBe(0);
    expect(sigmaVerdict("poisson", 29, 1, 16, 3)).toBe(1);
    expect(sigmaVerdict("poisson", 4, 1, 16, 3)).toBe(0);
    expect(sigmaVerdict("poisson", 3, 1, 16, 3)).toBe(-1);
    expect(sigmaVerdict("binomial", 0, 81, 0.1, 3)).toBe(0);
    expect(sigmaVerdict("binomial", 81, 81, 0.9, 3)).toBe(0);
  });

  it("decides touching points as whole numbers do", () => {
    // With c = s² and n = 1 the limits s² ± 3s are whole; thirds and sevenths of a unit blur them in floating point.
    fc.assert(
      fc.property(fc.integer({ min: 4, max: 3000 }), fc.constantFrom(1, 3, 7, 11, 49), (root, n) => {
        const centre = (root * root) / n;
        expect(sigmaVerdict("poisson", root * root + 3 * root, n, centre, 3)).toBe(0);
        expect(sigmaVerdict("poisson", root * root + 3 * root + 1, n, centre, 3)).toBe(1);
        expect(sigmaVerdict("poisson", root * root - 3 * root, n, centre, 3)).toBe(0);
        expect(sigmaVerdict("poisson", root * root - 3 * root - 1, n, centre, 3)).toBe(-1);
      }),
    );
  });

  it("flags nothing against a band of no width", () => {
    expect(sigmaVerdict("binomial", 1, 10, 0, 3)).toBe(0);
    expect(sigmaVerdict("binomial", 9, 10, 1, 3)).toBe(0);
  });
});

describe("zScore", () => {
  it("is exactly 0 on the centre, however the division rounds", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 9999 }), fc.integer({ min: 1, max: 1000 }), (x, factor) => {
        expect(zScore("binomial", x * factor, 10_000 * factor, x / 10_000)).toBe(0);
      }),
    );
    expect(zScore("binomial", 1, 10_000_000, 1.00001e-7)).not.toBe(0);
  });

  it("doesn't exist where sigma is 0", () => {
    expect(zScore("binomial", 0, 12, 0)).toBeNaN();
    expect(zScore("binomial", 12, 12, 1)).toBeNaN();
    expect(zScore("poisson", 1, 12, 0)).toBeNaN();
  });
});
