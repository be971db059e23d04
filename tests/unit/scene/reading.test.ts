import { describe, expect, it } from "vitest";
import { figureGroups } from "@/lib/scene/figures";
import { formatCount, formatRate, formatRateWords, perWords, shorten } from "@/lib/scene/format";
import { keyEntries } from "@/lib/scene/key";
import { monthSayings, readMonth } from "@/lib/scene/reading";
import { chartOf, emptyPoint, monthsFrom, pointOf, readmissions } from "./sample-chart";

describe("numbers", () => {
  it("counts have commas, rates one decimal, in British English", () => {
    expect([0, 58, 2068, 1_234_567].map(formatCount)).toEqual(["0", "58", "2,068", "1,234,567"]);
    expect(formatRate(3 / 58, 100)).toBe("5.2");
    expect(formatRate(0.5, 10_000)).toBe("5,000.0");
    expect(formatRateWords(6 / 268, 1000)).toBe("22.4 per 1000");
    expect(formatRateWords(0.144, 100)).toBe("14.4%");
    expect([100, 1000, 10_000].map(perWords)).toEqual(["percent", "per 1000", "per 10,000"]);
  });

  it("texts are cut at a word where one ends near", () => {
    expect(shorten("Discharge calls start", 24)).toBe("Discharge calls start");
    expect(shorten("Supply of catheters changed on Monday", 24)).toBe("Supply of catheters…");
    expect(shorten("abcdefghijklmnopqrstuvwxyz", 10)).toBe("abcdefghi…");
  });
});

describe("reading a month", () => {
  const data = readmissions();

  it("gives its figures with the limits of that month", () => {
    expect(readMonth(data, 30)).toEqual({
      month: "June 2026",
      numerator: "3",
      denominator: "58",
      rate: "5.2%",
      actionLimits: "none to 21.1",
      warningLimits: "1.8 to 17.2",
      says: [{ mark: "shallow", words: "Too small to show a fall" }],
    });
  });

  it("says so far and no rate while a month isn't complete", () => {
    expect(readMonth(data, 35)).toMatchObject({
      numerator: "6 so far",
      denominator: "163",
      rate: "–",
      actionLimits: "–",
      says: [{ mark: "ripening", words: "Not complete yet, until 30 December" }],
    });
  });

  it("says that a month is missing, and when nothing stands out", () => {
    expect(readMonth(data, 26).says).toEqual([{ mark: "missing", words: "No return sent" }]);
    expect(readMonth(data, 33).says).toEqual([{ mark: null, words: "No signal" }]);
  });

  it("names the side that is too small where higher is better", () => {
    const higher = chartOf([pointOf("2026-01", 3, 30, 0.1)], { betterWhen: "higher" });
    expect(readMonth(higher, 0).says).toEqual([{ mark: "shallow", words: "Too small to show a rise" }]);
  });

  it("within a run every month says so in the strip, the table once", () => {
    const points = monthsFrom("2026-01", 8).map((month) => pointOf(month, 20, 200, 0.1));
    const run = { from: 0, to: 7, side: "lower" as const, label: "Run of 8 below the centre line" };
    const running = chartOf(points, { runs: [run] });
    const words = [0, 4, 7].map((index) => readMonth(running, index).says.map((saying) => saying.words));
    expect(words).toEqual([[run.label], [run.label], [run.label]]);
    const table = points.map((_, index) => monthSayings(running, index).length);
    expect(table).toEqual([0, 0, 0, 0, 0, 0, 0, 1]);
  });

  it.each([
    ["open", "Return still open"],
    ["awaited", "Denominator awaited"],
    ["not-collected", "Not collected"],
    ["nothing-to-count", "Nothing to count"],
  ] as const)("%s is said as such", (state, words) => {
    const point = emptyPoint("2026-01", { state, stateDetail: "ward closed" });
    expect(readMonth(chartOf([point]), 0).says[0]?.words).toBe(`${words}, ward closed`);
  });

  it("throws for a month outside the chart", () => {
    expect(() => readMonth(data, 36)).toThrow(RangeError);
  });
});

describe("the table's groups", () => {
  const groups = figureGroups(readmissions());

  it("are newest first, divided where the baseline changed", () => {
    expect(groups.map((group) => [group.heading, group.rows.length])).toEqual([
      [null, 23],
      ["Earlier baseline, up to December 2024: centre 12.7%. Provisional.", 13],
    ]);
    expect(groups[0]?.rows[0]).toMatchObject({
      label: "Nov 26",
      numerator: "6 so far",
      rate: "–",
      limits: null,
    });
    expect(groups[0]?.rows[5]).toMatchObject({
      label: "Jun 26",
      rate: "5.2",
      isWorkedOut: true,
      limits: ["none", "1.8", "9.5", "17.2", "21.1"],
    });
  });

  it("every month stands in exactly one group", () => {
    expect(groups.flatMap((group) => group.rows.map((row) => row.month)).sort()).toEqual(
      monthsFrom("2023-12", 36),
    );
  });
});

it("the key explains what appears and nothing else", () => {
  expect(keyEntries(readmissions())).toEqual([
    "channel",
    "warning",
    "centre",
    "target",
    "provisional",
    "above",
    "warn",
    "belowDetection",
    "ripening",
    "missing",
    "leftOut",
    "corrected",
    "late",
    "note",
    "newBaseline",
  ]);
  expect(keyEntries(chartOf([pointOf("2026-01", 1, 2, null)], { hasLimits: false, segments: [] }))).toEqual(
    [],
  );
});
