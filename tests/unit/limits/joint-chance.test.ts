import { describe, expect, it } from "vitest";
import { pooledChance, runChance, sideChance, upperTail } from "@/lib/limits";
import { column } from "./series-builder";

describe("sideChance", () => {
  it("counts strictly above or below the centre", () => {
    // n·p̄ = 1: P(X > 1) and P(X < 1) of 4 at ¼.
    expect(sideChance("binomial", "upper", 4, 0.25)).toBeCloseTo(1 - 0.75 ** 4 - 0.75 ** 3, 12);
    expect(sideChance("binomial", "lower", 4, 0.25)).toBeCloseTo(0.75 ** 4, 12);
    // n·ū = 0.5: any event is above.
    expect(sideChance("poisson", "upper", 10, 0.05)).toBeCloseTo(1 - Math.exp(-0.5), 12);
    expect(sideChance("poisson", "lower", 10, 0.05)).toBeCloseTo(Math.exp(-0.5), 12);
  });

  it("takes n·p̄ as whole where it is but for rounding", () => {
    // 0.1 · 30 is 3.0000000000000004 or 3 by the order of rounding; 3 itself is on the centre.
    expect(sideChance("binomial", "lower", 30, 0.1)).toBeCloseTo(1 - upperTail("binomial", 3, 30, 0.1), 12);
    expect(sideChance("binomial", "upper", 10, 0.7)).toBeCloseTo(upperTail("binomial", 8, 10, 0.7), 12);
  });
});

describe("chances of several months", () => {
  const counts = { numerators: column([0, null, 2, 1]), denominators: column([10, 10, 20, 0]) };

  it("multiply for a run, over plotted months only", () => {
    const expected = sideChance("binomial", "lower", 10, 0.1) * sideChance("binomial", "lower", 20, 0.1);
    expect(runChance("binomial", counts, 0.1, "lower", 0, 3)).toBe(expected);
    expect(runChance("binomial", counts, 0.1, "lower", 1, 1)).toBe(1);
  });

  it("pool to one month", () => {
    const pooled = pooledChance("binomial", counts, 0.1, 0, 3);
    expect(pooled).toMatchObject({ numerator: 2, denominator: 30 });
    expect(pooled?.atLeast).toBe(upperTail("binomial", 2, 30, 0.1));
    expect(pooledChance("binomial", counts, 0.1, 1, 1)).toBeNull();
  });
});
