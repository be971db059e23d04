import { describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { assembleSeries, type SeriesFacts, type SeriesTally } from "@/lib/indicators/series";

const noFigures = { numerator: null, denominator: null, notCollected: null, awaited: null };

function tally(month: string, over: Partial<SeriesTally> = {}): SeriesTally {
  return { ...noFigures, month: asMonth(month), charted: true, numerator: 3, denominator: 40, ...over };
}

function factsOf(tallies: SeriesTally[], over: Partial<SeriesFacts> = {}): SeriesFacts {
  return {
    indicator: { kind: "proportion", betterWhen: "lower", limits: "auto", rules: [], matureAfterDays: 0 },
    definitionBreaks: [],
    baselines: [],
    tallies,
    showUntil: null,
    today: "2026-12-07",
    ...over,
  };
}

const statesOf = (facts: SeriesFacts) => assembleSeries(facts).slots.map((slot) => slot.state);

describe("assembleSeries", () => {
  it("puts months in order with a slot for every calendar month", () => {
    const series = assembleSeries(factsOf([tally("2026-04"), tally("2025-12"), tally("2026-01")]));
    expect(series.slots.map((slot) => slot.month)).toEqual([
      "2025-12",
      "2026-01",
      "2026-02",
      "2026-03",
      "2026-04",
    ]);
    expect(series.slots.map((slot) => slot.state)).toEqual([
      "counted",
      "counted",
      "missing",
      "missing",
      "counted",
    ]);
    expect([...series.input.counts.numerators]).toEqual([3, 3, Number.NaN, Number.NaN, 3]);
  });

  it("shows months that are due though nothing came in, and none before the first", () => {
    const facts = factsOf([tally("2026-01")], { showUntil: asMonth("2026-03") });
    expect(statesOf(facts)).toEqual(["counted", "missing", "missing"]);
    expect(statesOf(factsOf([tally("2026-01")], { showUntil: asMonth("2025-06") }))).toEqual(["counted"]);
    expect(statesOf(factsOf([], { showUntil: asMonth("2026-03") }))).toEqual([]);
  });

  it("keeps the answers apart, and plots counts alone", () => {
    const facts = factsOf([
      tally("2026-01", { numerator: 0 }),
      tally("2026-02", { numerator: 0, denominator: 0 }),
      tally("2026-03", { ...noFigures, notCollected: "ward closed" }),
      tally("2026-04", { denominator: null, awaited: "pharmacy" }),
      tally("2026-05", noFigures),
      tally("2026-06", { charted: false, denominator: null }),
      tally("2026-07", { charted: false, ...noFigures }),
    ]);
    expect(statesOf(facts)).toEqual([
      ...["counted", "nothing-to-count", "not-collected", "awaited", "missing", "open", "missing"],
    ]);
    const { numerators, denominators } = assembleSeries(facts).input.counts;
    expect(numerators[0]).toBe(0);
    expect([...numerators].slice(1).every(Number.isNaN)).toBe(true);
    expect([...denominators].slice(1).every(Number.isNaN)).toBe(true);
  });

  it("leaves an open return's figures out of what is judged", () => {
    const series = assembleSeries(factsOf([tally("2026-01"), tally("2026-02", { charted: false })]));
    expect(series.slots[1]).toMatchObject({ state: "open", numerator: 3, denominator: 40 });
    expect(series.input.counts.numerators[1]).toBeNaN();
    expect([...(series.segments[0]?.inBaseline ?? [])]).toEqual([1, 0]);
  });

  it("judges no month before it is over", () => {
    const on = (today: string) => statesOf(factsOf([tally("2026-11")], { today }));
    expect(on("2026-11-29")).toEqual(["ripening"]);
    expect(on("2026-11-30")).toEqual(["counted"]);
  });

  it("holds a month back until its outcome has had its days", () => {
    const ripening = {
      kind: "proportion",
      betterWhen: "lower",
      limits: "auto",
      rules: [],
      matureAfterDays: 30,
    } as const;
    const on = (today: string) => statesOf(factsOf([tally("2026-11")], { indicator: ripening, today }));
    expect(on("2026-12-29")).toEqual(["ripening"]);
    expect(on("2026-12-30")).toEqual(["counted"]);
  });

  it("hands lib/limits the model, the rules and each segment's method", () => {
    const decided = {
      id: "b",
      from: asMonth("2026-01"),
      to: asMonth("2026-01"),
      appliesFrom: null,
      leftOut: [],
      limits: "exact" as const,
    };
    const rules = [{ name: "one-side" as const, length: 9 }];
    const rate = {
      kind: "rate",
      betterWhen: "higher",
      limits: "overdispersed",
      rules,
      matureAfterDays: 0,
    } as const;
    const series = assembleSeries(factsOf([tally("2026-01")], { indicator: rate, baselines: [decided] }));
    expect(series.input).toMatchObject({
      model: "poisson",
      betterWhen: "higher",
      rules,
      segments: [{ method: "exact" }],
    });
    const trial = assembleSeries(factsOf([tally("2026-01")], { indicator: rate }));
    expect(trial.input.segments).toMatchObject([{ method: "overdispersed" }]);
  });
});
