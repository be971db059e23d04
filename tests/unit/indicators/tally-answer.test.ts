import { describe, expect, it } from "vitest";
import { answerOf, impossiblePair, type TallyFigures } from "@/lib/indicators/tally-answer";

const figures = (values: Partial<TallyFigures>): TallyFigures => ({
  numerator: null,
  denominator: null,
  notCollected: null,
  awaited: null,
  ...values,
});

describe("answerOf", () => {
  it.each([
    [{}, "blank"],
    [{ numerator: 3 }, "partial"],
    [{ denominator: 9 }, "partial"],
    [{ numerator: 3, denominator: 9 }, "count"],
    [{ numerator: 0, denominator: 9 }, "count"],
    [{ denominator: 0 }, "nothing-to-count"],
    [{ numerator: 0, denominator: 0 }, "nothing-to-count"],
    [{ numerator: 1, denominator: 0 }, "partial"],
    [{ awaited: "pharmacy" }, "awaited"],
    [{ numerator: 3, awaited: "pharmacy" }, "awaited"],
    [{ numerator: 3, denominator: 9, awaited: "pharmacy" }, "count"],
    [{ notCollected: "Sheet lost" }, "not-collected"],
    // A shared denominator stands whatever one of its lines says of itself.
    [{ notCollected: "Sheet lost", denominator: 800 }, "not-collected"],
    [{ notCollected: "Sheet lost", awaited: "admissions" }, "not-collected"],
  ])("%j is %s", (values, answer) => {
    expect(answerOf(figures(values))).toBe(answer);
  });
});

describe("impossiblePair", () => {
  it.each([
    ["proportion", 5, 4, "numerator-above-denominator"],
    ["proportion", 4, 4, null],
    ["rate", 5, 4, null],
    ["rate", 1, 0, "events-without-denominator"],
    ["proportion", 1, 0, "events-without-denominator"],
    ["proportion", 0, 0, null],
    ["proportion", null, 4, null],
    ["proportion", 4, null, null],
  ] as const)("%s %s of %s: %s", (kind, numerator, denominator, problem) => {
    expect(impossiblePair(kind, numerator, denominator)).toBe(problem);
  });
});
