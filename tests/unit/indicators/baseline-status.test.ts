import { describe, expect, it } from "vitest";
import { baselineStatusOf } from "@/lib/indicators/baseline-status";
import type { SegmentResult } from "@/lib/limits/types";

const result = (baselineMonths: number, baselineExpected: number): SegmentResult => ({
  start: 0,
  end: 40,
  centre: 0.1,
  method: "three-sigma",
  sigmaZ: null,
  baselineMonths,
  baselineExpected,
  hasLimits: true,
});

describe("baselineStatusOf", () => {
  it.each([
    [false, 0, 0, "none"],
    [true, 0, 0, "none"],
    [false, 25, 300, "trial"],
    [true, 20, 20, "set"],
    [true, 19, 300, "provisional"],
    [true, 36, 19.9, "provisional"],
  ] as const)("decided %s, %i months, %d events: %s", (isDecided, months, expected, status) => {
    expect(baselineStatusOf(isDecided, result(months, expected))).toBe(status);
  });
});
