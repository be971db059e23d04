import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  addMonths,
  asMonth,
  compareMonths,
  dateInZone,
  isMonth,
  lastDayOf,
  monthFromIndex,
  monthIndex,
  monthInZone,
  monthRange,
  monthsBetween,
  parseMonth,
  quarterOf,
} from "@/lib/indicators/month";

describe("months as text", () => {
  it.each(["2026-00", "2026-13", "2026-1", "26-01", "1899-12", "2200-01", "2026-01-01", " 2026-01", ""])(
    "%j is no month",
    (text) => {
      expect(isMonth(text)).toBe(false);
      expect(parseMonth(text)).toBeNull();
      expect(() => asMonth(text)).toThrow(RangeError);
    },
  );

  it("counts months over the turn of a year", () => {
    expect(addMonths(asMonth("2025-11"), 3)).toBe("2026-02");
    expect(addMonths(asMonth("2026-02"), -14)).toBe("2024-12");
    expect(monthsBetween(asMonth("2025-11"), asMonth("2026-02"))).toBe(3);
    expect(monthRange(asMonth("2025-12"), asMonth("2026-02"))).toEqual(["2025-12", "2026-01", "2026-02"]);
    expect(monthRange(asMonth("2026-02"), asMonth("2026-01"))).toEqual([]);
  });

  it("undoes its own index, and sorts as text", () => {
    const month = fc.integer({ min: 1900 * 12, max: 2199 * 12 + 11 }).map(monthFromIndex);
    fc.assert(
      fc.property(month, month, (left, right) => {
        expect(monthFromIndex(monthIndex(left))).toBe(left);
        expect(Math.sign(compareMonths(left, right))).toBe(Math.sign(monthIndex(left) - monthIndex(right)));
      }),
    );
  });

  it("knows quarters and last days", () => {
    expect(["2026-01", "2026-03", "2026-04", "2026-12"].map((text) => quarterOf(asMonth(text)))).toEqual([
      ...["2026-Q1", "2026-Q1", "2026-Q2", "2026-Q4"],
    ]);
    expect(lastDayOf(asMonth("2024-02"))).toBe("2024-02-29");
    expect(lastDayOf(asMonth("2026-12"))).toBe("2026-12-31");
  });

  it("takes dates from the hospital's clock, not the server's", () => {
    const newYear = new Date("2026-12-31T23:30:00Z");
    expect(monthInZone(newYear, "UTC")).toBe("2026-12");
    expect(dateInZone(newYear, "Europe/Berlin")).toBe("2027-01-01");
    expect(monthInZone(newYear, "America/New_York")).toBe("2026-12");
  });
});
