import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  binomialLogLowerTail,
  binomialLogUpperTail,
  binomialLowerTail,
  binomialMass,
  binomialUpperTail,
  chanceOfCount,
  poissonLogLowerTail,
  poissonLogUpperTail,
  poissonLowerTail,
  poissonMass,
  poissonUpperTail,
} from "@/lib/limits";

/** P(X = x) by Pascal's triangle, exact enough for small n. */
function directMass(x: number, n: number, p: number): number {
  let ways = 1;
  for (let i = 1; i <= x; i += 1) ways = (ways * (n - x + i)) / i;
  return ways * p ** x * (1 - p) ** (n - x);
}

function sumOf(from: number, to: number, mass: (x: number) => number): number {
  let sum = 0;
  for (let x = from; x <= to; x += 1) sum += mass(x);
  return sum;
}

function expectClose(actual: number, expected: number, relative = 1e-11): void {
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(relative * Math.abs(expected) + 1e-300);
}

const probabilities = fc.oneof(
  fc.double({ min: 0, max: 1, noNaN: true }),
  fc.constantFrom(0, 1, 1e-9, 0.5, 1 - 1e-9),
);

describe("binomial tails", () => {
  it("agree with direct sums for small n", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 40 }), fc.nat(40), probabilities, (n, x, p) => {
        const upper = sumOf(x, n, (j) => directMass(j, n, p));
        const lower = sumOf(0, Math.min(x, n), (j) => directMass(j, n, p));
        expectClose(binomialUpperTail(x, n, p), upper, 1e-12);
        expectClose(binomialLowerTail(x, n, p), lower, 1e-12);
        expectClose(binomialMass(x, n, p), x > n ? 0 : directMass(x, n, p), 1e-12);
      }),
    );
  });

  it("rise and fall with the count, and sum to one", () => {
    const sizes = fc.integer({ min: 1, max: 100_000 });
    fc.assert(
      fc.property(sizes, fc.nat(), fc.double({ min: 1e-9, max: 1, noNaN: true }), (n, seed, p) => {
        const x = seed % (n + 1);
        expect(binomialUpperTail(x, n, p)).toBeGreaterThanOrEqual(binomialUpperTail(x + 1, n, p));
        expect(binomialLowerTail(x, n, p)).toBeLessThanOrEqual(binomialLowerTail(x + 1, n, p));
        expectClose(binomialLowerTail(x, n, p) + binomialUpperTail(x + 1, n, p), 1, 1e-10);
      }),
    );
  });

  it("hold at the extremes of n and p", () => {
    expect(binomialUpperTail(0, 0, 0.3)).toBe(1);
    expect(binomialLowerTail(0, 0, 0.3)).toBe(1);
    expect(binomialUpperTail(1, 0, 0.3)).toBe(0);
    expect(binomialUpperTail(1, 10, 0)).toBe(0);
    expect(binomialLowerTail(0, 10, 0)).toBe(1);
    expect(binomialUpperTail(10, 10, 1)).toBe(1);
    expect(binomialLowerTail(9, 10, 1)).toBe(0);
    expect(binomialLowerTail(-1, 10, 0.5)).toBe(0);
    expect(binomialLowerTail(11, 10, 0.5)).toBe(1);
    expectClose(binomialUpperTail(1, 1, 1e-9), 1e-9);
    // 1 − (1 − 10⁻⁹)^(10⁷) = 0.00995016625…, by its series.
    expectClose(binomialUpperTail(1, 10_000_000, 1e-9), -Math.expm1(1e7 * Math.log1p(-1e-9)));
    expectClose(binomialUpperTail(2, 10_000_000, 1e-9), 4.96679084e-5, 1e-8);
  });

  it("mirror each other: x events are n − x non-events", () => {
    for (const [x, n, p] of [
      [3, 50, 0.25],
      [5_004_744, 10_000_000, 0.5],
      [40, 100_000, 0.0009765625],
    ] as const) {
      expectClose(binomialUpperTail(x, n, p), binomialLowerTail(n - x, n, 1 - p), 1e-10);
    }
  });

  it("keep their logarithm where the probability underflows", () => {
    expect(binomialUpperTail(200, 200, 0.01)).toBe(0);
    expectClose(binomialLogUpperTail(200, 200, 0.01), 200 * Math.log(0.01));
    expectClose(binomialLogLowerTail(0, 10_000_000, 0.5), 1e7 * Math.log(0.5));
    expect(binomialLogUpperTail(1, 10, 0)).toBe(-Infinity);
    expectClose(binomialUpperTail(100, 100, 0.001), 1e-300);
  });

  it("refuse arguments outside their domain", () => {
    expect(() => binomialUpperTail(0.5, 10, 0.5)).toThrow(RangeError);
    expect(() => binomialLowerTail(NaN, 10, 0.5)).toThrow(RangeError);
    expect(() => binomialUpperTail(1, -1, 0.5)).toThrow(RangeError);
    expect(() => binomialUpperTail(0, 10.5, 0.5)).toThrow(RangeError);
    expect(() => binomialLowerTail(1, 10, 1.5)).toThrow(RangeError);
    expect(() => binomialMass(1, 10, NaN)).toThrow(RangeError);
    expect(binomialMass(-1, 10, 0.5)).toBe(0);
  });
});

