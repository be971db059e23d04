import { describe, expect, it } from "vitest";
import type { ChartMonth } from "@/lib/indicators/chart-points";
import { detectionWords, quietWords, type DetectionFacts } from "@/lib/indicators/detection-words";
import { addMonths, asMonth } from "@/lib/indicators/month";
import { detectableRate, smallestDetectableDenominator, type LimitBasis } from "@/lib/limits";

const basis: LimitBasis = { model: "binomial", centre: 0.095, method: "three-sigma", sigmaZ: null };
/** Of one unit no count is beyond these limits, on either side. */
const wide: LimitBasis = { ...basis, centre: 0.2 };
const labels = { numeratorLabel: "Readmissions", denominatorLabel: "Discharges", per: 100 };

function chartMonth(
  offset: number,
  numerator: number,
  denominator: number,
  belowDetection = false,
): ChartMonth {
  return {
    month: addMonths(asMonth("2026-01"), offset),
    state: "counted",
    numerator,
    denominator,
    value: numerator / denominator,
    z: null,
    centre: 0.095,
    lowerAction: null,
    upperAction: null,
    lowerWarning: null,
    upperWarning: null,
    belowDetection,
    beyond: null,
    pastWarning: null,
    leftOut: false,
    segment: 0,
  };
}

function facts(months: ChartMonth[], over: Partial<DetectionFacts> = {}): DetectionFacts {
  return { months, bases: [basis], betterWhen: "lower", labels, ...over };
}

describe("detectionWords", () => {
  it("says nothing where every month could have shown a change", () => {
    expect(detectionWords(facts([chartMonth(0, 9, 150)]))).toBeNull();
  });

  it("says what couldn't show, what could, and what would do", () => {
    const words = detectionWords(
      facts([chartMonth(0, 9, 150), chartMonth(5, 3, 58, true), chartMonth(6, 7, 71, true)]),
    );
    expect(words).toMatchObject({ title: "Too small to show a fall", months: "June 2026 and July 2026." });
    const rate = ((detectableRate(basis, 58, 0.8, "upper") ?? 0) * 100).toFixed(1);
    const needed = smallestDetectableDenominator(basis, "lower") ?? 0;
    expect(words?.sentences[0]).toBe("Even a count of 0 would not have been below the lower action limit.");
    expect(words?.sentences[1]).toContain(`in June 2026 to ${rate}%; in July 2026 to `);
    expect(words?.sentences[2]).toBe(`A month needs ${needed} discharges or more to show a fall.`);
    expect(words?.sentences[3]).toBe("With the usual 71 a month, about 2 months taken together would do.");
    expect(words?.sentences).toHaveLength(4);
  });

  it("says how high the rate may be after none were counted, and never that nothing happened", () => {
    const words = detectionWords(facts([chartMonth(0, 0, 40, true)]));
    const bound = ((1 - 0.05 ** (1 / 40)) * 100).toFixed(1);
    expect(words?.sentences.at(-1)).toBe(
      `None were counted in January 2026 (readmissions) out of 40 discharges. The true rate could still be up to ${bound}%.`,
    );
  });

  it("turns round where higher is better, where a zero misleads nobody", () => {
    const high: LimitBasis = { ...basis, centre: 0.95 };
    const words = detectionWords(
      facts([chartMonth(0, 0, 40, true)], { betterWhen: "higher", bases: [high] }),
    );
    expect(words?.title).toBe("Too small to show a rise");
    expect(words?.sentences.join(" ")).toContain(
      "A fall would probably (80%) have shown: in January 2026 to ",
    );
    expect(words?.sentences.join(" ")).toContain("or more to show a rise.");
    expect(words?.sentences.join(" ")).not.toContain("could still be up to");
  });

  it("names the latest of many, and how many there are", () => {
    const months = Array.from({ length: 9 }, (_, index) => chartMonth(index, 2, 30, true));
    expect(detectionWords(facts(months))?.months).toBe("9 of the 9 months, the latest September 2026.");
  });

  it("admits a month that could have shown nothing on the other side either", () => {
    const words = detectionWords(facts([chartMonth(0, 0, 1, true)], { bases: [wide] }));
    expect(words?.sentences[1]).toBe("A rise would probably (80%) have shown: in January 2026 none at all.");
  });
});

describe("quietWords", () => {
  it("says how blind a month without a signal was", () => {
    const rate = ((detectableRate(basis, 146, 0.8, "upper") ?? 0) * 100).toFixed(1);
    expect(quietWords(chartMonth(9, 14, 146), facts([]))).toBe(
      `No signal in October 2026. A rise to ${rate}% in one month would probably have shown.`,
    );
  });

  it("looks for a fall where higher is better", () => {
    const high: LimitBasis = { ...basis, centre: 0.95 };
    const words = quietWords(chartMonth(9, 140, 146), facts([], { betterWhen: "higher", bases: [high] }));
    expect(words).toMatch(/^No signal in October 2026\. A fall to /);
  });

  it("says so where not even the worst count would have shown, and nothing where no limits exist", () => {
    expect(quietWords(chartMonth(9, 0, 1), facts([], { bases: [wide] }))).toBe(
      "No signal in October 2026, which was too small to show a rise at all.",
    );
    expect(quietWords(chartMonth(9, 0, 1), facts([], { bases: [null] }))).toBeNull();
  });
});
