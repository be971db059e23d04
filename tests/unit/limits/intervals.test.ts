import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  byarInterval,
  clopperPearsonInterval,
  garwoodInterval,
  lowerTail,
  midPInterval,
  normalQuantile,
  upperTail,
  wilsonInterval,
} from "@/lib/limits";

describe("intervals of a proportion", () => {
  it("hold the observed share and lie within one another's bounds", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 500 }), fc.nat(), (n, seed) => {
        const x = seed % (n + 1);
        const exact = clopperPearsonInterval(x, n);
        const midP = midPInterval(x, n);
        const wilson = wilsonInterval(x, n);
        for (const interval of [exact, midP, wilson]) {
          expect(interval?.low).toBeGreaterThanOrEqual(0);
          expect(interval?.low).toBeLessThanOrEqual(x / n + 1e-12);
          expect(interval?.high).toBeGreaterThanOrEqual(x / n - 1e-12);
          expect(interval?.high).toBeLessThanOrEqual(1);
        }
        expect(midP?.low).toBeGreaterThanOrEqual(exact?.low ?? NaN);
        expect(midP?.high).toBeLessThanOrEqual(exact?.high ?? NaN);
      }),
    );
  });

  it("don't exist for nothing out of nothing", () => {
    expect(wilsonInterval(0, 0)).toBeNull();
    expect(clopperPearsonInterval(0, 0)).toBeNull();
    expect(midPInterval(0, 0)).toBeNull();
  });

  it("refuse more events than units, broken counts and a confidence of 1", () => {
    for (const interval of [wilsonInterval, clopperPearsonInterval, midPInterval]) {
      expect(() => interval(2, 1)).toThrow(RangeError);
      expect(() => interval(0.5, 1)).toThrow(RangeError);
      expect(() => interval(1, 2, 1)).toThrow(RangeError);
    }
  });
});

describe("intervals of a rate", () => {
  it("leave half the error in each tail", () => {
    for (const x of [1, 7, 112, 5000]) {
      const { low, high } = garwoodInterval(x, 250);
      expect(upperTail("poisson", x, 250, low)).toBeCloseTo(0.025, 9);
      expect(lowerTail("poisson", x, 250, high)).toBeCloseTo(0.025, 9);
      const byar = byarInterval(x, 250);
      expect(Math.abs(byar.high / high - 1)).toBeLessThan(0.002);
    }
  });

  it("begin at 0 for no event", () => {
    expect(garwoodInterval(0, 10).low).toBe(0);
    expect(byarInterval(0, 10).low).toBe(0);
    expect(garwoodInterval(0, 10).high).toBeCloseTo(-Math.log(0.025) / 10, 12);
  });

  it("refuse an exposure of 0 and broken counts", () => {
    for (const interval of [garwoodInterval, byarInterval]) {
      expect(() => interval(1, 0)).toThrow(RangeError);
      expect(() => interval(-1, 1)).toThrow(RangeError);
      expect(() => interval(1, 1, 0)).toThrow(RangeError);
    }
  });
});

describe("normalQuantile", () => {
  it("agrees with tabulated values in all its ranges", () => {
    // Values of the standard normal table; the last two lie in the near and the far tail of the algorithm.
    expect(normalQuantile(0.5)).toBe(0);
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 14);
    expect(normalQuantile(0.6)).toBeCloseTo(0.2533471031357997, 14);
    expect(normalQuantile(1e-10)).toBeCloseTo(-6.361340902404056, 12);
    expect(normalQuantile(1e-30)).toBeCloseTo(-11.464024988353, 5);
  });

  it("is symmetric and rises", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 0.5, noNaN: true }), (p) => {
        expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 8);
        expect(normalQuantile(p)).toBeGreaterThanOrEqual(normalQuantile(p * 0.9));
      }),
    );
    expect(() => normalQuantile(0)).toThrow(RangeError);
    expect(() => normalQuantile(1)).toThrow(RangeError);
  });
});
