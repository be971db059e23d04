import { describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { hasReturn } from "@/lib/indicators/return-window";

describe("hasReturn", () => {
  const ward = { openFrom: asMonth("2026-03"), openTo: asMonth("2026-11") };
  const thisMonth = asMonth("2026-12");

  it.each([
    ["2026-02", false],
    ["2026-03", true],
    ["2026-11", true],
    ["2026-12", false],
  ])("a ward open from March to November: %s is %s", (month, answer) => {
    expect(hasReturn(ward, asMonth(month), thisMonth)).toBe(answer);
  });

  it("begins with the month itself", () => {
    const open = { openFrom: asMonth("2026-03"), openTo: null };
    expect(hasReturn(open, thisMonth, thisMonth)).toBe(true);
    expect(hasReturn(open, asMonth("2027-01"), thisMonth)).toBe(false);
  });
});
