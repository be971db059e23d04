import { describe, expect, it } from "vitest";
import { isSmallCount, settleMethod } from "@/lib/limits";
import { column, maskOf } from "./series-builder";

describe("settleMethod", () => {
  const numerators = column([5, 5, 5, null]);
  const settle = (model: "binomial" | "poisson", sizes: number[], centre: number, slots?: number[]) =>
    settleMethod(model, { numerators, denominators: column(sizes) }, centre, maskOf(4, slots));

  it("takes exact limits where any baseline month is small", () => {
    expect(settle("binomial", [50, 50, 50, 50], 0.1)).toBe("three-sigma");
    expect(settle("binomial", [50, 49, 50, 50], 0.1)).toBe("exact");
    expect(settle("binomial", [50, 49, 50, 50], 0.1, [0, 2])).toBe("three-sigma");
    expect(settle("binomial", [50, 50, 50, 1], 0.1)).toBe("three-sigma");
  });

  it("looks at non-events of proportions only", () => {
    expect(settle("binomial", [50, 49, 50, 50], 0.9)).toBe("exact");
    expect(settle("poisson", [50, 49, 50, 50], 0.9)).toBe("three-sigma");
    expect(settle("poisson", [50, 49, 50, 50], 0.1)).toBe("exact");
  });

  it("doesn't call an expectation of 5 small, however it rounds", () => {
    expect(isSmallCount("binomial", 50, 0.1)).toBe(false);
    expect(isSmallCount("binomial", 4.999999999999999 * 10, 0.1)).toBe(false);
    expect(isSmallCount("binomial", 50, 1 - 0.1)).toBe(false);
  });
});
