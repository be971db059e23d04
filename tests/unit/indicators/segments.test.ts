import { describe, expect, it } from "vitest";
import { addMonths, asMonth, type Month } from "@/lib/indicators/month";
import { FIRST_SEGMENT, segmentsOf, TRIAL_MONTHS, type BaselineFacts } from "@/lib/indicators/segments";
import type { PointState, SeriesSlot } from "@/lib/indicators/series";

const START = asMonth("2024-01");
const month = (offset: number): Month => addMonths(START, offset);

function slots(count: number, states: Record<number, PointState> = {}): SeriesSlot[] {
  return Array.from({ length: count }, (_, index) => ({
    month: month(index),
    state: states[index] ?? "counted",
    numerator: 5,
    denominator: 100,
  }));
}

function baseline(over: Partial<BaselineFacts>): BaselineFacts {
  return {
    id: "b",
    from: month(0),
    to: month(5),
    appliesFrom: null,
    leftOut: [],
    limits: "three-sigma",
    ...over,
  };
}

const chosen = (flags: Uint8Array) => [...flags].flatMap((flag, index) => (flag === 1 ? [index] : []));

describe("segmentsOf", () => {
  it("is empty for an empty series", () => {
    expect(segmentsOf([], [], [month(3)])).toEqual([]);
  });

  it("takes the first 25 plotted months for trial limits, stepping over those without a point", () => {
    const [segment] = segmentsOf(slots(40, { 2: "missing", 7: "ripening", 8: "open" }), [], []);
    expect(segment).toMatchObject({
      start: 0,
      end: 40,
      from: FIRST_SEGMENT,
      begins: "first",
      baseline: null,
    });
    const used = chosen(segment?.inBaseline ?? new Uint8Array());
    expect(used).toHaveLength(TRIAL_MONTHS);
    expect(used.at(-1)).toBe(27);
    expect(used).not.toContain(2);
  });

  it("uses a decided baseline's plotted months without those left out", () => {
    const first = baseline({ to: month(11), leftOut: [{ month: month(3), reason: "flood" }] });
    const [segment] = segmentsOf(slots(20, { 5: "not-collected" }), [first], []);
    expect(chosen(segment?.inBaseline ?? new Uint8Array())).toEqual([0, 1, 2, 4, 6, 7, 8, 9, 10, 11]);
  });

  it("begins a segment where a new baseline holds from, and keeps the first one before it", () => {
    const later = baseline({ id: "later", from: month(12), to: month(17), appliesFrom: month(12) });
    const segments = segmentsOf(slots(20), [later, baseline({ id: "first" })], []);
    expect(segments).toMatchObject([
      { start: 0, end: 12, from: FIRST_SEGMENT, begins: "first", baseline: { id: "first" } },
      { start: 12, end: 20, from: month(12), begins: "baseline", baseline: { id: "later" } },
    ]);
    expect(chosen(segments[1]?.inBaseline ?? new Uint8Array())).toEqual([12, 13, 14, 15, 16, 17]);
  });

  it("begins trial limits anew at a definition that can't be compared", () => {
    const segments = segmentsOf(slots(20), [baseline({})], [month(10)]);
    expect(segments).toMatchObject([
      { start: 0, end: 10, baseline: { id: "b" } },
      { start: 10, end: 20, from: month(10), begins: "definition", baseline: null },
    ]);
    expect(chosen(segments[1]?.inBaseline ?? new Uint8Array())).toEqual([
      10, 11, 12, 13, 14, 15, 16, 17, 18, 19,
    ]);
  });

  it("lets a baseline that holds from the month of a new definition rule its segment", () => {
    const own = baseline({ id: "own", from: month(10), to: month(14), appliesFrom: month(10) });
    const segments = segmentsOf(slots(20), [own], [month(10)]);
    expect(segments[1]).toMatchObject({ begins: "definition", baseline: { id: "own" } });
  });

  it("never sums a baseline across a definition that can't be compared", () => {
    const across = baseline({ from: month(4), to: month(15) });
    const [first] = segmentsOf(slots(20), [across], [month(10)]);
    expect(chosen(first?.inBaseline ?? new Uint8Array())).toEqual([4, 5, 6, 7, 8, 9]);
    const beyond = baseline({ from: month(12), to: month(15) });
    const [none] = segmentsOf(slots(20), [beyond], [month(10)]);
    expect(chosen(none?.inBaseline ?? new Uint8Array())).toEqual([]);
  });

  it("ignores cuts at or before the first month, and lets a reaching-back baseline hold from the start", () => {
    const early = baseline({ id: "early", appliesFrom: addMonths(START, -6) });
    const segments = segmentsOf(slots(12), [baseline({ id: "first" }), early], [START]);
    expect(segments).toHaveLength(1);
    expect(segments[0]).toMatchObject({ from: FIRST_SEGMENT, baseline: { id: "early" } });
  });

  it("drops a segment without a month: a change after the last one", () => {
    const future = baseline({ from: month(30), to: month(31), appliesFrom: month(30) });
    expect(segmentsOf(slots(12), [future], [])).toHaveLength(1);
  });
});
