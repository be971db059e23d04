import { describe, expect, it } from "vitest";
import { endOfDate, instantAsOf } from "@/lib/indicators/chart-as-of";

describe("endOfDate", () => {
  it.each([
    ["2026-03-31", "UTC", "2026-03-31T23:59:59.999Z"],
    ["2026-01-31", "Europe/Berlin", "2026-01-31T22:59:59.999Z"],
    // Days of 23 and of 25 hours.
    ["2026-03-29", "Europe/Berlin", "2026-03-29T21:59:59.999Z"],
    ["2026-10-25", "Europe/Berlin", "2026-10-25T22:59:59.999Z"],
    ["2026-03-31", "Pacific/Kiritimati", "2026-03-31T09:59:59.999Z"],
    ["2026-03-31", "Pacific/Pago_Pago", "2026-04-01T10:59:59.999Z"],
  ])("%s in %s ends at %s", (date, zone, instant) => {
    expect(endOfDate(date, zone).toISOString()).toBe(instant);
  });
});

describe("instantAsOf", () => {
  const now = new Date("2026-12-07T09:00:00.000Z");

  it("is a past day's end, this moment for today, and nothing for a day to come", () => {
    expect(instantAsOf("2026-12-06", now, "UTC")?.toISOString()).toBe("2026-12-06T23:59:59.999Z");
    expect(instantAsOf("2026-12-07", now, "UTC")).toEqual(now);
    expect(instantAsOf("2026-12-08", now, "UTC")).toBeNull();
  });

  it("goes by the hospital's day", () => {
    expect(instantAsOf("2026-12-08", new Date("2026-12-07T12:00:00Z"), "Pacific/Auckland")).toEqual(
      new Date("2026-12-07T12:00:00Z"),
    );
  });

  it("takes an instant as it is, with its offset", () => {
    expect(instantAsOf("2026-12-07T10:00:00+01:00", now, "UTC")).toEqual(now);
    expect(instantAsOf("2026-12-07T09:00:00.001Z", now, "UTC")).toBeNull();
  });
});
