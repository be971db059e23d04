import { describe, expect, it } from "vitest";
import { cameLate, dueDate, isLate } from "@/lib/indicators/due-date";
import { asMonth } from "@/lib/indicators/month";

describe("dueDate", () => {
  it.each([
    ["2026-11", 7, [], "2026-12-07"],
    ["2026-12", 7, [], "2027-01-07"],
    // The 7th of November 2026 is a Saturday.
    ["2026-10", 7, [], "2026-11-09"],
    ["2026-10", 7, ["2026-11-09"], "2026-11-10"],
    ["2026-11", 28, ["2026-12-28", "2026-12-29"], "2026-12-30"],
  ])("%s by the %i with %j is %s", (month, dueDay, holidays, due) => {
    expect(dueDate(asMonth(month), dueDay, holidays)).toBe(due);
  });

  it("moves past a month's end", () => {
    const holidays = ["2026-02-27"];
    expect(dueDate(asMonth("2026-01"), 27, holidays)).toBe("2026-03-02");
  });
});

describe("isLate", () => {
  it("is judged by the day it was sent, or by today", () => {
    expect(isLate("2026-12-07", "2026-12-07", "2026-12-20")).toBe(false);
    expect(isLate("2026-12-07", "2026-12-08", "2026-12-20")).toBe(true);
    expect(isLate("2026-12-07", null, "2026-12-07")).toBe(false);
    expect(isLate("2026-12-07", null, "2026-12-08")).toBe(true);
  });
});

describe("whether a return came late", () => {
  const due = "2026-12-07";
  const at = (text: string) => new Date(text);

  it("is judged by the first sending, on the hospital's calendar", () => {
    const sending = { dueOn: due, firstSubmittedAt: at("2026-12-07T23:30:00Z"), acceptedAt: null };
    expect(cameLate(sending, "UTC", "2026-12-20")).toBe(false);
    expect(cameLate(sending, "Europe/Paris", "2026-12-20")).toBe(true);
  });

  it("goes by today where nothing was sent", () => {
    const sending = { dueOn: due, firstSubmittedAt: null, acceptedAt: null };
    expect(cameLate(sending, "UTC", "2026-12-07")).toBe(false);
    expect(cameLate(sending, "UTC", "2026-12-08")).toBe(true);
  });

  it("is never said of history that was sent and accepted in one act", () => {
    const once = at("2027-03-01T10:00:00Z");
    expect(cameLate({ dueOn: due, firstSubmittedAt: once, acceptedAt: once }, "UTC", "2027-03-02")).toBe(
      false,
    );
    const later = at("2027-03-01T11:00:00Z");
    expect(cameLate({ dueOn: due, firstSubmittedAt: once, acceptedAt: later }, "UTC", "2027-03-02")).toBe(
      true,
    );
  });
});
