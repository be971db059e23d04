import { describe, expect, it } from "vitest";
import type { DetectedSignal, RuleSettings } from "@/lib/limits";
import { collectSignals } from "@/lib/limits/rules/collect-signals";
import { findHits, valuesInOrder } from "@/lib/limits/rules/find-hits";
import { plottedOrder } from "@/lib/limits/rules/plotted-order";
import { withinCodes, zoneCodes } from "@/lib/limits/rules/zones";
import { column } from "./series-builder";

/** Applies one rule to standardised values; denominators are so large that no month is small. */
function signalsOf(rule: RuleSettings, z: (number | null)[], denominator = 10_000): string[] {
  const values = column(z);
  const order = plottedOrder(values);
  const ground = {
    model: "binomial" as const,
    centre: 0.1,
    denominators: new Float64Array(z.length).fill(denominator),
    beyondAction: zoneCodes(values, 3),
    beyondWarning: zoneCodes(values, 2),
    order,
    z: valuesInOrder(values, order),
  };
  const signals: DetectedSignal[] = [];
  collectSignals(findHits(rule, ground), order, rule.name, 0, signals);
  return signals.map(
    ({ side, first, last, spansGap }) => `${side} ${first}-${last}${spansGap ? " gap" : ""}`,
  );
}

const up = (count: number, value = 0.5) => Array<number>(count).fill(value);

describe("beyond-action", () => {
  it("joins neighbours of one side into a signal that grows", () => {
    const z = [0, 3.1, 4, 0, 3.2, -3.1, -3.2, 3.3];
    expect(signalsOf({ name: "beyond-action" }, z)).toEqual([
      "upper 1-2",
      "upper 4-4",
      "upper 7-7",
      "lower 5-6",
    ]);
  });

  it("is strict, and steps across months without a point", () => {
    expect(signalsOf({ name: "beyond-action" }, [3, 3 * (1 + 1e-13), 3.0001, null, 3.5])).toEqual([
      "upper 2-4 gap",
    ]);
  });

  it("doesn't join across a long gap", () => {
    expect(signalsOf({ name: "beyond-action" }, [4, null, null, null, 4])).toEqual(["upper 0-4 gap"]);
    expect(signalsOf({ name: "beyond-action" }, [4, null, null, null, null, 4])).toEqual([
      "upper 0-0",
      "upper 5-5",
    ]);
  });
});

describe("two-of-three", () => {
  it("needs the completing point itself beyond, on the same side", () => {
    expect(signalsOf({ name: "two-of-three" }, [0, 2.1, 0, 2.2, 0])).toEqual(["upper 1-3"]);
    expect(signalsOf({ name: "two-of-three" }, [2.1, 0, 0, 2.2])).toEqual([]);
    expect(signalsOf({ name: "two-of-three" }, [2.1, -2.2, 0])).toEqual([]);
    expect(signalsOf({ name: "two-of-three" }, [2.1, 2.2])).toEqual(["upper 0-1"]);
  });

  it("joins overlapping evidence, each side for itself", () => {
    expect(signalsOf({ name: "two-of-three" }, [2.1, -2.1, 2.1, -2.1, 2.1])).toEqual([
      "upper 0-4",
      "lower 1-3",
    ]);
    expect(signalsOf({ name: "two-of-three" }, [2.1, 2.1, 0, 0, 2.1, 2.1])).toEqual([
      "upper 0-1",
      "upper 4-5",
    ]);
  });

  it("begins anew after a long gap", () => {
    expect(signalsOf({ name: "two-of-three" }, [2.1, null, null, null, 2.1])).toEqual(["upper 0-4 gap"]);
    expect(signalsOf({ name: "two-of-three" }, [2.1, null, null, null, null, 2.1])).toEqual([]);
  });
});

