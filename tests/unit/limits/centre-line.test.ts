import { describe, expect, it } from "vitest";
import { centreLine } from "@/lib/limits";
import { column, maskOf } from "./series-builder";

describe("centreLine", () => {
  it("divides totals, not the mean of the rates", () => {
    const counts = { numerators: column([3, 24]), denominators: column([25, 400]) };
    expect(centreLine(counts, maskOf(2))).toEqual({
      numerator: 27,
      denominator: 425,
      months: 2,
      centre: 27 / 425,
    });
  });

  it("passes over missing months, denominator 0 and months left out", () => {
    const counts = { numerators: column([3, null, 2, 0, 9]), denominators: column([10, 10, null, 0, 10]) };
    expect(centreLine(counts, maskOf(5, [0, 1, 2, 3])).centre).toBe(0.3);
  });

  it("has no centre where nothing is plotted", () => {
    const counts = { numerators: column([null, 0]), denominators: column([10, 0]) };
    expect(centreLine(counts, maskOf(2))).toMatchObject({ months: 0, centre: null });
    expect(centreLine({ numerators: column([]), denominators: column([]) }, maskOf(0)).centre).toBeNull();
  });

  it("refuses columns of different lengths", () => {
    const counts = { numerators: column([1]), denominators: column([1, 2]) };
    expect(() => centreLine(counts, maskOf(1))).toThrow(RangeError);
    expect(() => centreLine({ ...counts, denominators: column([1]) }, maskOf(2))).toThrow(RangeError);
  });
});
