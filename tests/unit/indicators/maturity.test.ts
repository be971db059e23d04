import { describe, expect, it } from "vitest";
import { hasEnded, isMature, matureOn } from "@/lib/indicators/maturity";
import { asMonth } from "@/lib/indicators/month";

const november = asMonth("2026-11");

describe("matureOn", () => {
  it("counts from the month's last day", () => {
    expect(matureOn(november, 0)).toBe("2026-11-30");
    expect(matureOn(november, 30)).toBe("2026-12-30");
    expect(matureOn(asMonth("2028-02"), 1)).toBe("2028-03-01");
  });
});

describe("isMature", () => {
  it("holds from that day on, and always where nothing ripens", () => {
    expect(isMature(november, 30, "2026-12-29")).toBe(false);
    expect(isMature(november, 30, "2026-12-30")).toBe(true);
    expect(isMature(november, 0, "2026-11-03")).toBe(true);
  });
});

describe("hasEnded", () => {
  it("holds from the month's last day on", () => {
    expect(hasEnded(november, "2026-11-29")).toBe(false);
    expect(hasEnded(november, "2026-11-30")).toBe(true);
    expect(hasEnded(november, "2027-01-01")).toBe(true);
  });
});
