import { describe, expect, it } from "vitest";
import { overdispersion } from "@/lib/limits";
import { column, maskOf } from "./series-builder";

const counts = { numerators: column([3, null, 9, 3, 3]), denominators: column([50, 50, 50, 50, 50]) };

describe("overdispersion", () => {
  it("takes moving ranges across gaps and left-out months", () => {
    const { movingRanges, meanMovingRange, sigmaZ } = overdispersion(
      "binomial",
      counts,
      0.12,
      maskOf(5, [0, 1, 2]),
    );
    const range = 6 / Math.sqrt(50 * 0.12 * 0.88);
    expect(movingRanges).toHaveLength(1);
    expect(meanMovingRange).toBeCloseTo(range, 12);
    expect(sigmaZ).toBeCloseTo(range / 1.128, 12);
    expect(overdispersion("binomial", counts, 0.12, maskOf(5, [0, 3, 4])).movingRanges).toHaveLength(2);
  });

  it("isn't there with one month, without spread, or at centre 0", () => {
    expect(overdispersion("binomial", counts, 0.12, maskOf(5, [2]))).toMatchObject({
      meanMovingRange: null,
      sigmaZ: null,
    });
    expect(overdispersion("binomial", counts, 0.12, maskOf(5, [3, 4])).sigmaZ).toBeNull();
    expect(overdispersion("binomial", counts, 0, maskOf(5)).sigmaZ).toBeNull();
  });
});
