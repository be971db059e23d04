import { describe, expect, it } from "vitest";
import { chartMonths } from "@/lib/indicators/chart-points";
import { addMonths, asMonth, type Month } from "@/lib/indicators/month";
import { sentSaying, type SentFacts } from "@/lib/indicators/return-sent-words";
import { assembleSeries, type SeriesTally } from "@/lib/indicators/series";
import { inMonths } from "@/lib/indicators/signal-life";
import { defaultRules, type Direction } from "@/lib/indicators/vocabulary";
import { evaluateSeries, limitBasis } from "@/lib/limits";

const november = asMonth("2026-11");

interface Options {
  last: Partial<SeriesTally>;
  betterWhen?: Direction;
  usual?: readonly [numerator: number, denominator: number];
  matureAfterDays?: number;
  earlier?: number;
}

/** A proportion whose counts swing round the usual one, so that no run forms, and November as given. */
function facts({
  last,
  betterWhen = "lower",
  usual = [10, 100],
  matureAfterDays = 0,
  earlier = 24,
}: Options): SentFacts {
  const tally = (month: Month, numerator: number, denominator: number): SeriesTally => ({
    month,
    numerator,
    denominator,
    notCollected: null,
    awaited: null,
    charted: true,
  });
  const before = Array.from({ length: earlier }, (_, index) => {
    const numerator = usual[0] + (index % 2 === 0 ? 1 : -1) * Math.min(1, usual[0]);
    return tally(addMonths(november, index - earlier), numerator, usual[1]);
  });
  const assembled = assembleSeries({
    indicator: { kind: "proportion", betterWhen, limits: "auto", rules: defaultRules, matureAfterDays },
    definitionBreaks: [],
    baselines: [],
    tallies: [...before, { ...tally(november, 10, 100), ...last }],
    showUntil: november,
    today: "2026-12-07",
  });
  const evaluation = evaluateSeries(assembled.input);
  const all = chartMonths(assembled, evaluation);
  const months = assembled.slots.map((slot) => slot.month);
  return {
    month: all.at(-1) ?? null,
    all,
    signals: evaluation.signals.map((signal) => inMonths(signal, months, november)),
    bases: evaluation.segments.map((segment) => limitBasis(assembled.input.model, segment)),
    model: assembled.input.model,
    betterWhen,
    labels: { numeratorLabel: "Falls", denominatorLabel: "Discharges", per: 100 },
    notCollected: last.notCollected ?? null,
    awaited: last.awaited ?? null,
    matureOn: "2026-12-30",
  };
}

describe("what a sent line says", () => {
  it("a signal, with what was counted and what to do", () => {
    const said = sentSaying(facts({ last: { numerator: 40 } }));
    expect(said).toMatchObject({ mark: "above", title: "Above the upper action limit.", isSignal: true });
    expect(said.sentence).toContain("40 falls in 100 discharges, 40.0%.");
    expect(said.next).toContain("Count once more");
  });

  it("past a warning limit alone is no signal", () => {
    const said = sentSaying(facts({ last: { numerator: 17 } }));
    expect(said).toMatchObject({ mark: "warn", isSignal: false });
  });

  it("nothing, with the change that would probably have shown", () => {
    const said = sentSaying(facts({ last: { numerator: 25, denominator: 250 }, usual: [25, 250] }));
    expect(said).toMatchObject({ mark: null, title: "No signal." });
    expect(said.sentence).toMatch(/^A rise to \d+\.\d% would probably have shown\.$/);
    const higher = sentSaying(
      facts({ last: { numerator: 225, denominator: 250 }, usual: [225, 250], betterWhen: "higher" }),
    );
    expect(higher.sentence).toMatch(/^A fall to/);
  });

  it("too small to show a fall, and what a zero is worth", () => {
    const small = { usual: [1, 20] as const };
    expect(sentSaying(facts({ last: { numerator: 1, denominator: 20 }, ...small }))).toMatchObject({
      mark: "shallow",
      title: "No signal; too small to show a fall.",
    });
    const zero = sentSaying(facts({ last: { numerator: 0, denominator: 20 }, ...small }));
    expect(zero).toMatchObject({ mark: "shallow", title: "Zero tells you little here." });
    expect(zero.sentence).toBe("None counted in 20 discharges; the true rate could still be up to 13.9%.");
  });

  it("where a month could have shown nothing at all", () => {
    const said = sentSaying(facts({ last: { numerator: 1, denominator: 1 }, usual: [10, 20] }));
    expect(said.sentence).toBe("The month was too small to show a rise at all.");
  });

  it("where no limits exist", () => {
    expect(sentSaying(facts({ last: { numerator: 0, denominator: 100 }, usual: [0, 100] })).sentence).toBe(
      "There are no limits to compare with yet.",
    );
  });

  it.each([
    [{ last: {}, matureAfterDays: 30 }, "ripening", "Not complete yet."],
    [{ last: { denominator: null, awaited: "pharmacy" } }, "awaited", "Awaited."],
    [{ last: { numerator: null, denominator: null, notCollected: "Sheet lost" } }, null, "Not collected."],
    [{ last: { numerator: 0, denominator: 0 } }, null, "Nothing to count."],
    [{ last: { charted: false } }, "missing", "Nothing entered."],
  ] as const)("%j", (options, mark, title) => {
    expect(sentSaying(facts(options))).toMatchObject({ mark, title, isSignal: false });
  });

  it("of a month that isn't on the chart", () => {
    expect(sentSaying({ ...facts({ last: {} }), month: null }).title).toBe("Nothing entered.");
  });
});
