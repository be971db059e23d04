import { describe, expect, it } from "vitest";
import { rateOf, readCount, usualCheck } from "@/lib/indicators/return-entry";

describe("readCount", () => {
  it.each([
    ["", null],
    ["  ", null],
    ["0", 0],
    [" 12 ", 12],
    ["2,068", 2_068],
    ["1 234 567", 1_234_567],
    ["1\u00a0000", 1_000],
    ["1000000000", 1_000_000_000],
  ])("%j is %s", (text, value) => {
    expect(readCount(text)).toEqual({ ok: true, value });
  });

  it.each(["abc", "-1", "1.5", "1e3", "1,5", "12,34", "1000000001", "99999999999", "٣"])(
    "%j is no count",
    (text) => {
      expect(readCount(text)).toEqual({ ok: false });
    },
  );
});

describe("usualCheck", () => {
  it("is silent about blanks and about too few months", () => {
    expect(usualCheck(null, [1, 2, 3])).toBeNull();
    expect(usualCheck(5, [1, 2])).toBeNull();
    expect(usualCheck(12, [0, 4, 2])).toEqual({
      verdict: "well-above",
      range: { least: 0, most: 4, months: 3 },
    });
  });
});

describe("rateOf", () => {
  const pair = (
    numerator: number | null,
    denominator: number | null,
    notCollected: string | null = null,
  ) => ({
    numerator,
    denominator,
    notCollected,
    awaited: null,
  });

  it("exists only for a count that can be", () => {
    expect(rateOf("proportion", pair(1, 4))).toBe(0.25);
    expect(rateOf("rate", pair(6, 4))).toBe(1.5);
    expect(rateOf("proportion", pair(6, 4))).toBeNull();
    expect(rateOf("rate", pair(0, 0))).toBeNull();
    expect(rateOf("rate", pair(null, 4))).toBeNull();
    expect(rateOf("rate", pair(4, null))).toBeNull();
    expect(rateOf("rate", pair(1, 4, "Lost"))).toBeNull();
  });
});