describe("one-side", () => {
  it("needs eight, and grows", () => {
    expect(signalsOf({ name: "one-side" }, up(7))).toEqual([]);
    expect(signalsOf({ name: "one-side" }, up(8))).toEqual(["upper 0-7"]);
    expect(signalsOf({ name: "one-side" }, [-1, ...up(11), -1])).toEqual(["upper 1-11"]);
    expect(signalsOf({ name: "one-side" }, [...up(8), ...up(8, -0.5)])).toEqual(["upper 0-7", "lower 8-15"]);
  });

  it("ends at a point exactly on the centre line", () => {
    expect(signalsOf({ name: "one-side" }, [...up(7), 0, ...up(7)])).toEqual([]);
  });

  it("neither counts nor ends at a month without a point, but ends at a gap of more than three", () => {
    expect(signalsOf({ name: "one-side" }, [...up(4), null, ...up(4)])).toEqual(["upper 0-8 gap"]);
    expect(signalsOf({ name: "one-side" }, [...up(7), null])).toEqual([]);
    expect(signalsOf({ name: "one-side" }, [...up(4), null, null, null, ...up(4)])).toEqual([
      "upper 0-10 gap",
    ]);
    expect(signalsOf({ name: "one-side" }, [...up(4), null, null, null, null, ...up(4)])).toEqual([]);
  });

  it("takes its length from the indicator, and refuses a broken one", () => {
    expect(signalsOf({ name: "one-side", length: 6 }, up(6))).toEqual(["upper 0-5"]);
    expect(() => signalsOf({ name: "one-side", length: 1 }, up(6))).toThrow(RangeError);
    expect(() => signalsOf({ name: "one-side", length: 7.5 }, up(6))).toThrow(RangeError);
  });

  it("waits longer where small counts make a run easy", () => {
    // n·p̄ = 0.6: P(X < 0.6) = 0.9⁶ = 0.531 a month, so 1/256 is reached by the ninth month; P(X > 0.6) = 0.469 by the 8th.
    expect(signalsOf({ name: "one-side" }, up(8, -0.5), 6)).toEqual([]);
    expect(signalsOf({ name: "one-side" }, up(9, -0.5), 6)).toEqual(["lower 0-8"]);
    expect(signalsOf({ name: "one-side" }, up(8, 0.5), 6)).toEqual(["upper 0-7"]);
    // n·p̄ = 0.1: P(X < 0.1) = 0.9 a month: 53 months.
    expect(signalsOf({ name: "one-side" }, up(52, -0.5), 1)).toEqual([]);
    expect(signalsOf({ name: "one-side" }, up(53, -0.5), 1)).toEqual(["lower 0-52"]);
  });
});

describe("rules that are off by default", () => {
  it("four-of-five", () => {
    expect(signalsOf({ name: "four-of-five" }, [1.1, 1.1, 0, 1.1, 1.1, 0])).toEqual(["upper 0-4"]);
    expect(signalsOf({ name: "four-of-five" }, [1.1, 1.1, 1, 1, 1.1, 1.1])).toEqual([]);
    expect(signalsOf({ name: "four-of-five" }, [-1.1, -1.1, -1.1, -1.1])).toEqual(["lower 0-3"]);
  });

  it("trend", () => {
    expect(signalsOf({ name: "trend" }, [1, 2, 3, 4, 5])).toEqual([]);
    expect(signalsOf({ name: "trend" }, [9, 1, 2, 3, 4, 5, 6, 7, 6])).toEqual(["upper 1-7"]);
    expect(signalsOf({ name: "trend" }, [6, 5, 4, 3, 2, 1])).toEqual(["lower 0-5"]);
    expect(signalsOf({ name: "trend" }, [1, 2, 3, 3, 4, 5, 6])).toEqual([]);
    expect(signalsOf({ name: "trend" }, [1, 2, 3, null, 4, 5, 6])).toEqual(["upper 0-6 gap"]);
    expect(signalsOf({ name: "trend" }, [1, 2, 3, null, null, null, null, 4, 5, 6])).toEqual([]);
    expect(signalsOf({ name: "trend", length: 3 }, [1, 2, 3, 2, 1])).toEqual(["upper 0-2", "lower 2-4"]);
  });

  it("within-one-sigma", () => {
    expect(signalsOf({ name: "within-one-sigma" }, up(15, 0.9))).toEqual(["upper 0-14"]);
    expect(signalsOf({ name: "within-one-sigma" }, [...up(10, -0.9), ...up(7, 0)])).toEqual(["upper 0-16"]);
    expect(signalsOf({ name: "within-one-sigma" }, [...up(14), 1])).toEqual([]);
    expect([...withinCodes(column([1 - 1e-13, 0.99]), 1)]).toEqual([0, 1]);
  });
});
