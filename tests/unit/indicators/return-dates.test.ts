import { describe, expect, it } from "vitest";
import {
  clockTime,
  dayInWords,
  instantInWords,
  monthAlone,
  shortDay,
  tableInstant,
} from "@/lib/indicators/return-dates";

describe("days and instants in words", () => {
  it("names days as the interface writes them", () => {
    expect(dayInWords("2026-12-10")).toBe("Thursday 10 December");
    expect(shortDay("2026-12-07")).toBe("Mon 7 Dec");
    expect(monthAlone("2026-11")).toBe("November");
  });

  it("follows the hospital's clock", () => {
    const instant = "2026-12-08T23:30:00.000Z";
    expect(clockTime(instant, "UTC")).toBe("23:30");
    expect(clockTime(instant, "Europe/Lisbon")).toBe("23:30");
    expect(instantInWords(instant, "Europe/Paris")).toBe("Wednesday 9 December, 00:30");
    expect(tableInstant(instant, "UTC")).toBe("8 Dec 2026, 23:30");
  });
});
