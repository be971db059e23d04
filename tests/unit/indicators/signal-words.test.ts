import { describe, expect, it } from "vitest";
import { asMonth } from "@/lib/indicators/month";
import { signalEvidence, type EvidenceMonth } from "@/lib/indicators/signal-evidence";
import {
  countedSentence,
  formatExpected,
  signalWords,
  type SignalToSay,
} from "@/lib/indicators/signal-words";
import { binomialUpperTail, poissonLowerTail, sideChance } from "@/lib/limits";
import { signalSentences, signalsPageWords, ruleWords } from "@/lib/strings/signals";
import { detectionSentences } from "@/lib/strings/detection";
import * as chartStrings from "@/lib/strings/charts";

const labels = { numeratorLabel: "Infections", denominatorLabel: "Catheter days", per: 1000 };

function evidenceMonth(
  month: string,
  numerator: number | null,
  denominator: number,
  centre = 0.0043,
): EvidenceMonth {
  return {
    month,
    numerator,
    denominator,
    value: numerator === null ? null : numerator / denominator,
    centre,
    lowerAction: 0,
    upperAction: 0.0187,
    lowerWarning: 0,
    upperWarning: 0.0149,
  };
}

function signal(over: Partial<SignalToSay> = {}): SignalToSay {
  return {
    rule: "beyond-action",
    side: "upper",
    from: asMonth("2026-11"),
    to: asMonth("2026-11"),
    towards: "adverse",
    spansGap: false,
    withdrawnWhy: null,
    ...over,
  };
}

describe("signalEvidence", () => {
  const months = [
    evidenceMonth("2026-09", 1, 250),
    evidenceMonth("2026-10", null, 256),
    evidenceMonth("2026-11", 6, 268),
  ];

  it("takes the month's own counts, limit and exact tail", () => {
    const evidence = signalEvidence(months, signal(), "poisson");
    expect(evidence).toMatchObject({
      months: 1,
      observed: 6,
      denominator: 268,
      centre: 0.0043,
      limit: 0.0187,
    });
    expect(evidence?.expected).toBeCloseTo(268 * 0.0043, 12);
    expect(evidence?.rate).toBeCloseTo(6 / 268, 12);
  });

  it("uses the tail on the signal's own side", () => {
    const low = signalEvidence(
      [evidenceMonth("2026-11", 2, 5000, 0.002)],
      signal({ side: "lower" }),
      "poisson",
    );
    expect(low?.chance).toBeCloseTo(poissonLowerTail(2, 10), 12);
    const high = signalEvidence([evidenceMonth("2026-11", 9, 40, 0.1)], signal(), "binomial");
    expect(high?.chance).toBeCloseTo(binomialUpperTail(9, 40, 0.1), 14);
  });

  it("multiplies a run's exact chances of its side, and skips months without a point", () => {
    const run = signal({ rule: "one-side", from: asMonth("2026-09"), to: asMonth("2026-11") });
    const evidence = signalEvidence(months, run, "poisson");
    const chance = sideChance("poisson", "upper", 250, 0.0043) * sideChance("poisson", "upper", 268, 0.0043);
    expect(evidence).toMatchObject({ months: 2, observed: 7, limit: null });
    expect(evidence?.chance).toBeCloseTo(chance, 12);
  });

  it("has no one chance for a trend, and none at all where no month is plotted", () => {
    expect(signalEvidence(months, signal({ rule: "trend" }), "poisson")?.chance).toBeNull();
    const gone = signal({ from: asMonth("2026-10"), to: asMonth("2026-10") });
    expect(signalEvidence(months, gone, "poisson")).toBeNull();
  });
});

