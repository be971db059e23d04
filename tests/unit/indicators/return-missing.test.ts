import { describe, expect, it } from "vitest";
import { missingPart, type ReturnLine } from "@/lib/indicators/return-missing";

const line = (values: Partial<ReturnLine>): ReturnLine => ({
  numerator: null,
  denominator: null,
  notCollected: null,
  awaited: null,
  isShared: false,
  isCountedByTeam: false,
  isMature: true,
  ...values,
});

describe("missingPart", () => {
  it.each([
    ["nothing typed", {}, "line"],
    ["a numerator alone", { numerator: 3 }, "denominator"],
    ["a denominator alone", { denominator: 9 }, "numerator"],
    ["a count", { numerator: 0, denominator: 9 }, null],
    ["nothing to count", { denominator: 0 }, null],
    ["not collected", { notCollected: "Lost" }, null],
    ["awaited by its own source", { awaited: "pharmacy" }, null],
    [
      "a shared denominator awaited, the line counted",
      { awaited: "admissions", isShared: true, numerator: 1 },
      null,
    ],
    ["a shared denominator awaited, the line blank", { awaited: "admissions", isShared: true }, "numerator"],
    ["not complete yet", { isMature: false }, null],
    ["not complete yet and half", { isMature: false, numerator: 3 }, null],
    ["counted by a team that hasn't", { isCountedByTeam: true, denominator: 9 }, null],
    ["counted by a team, the ward's part blank", { isCountedByTeam: true, numerator: 1 }, "denominator"],
    ["counted by a team, nothing yet", { isCountedByTeam: true }, null],
    ["counted by a team, whole", { isCountedByTeam: true, numerator: 1, denominator: 9 }, null],
  ] as const)("%s", (_what, values, part) => {
    expect(missingPart(line(values))).toBe(part);
  });
});