describe("Poisson tails", () => {
  it("agree with direct sums for small means", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-9, max: 30, noNaN: true }), fc.nat(60), (mean, x) => {
        const mass = (j: number): number => (j === 0 ? Math.exp(-mean) : (mass(j - 1) * mean) / j);
        expectClose(poissonMass(x, mean), mass(x), 1e-11);
        expectClose(poissonLowerTail(x, mean), sumOf(0, x, mass), 1e-11);
        expectClose(poissonUpperTail(x, mean), sumOf(x, x + 200, mass), 1e-11);
      }),
    );
  });

  it("stay right past a mean of 111, where power and factorial overflow", () => {
    for (const mean of [110, 111, 112, 170, 171, 1000]) {
      const total = sumOf(0, 4 * mean, (x) => poissonMass(x, mean));
      expectClose(total, 1, 1e-12);
      expectClose(
        sumOf(0, mean, (x) => poissonMass(x, mean)),
        poissonLowerTail(mean, mean),
        1e-12,
      );
      expectClose(
        sumOf(mean, 4 * mean, (x) => poissonMass(x, mean)),
        poissonUpperTail(mean, mean),
        1e-12,
      );
    }
  });

  it("stay right at a mean of a million", () => {
    expectClose(poissonLowerTail(999_999, 1e6) + poissonUpperTail(1_000_000, 1e6), 1, 1e-12);
    // Exact figures of the two limits' tails at 0.00135, from the reference cases.
    expectClose(poissonLowerTail(997_000, 1e6), 0.001346203718241105, 1e-9);
    expectClose(poissonUpperTail(1_003_002, 1e6), 0.00134915828548207, 1e-9);
  });

  it("hold at the extremes", () => {
    expect(poissonUpperTail(0, 5)).toBe(1);
    expect(poissonUpperTail(1, 0)).toBe(0);
    expect(poissonLowerTail(0, 0)).toBe(1);
    expect(poissonLowerTail(-1, 5)).toBe(0);
    expect(poissonMass(-1, 5)).toBe(0);
    expect(poissonMass(0, 0)).toBe(1);
    expect(poissonMass(2, 0)).toBe(0);
    expectClose(poissonLogLowerTail(0, 1e6), -1e6);
    expect(poissonLogUpperTail(5000, 1)).toBeLessThan(-37_000);
    expect(() => poissonUpperTail(1, -1)).toThrow(RangeError);
    expect(() => poissonUpperTail(1.5, 1)).toThrow(RangeError);
    expect(() => poissonLowerTail(1, Infinity)).toThrow(RangeError);
  });
});

describe("chanceOfCount", () => {
  it("gives both tails, each with the count itself", () => {
    const none = chanceOfCount("binomial", 0, 3, 0.5);
    expectClose(none.atMost, 0.125);
    expect(none.atLeast).toBe(1);
    const rate = chanceOfCount("poisson", 2, 100, 0.02);
    expectClose(rate.atMost, 5 * Math.exp(-2));
    expectClose(rate.atLeast, 1 - 3 * Math.exp(-2));
    expect(() => chanceOfCount("binomial", 0, 0, 0.5)).toThrow(RangeError);
  });
});
