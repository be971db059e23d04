import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  detectableRate,
  exactLimit,
  existsBasis,
  falseAlarmChance,
  isBelowDetection,
  limitBasis,
  lowerTail,
  monthsToPool,
  rateForLowerTail,
  rateForUpperTail,
  ruleOfThree,
  sigmaScale,
  signallingCounts,
  sigmaVerdict,
  smallestDetectableDenominator,
  upperTail,
  zeroEventBound,
  type CountModel,
  type LimitBasis,
  type LimitMethod,
} from "@/lib/limits";

function basis(centre: number, changes: Partial<LimitBasis> = {}): LimitBasis {
  return { model: "binomial", centre, method: "three-sigma", sigmaZ: null, ...changes };
}

const models = fc.constantFrom<CountModel>("binomial", "poisson");
const methods = fc.constantFrom<LimitMethod>("three-sigma", "exact", "overdispersed");
const bases = fc
  .record({ model: models, method: methods, centre: fc.double({ min: 1e-3, max: 0.999, noNaN: true }) })
  .map((drawn): LimitBasis => ({ ...drawn, sigmaZ: 1.4 }));
const sizes = fc.integer({ min: 1, max: 5000 });

describe("signallingCounts", () => {
  it("are the edges of the verdicts", () => {
    fc.assert(
      fc.property(
        bases,
        sizes,
        fc.constantFrom<"action" | "warning">("action", "warning"),
        (one, n, band) => {
          const { low, high } = signallingCounts(one, n, band);
          const sigmas = (band === "action" ? 3 : 2) * (one.method === "overdispersed" ? 1.4 : 1);
          const tail = band === "action" ? 0.00135 : 0.02275;
          const isHigh = (x: number) =>
            one.method === "exact"
              ? x > exactLimit(one.model, "upper", n, one.centre, tail)
              : sigmaVerdict(one.model, x, n, one.centre, sigmas) === 1;
          const isLow = (x: number) =>
            one.method === "exact"
              ? x < exactLimit(one.model, "lower", n, one.centre, tail)
              : sigmaVerdict(one.model, x, n, one.centre, sigmas) === -1;
          if (high === null) expect(isHigh(n)).toBe(false);
          else expect([isHigh(high), isHigh(high - 1)]).toEqual([true, false]);
          if (low === null) expect(isLow(0)).toBe(false);
          else expect([isLow(low), isLow(low + 1)]).toEqual([true, false]);
        },
      ),
    );
  });

  it("says from how many on a month is beyond", () => {
    expect(signallingCounts(basis(234 / 2450), 110)).toEqual({ low: 1, high: 20 });
    expect(signallingCounts(basis(0.5), 3)).toEqual({ low: null, high: null });
    expect(signallingCounts(basis(0), 100)).toEqual({ low: null, high: null });
    expect(() => signallingCounts(basis(0.1), 0)).toThrow(RangeError);
  });

  it("make up the chance of a false alarm", () => {
    const one = basis(0.0955, { method: "exact" });
    const { low, high } = signallingCounts(one, 1000);
    const both =
      lowerTail("binomial", low ?? -1, 1000, 0.0955) + upperTail("binomial", high ?? 1001, 1000, 0.0955);
    expect(falseAlarmChance(one, 1000)).toBe(both);
    expect(falseAlarmChance(one, 1000)).toBeLessThanOrEqual(0.0027);
    expect(falseAlarmChance(basis(0.5), 3)).toBe(0);
  });
});

