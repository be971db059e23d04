import { describe, expect, it } from "vitest";
import { compareWithUsual, usualRange } from "@/lib/indicators/tally-usual-range";

describe("usualRange", () => {
  it("leaves blanks out and needs three months", () => {
    expect(usualRange([2, null, 0, 4])).toEqual({ least: 0, most: 4, months: 3 });
    expect(usualRange([2, null, 0])).toBeNull();
  });
});

describe("compareWithUsual", () => {
  const small = { least: 0, most: 4, months: 7 };
  const large = { least: 1_800, most: 2_700, months: 7 };

  it.each([
    [0, "within"],
    [4, "within"],
    [5, "above"],
    [9, "above"],
    [10, "well-above"],
  ])("%i against 0 to 4 is %s", (count, verdict) => {
    expect(compareWithUsual(count, small)).toBe(verdict);
  });

  it.each([
    [180, "well-below"],
    [900, "below"],
    [1_799, "below"],
    [18_000, "well-above"],
  ])("%i against 1800 to 2700 is %s", (count, verdict) => {
    expect(compareWithUsual(count, large)).toBe(verdict);
  });
});
