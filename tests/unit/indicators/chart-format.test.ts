import { describe, expect, it } from "vitest";
import { flagMonth, formatOdds, inWords, longDate, midSentence } from "@/lib/indicators/chart-format";

describe("formatOdds", () => {
  it.each([
    [0.5, "1 in 2"],
    [0.3, "1 in 3"],
    [1 / 37.4, "1 in 37"],
    [0.0012, "1 in 830"],
    [1 / 1024, "1 in 1,000"],
    [1 / 350_000, "1 in 350,000"],
    [1 / 1_460_000, "1 in 1.5 million"],
    [1 / 2_000_000, "1 in 2 million"],
    [4e-11, "1 in 25,000 million"],
    [0, "1 in over a thousand million million"],
    [1e-300, "1 in over a thousand million million"],
  ])("%d: %s", (chance, words) => {
    expect(formatOdds(chance)).toBe(words);
  });

  it("names no odds for what chance brings more often than not", () => {
    expect(formatOdds(0.51)).toBeNull();
    expect(formatOdds(Number.NaN)).toBeNull();
  });
});

describe("words about words", () => {
  it("lists things as a sentence does", () => {
    expect(inWords([])).toBe("");
    expect(inWords(["July"])).toBe("July");
    expect(inWords(["May", "June", "July"])).toBe("May, June and July");
  });

  it("puts a label into a sentence and leaves short forms alone", () => {
    expect(midSentence("Readmitted patients")).toBe("readmitted patients");
    expect(midSentence("MRSA cases")).toBe("MRSA cases");
    expect(midSentence("A fall")).toBe("a fall");
  });

  it("writes dates and short months", () => {
    expect(longDate("2026-12-03")).toBe("3 December 2026");
    expect(flagMonth("2026-01")).toBe("Jan 2026");
  });
});