describe("below detection", () => {
  it("is where even the best count isn't beyond", () => {
    fc.assert(
      fc.property(
        bases,
        sizes,
        fc.constantFrom<"lower" | "higher">("lower", "higher"),
        (one, n, betterWhen) => {
          const { low, high } = signallingCounts(one, n);
          const isRateUpwards = one.model === "poisson" && betterWhen === "higher";
          const expected = !isRateUpwards && (betterWhen === "lower" ? low === null : high === null);
          expect(isBelowDetection(one, n, betterWhen)).toBe(expected);
        },
      ),
    );
  });

  it("ends at the smallest denominator that would do", () => {
    fc.assert(
      fc.property(
        bases,
        fc.constantFrom<"lower" | "higher" | "neither">("lower", "higher", "neither"),
        (one, way) => {
          const smallest = smallestDetectableDenominator(one, way);
          if (smallest === null) {
            expect([one.model, way]).toEqual(["poisson", "higher"]);
            return;
          }
          expect(isBelowDetection(one, smallest, way)).toBe(false);
          if (smallest > 1) expect(isBelowDetection(one, smallest - 1, way)).toBe(true);
        },
      ),
    );
  });

  it("follows the closed forms", () => {
    expect(smallestDetectableDenominator(basis(0.1), "lower")).toBe(82);
    expect(smallestDetectableDenominator(basis(0.05), "neither")).toBe(172);
    expect(smallestDetectableDenominator(basis(0.9), "higher")).toBe(82);
    expect(smallestDetectableDenominator(basis(0.1, { model: "poisson" }), "lower")).toBe(91);
    // (1 − p)^n < 0.00135 from n = 63 on at p = 0.1, and e^(−0.1·n) < 0.00135 from n = 67 on.
    expect(smallestDetectableDenominator(basis(0.1, { method: "exact" }), "lower")).toBe(63);
    expect(smallestDetectableDenominator(basis(0.9, { method: "exact" }), "higher")).toBe(63);
    expect(smallestDetectableDenominator(basis(0.1, { method: "exact", model: "poisson" }), "lower")).toBe(
      67,
    );
    // σ_z = 2 asks for four times the denominator.
    expect(smallestDetectableDenominator(basis(0.1, { method: "overdispersed", sigmaZ: 2 }), "lower")).toBe(
      325,
    );
  });

  it("doesn't arise without limits", () => {
    for (const one of [
      basis(0),
      basis(1),
      basis(0.1, { method: "overdispersed" }),
      basis(0, { model: "poisson" }),
    ]) {
      expect(existsBasis(one)).toBe(false);
      expect(isBelowDetection(one, 10, "lower")).toBe(false);
      expect(smallestDetectableDenominator(one, "lower")).toBeNull();
    }
    expect(() => existsBasis(basis(1.5))).toThrow(RangeError);
    expect(() => existsBasis(basis(-1, { model: "poisson" }))).toThrow(RangeError);
    expect(() => sigmaScale(basis(0.1, { method: "overdispersed" }))).toThrow(RangeError);
    expect(() => isBelowDetection(basis(0.1), 0, "lower")).toThrow(RangeError);
  });

  it("tells how many months to pool", () => {
    expect(monthsToPool(82, 20)).toBe(5);
    expect(monthsToPool(80, 20)).toBe(4);
    expect(monthsToPool(80, 0)).toBeNull();
    expect(() => monthsToPool(NaN, 1)).toThrow(RangeError);
    expect(() => monthsToPool(1, -1)).toThrow(RangeError);
  });
});

describe("limitBasis", () => {
  const segment = {
    start: 0,
    end: 1,
    centre: 0.1,
    method: "exact" as const,
    sigmaZ: 1.2,
    baselineMonths: 1,
    baselineExpected: 1,
    hasLimits: true,
  };

  it("carries over what limits depend on, or nothing", () => {
    expect(limitBasis("poisson", segment)).toEqual({
      model: "poisson",
      centre: 0.1,
      method: "exact",
      sigmaZ: 1.2,
    });
    expect(limitBasis("poisson", { ...segment, hasLimits: false })).toBeNull();
    expect(limitBasis("poisson", { ...segment, centre: null })).toBeNull();
  });
});

describe("power of a month", () => {
  it("is the rate at which the signalling count has that probability", () => {
    fc.assert(
      fc.property(bases, sizes, fc.constantFrom(0.5, 0.8), (one, n, power) => {
        const { low, high } = signallingCounts(one, n);
        const rise = detectableRate(one, n, power, "upper");
        const fall = detectableRate(one, n, power, "lower");
        expect(rise === null).toBe(high === null);
        expect(fall === null).toBe(low === null);
        if (rise !== null) expect(upperTail(one.model, high ?? 0, n, rise)).toBeCloseTo(power, 8);
        if (fall !== null) expect(lowerTail(one.model, low ?? 0, n, fall)).toBeCloseTo(power, 8);
      }),
      { numRuns: 60 },
    );
  });

  it("needs a larger rise for a higher probability, and a smaller one with more denominator", () => {
    const at = (n: number, power: number) =>
      detectableRate(basis(0.05, { method: "exact" }), n, power, "upper");
    expect(at(50, 0.8)).toBeGreaterThan(at(50, 0.5) ?? NaN);
    expect(at(5000, 0.8)).toBeLessThan(at(50, 0.8) ?? NaN);
  });

  it("is settled at once at the ends", () => {
    expect(rateForUpperTail("binomial", 0, 10, 0.5)).toBe(0);
    expect(rateForUpperTail("binomial", 11, 10, 0.5)).toBeNull();
    expect(rateForLowerTail("binomial", 10, 10, 0.5)).toBeNull();
    expect(rateForLowerTail("poisson", 0, 10, 0.5)).toBeCloseTo(Math.LN2 / 10, 14);
    expect(() => rateForUpperTail("binomial", 1, 10, 1)).toThrow(RangeError);
    expect(() => rateForLowerTail("binomial", -1, 10, 0.5)).toThrow(RangeError);
  });
});

describe("zero events", () => {
  it("leave an upper bound", () => {
    expect(zeroEventBound("binomial", 1)).toBeCloseTo(0.95, 14);
    expect(zeroEventBound("binomial", 100)).toBeCloseTo(1 - 0.05 ** 0.01, 13);
    expect(zeroEventBound("poisson", 100)).toBeCloseTo(-Math.log(0.05) / 100, 14);
    expect(ruleOfThree(100)).toBe(0.03);
    expect(() => zeroEventBound("binomial", 0)).toThrow(RangeError);
    expect(() => zeroEventBound("binomial", 1, 1)).toThrow(RangeError);
    expect(() => ruleOfThree(0)).toThrow(RangeError);
  });
});