describe("signalWords", () => {
  it("says what was counted, then the limit, then how easily chance does it", () => {
    const evidence = signalEvidence([evidenceMonth("2026-11", 6, 268)], signal(), "poisson");
    const words = signalWords(signal(), evidence, labels);
    expect(words).toMatchObject({
      mark: "above",
      what: "Above the upper action limit",
      months: "November 2026",
      towards: "away from better",
    });
    expect(words.sentences).toEqual([
      "6 infections in 268 catheter days, 22.4 per 1000.",
      "The upper action limit is 18.7.",
      "1.2 were to be expected.",
      `6 or more happen by chance in about ${words.odds ?? ""} such months.`,
    ]);
    expect(words.odds).toMatch(/^1 in [\d,]+$/);
  });

  it("says a run with its length, side and centre line", () => {
    const months = Array.from({ length: 9 }, (_, index) =>
      evidenceMonth(`2026-0${index + 1}`, 15, 150, 0.15),
    );
    const run = signal({
      rule: "one-side",
      side: "lower",
      from: asMonth("2026-01"),
      to: asMonth("2026-09"),
      towards: "favourable",
      spansGap: true,
    });
    const percent = { numeratorLabel: "Falls", denominatorLabel: "Discharges", per: 100 };
    const words = signalWords(run, signalEvidence(months, run, "binomial"), percent);
    expect(words).toMatchObject({
      mark: "run",
      what: "Run of 9 below the centre line",
      months: "January 2026 to September 2026",
      towards: "towards better",
    });
    expect(words.sentences[0]).toBe("135 falls in 1,350 discharges, 10.0%.");
    expect(words.sentences[1]).toBe("203 were to be expected at the centre line of 15.0%.");
    expect(words.sentences[2]).toMatch(
      /^That many on one side happen by chance in about 1 in [\d,]+ such stretches\.$/,
    );
    expect(words.sentences[3]).toBe("It spans a month without a point.");
  });

  it.each([
    ["two-of-three", "upper", "pair", "Two of three past the upper warning limit"],
    ["four-of-five", "lower", "pair", "Four of five more than one standard error below the centre line"],
    ["trend", "upper", "run", "1 months rising in a row"],
    ["within-one-sigma", "upper", "run", "1 months in a row within one standard error of the centre line"],
    ["beyond-action", "lower", "below", "Below the lower action limit"],
    ["a-later-rule", "upper", "run", "A rule is met"],
  ] as const)("names %s on the %s side", (rule, side, mark, what) => {
    const given = signal({ rule, side });
    const words = signalWords(
      given,
      signalEvidence([evidenceMonth("2026-11", 6, 268)], given, "poisson"),
      labels,
    );
    expect(words).toMatchObject({ mark, what });
  });

  it("says why a signal was withdrawn, and that its figures have changed", () => {
    const words = signalWords(signal({ withdrawnWhy: "correction" }), null, labels);
    expect(words.sentences).toEqual([
      "Withdrawn: the counts were corrected. It stays on record.",
      "The figures that it rested on have changed.",
    ]);
    expect(words.odds).toBeNull();
  });

  it("gives the limit another decimal where it would read like the rate beyond it", () => {
    const low = signal({ side: "lower" });
    const month = { ...evidenceMonth("2026-11", 140, 1858, 0.0958), lowerAction: 0.07541 };
    const percent = { numeratorLabel: "Late sets", denominatorLabel: "Sets due", per: 100 };
    const words = signalWords(low, signalEvidence([month], low, "binomial"), percent);
    expect(words.sentences[0]).toBe("140 late sets in 1,858 sets due, 7.5%.");
    expect(words.sentences[1]).toBe("The lower action limit is 7.54%.");
  });

  it("has no odds where chance does it more often than not", () => {
    const given = signal({ rule: "two-of-three" });
    const words = signalWords(
      given,
      signalEvidence([evidenceMonth("2026-11", 1, 268)], given, "poisson"),
      labels,
    );
    expect(words.odds).toBeNull();
    expect(words.sentences.join(" ")).not.toMatch(/by chance/);
  });
});

describe("countedSentence", () => {
  it.each([
    [0, "None counted (infections) in 1,268 catheter days."],
    [1, "1 counted (infections) in 1,268 catheter days, 0.8 per 1000."],
    [6, "6 infections in 1,268 catheter days, 4.7 per 1000."],
  ])("%i", (count, sentence) => {
    expect(countedSentence(count, 1268, labels)).toBe(sentence);
  });

  it("rounds what was expected to what a reader can use", () => {
    expect([1.152, 19.96, 20.4].map(formatExpected)).toEqual(["1.2", "20.0", "20"]);
  });
});

describe("the words of the glossary that aren't used", () => {
  const forbidden =
    /\b(red|amber|green|pass|fail|failing|breach|alert|alarm|outlier|league|ranking|best|worst|poor|compliance|no harm|user|submit|invalid|stable)\b/i;

  function textsOf(value: unknown): string[] {
    if (typeof value === "string") return [value];
    if (typeof value === "function") return [String(value)];
    if (typeof value === "object" && value !== null) return Object.values(value).flatMap(textsOf);
    return [];
  }

  it.each([
    ["signals", [signalSentences, signalsPageWords, ruleWords]],
    ["detection", detectionSentences],
    ["charts", { ...chartStrings }],
  ])("stand in no sentence about %s", (_, strings) => {
    const texts = textsOf(strings);
    expect(texts.length).toBeGreaterThan(10);
    expect(texts.filter((text) => forbidden.test(text.replace(/evenBest|three-sigma/g, "")))).toEqual([]);
  });
});
