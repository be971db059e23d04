import { describe, expect, it } from "vitest";
import { evaluateSeries } from "@/lib/limits";
import { seriesOf } from "./series-builder";

/** Baseline of two large months at a set share, then a run of the given months. */
function runAfter(baseline: [number, number], numerators: number[], denominators: number[]) {
  const series = seriesOf([...baseline.slice(0, 1), ...numerators], [baseline[1], ...denominators], {
    baseline: [0],
    rules: [{ name: "one-side" }],
  });
  return evaluateSeries(series).signals.map(({ side, first, last }) => `${side} ${first}-${last}`);
}

const times = (count: number, value: number) => Array<number>(count).fill(value);

describe("the guard for small counts", () => {
  it("is off where 5 or more are expected", () => {
    expect(runAfter([100, 1000], times(8, 4), times(8, 50))).toEqual(["lower 1-8"]);
  });

  it("is on near 100 % too, where non-events are few", () => {
    // p̄ = 0.97, n = 20: P(X > 19.4) = 0.544 a month.
    expect(runAfter([970, 1000], times(8, 20), times(8, 20))).toEqual([]);
    expect(runAfter([970, 1000], times(10, 20), times(10, 20))).toEqual(["upper 1-10"]);
  });

  it("doesn't take back a run that has counted when a small month joins it", () => {
    // n·p̄ = 5.5: P(X < 5.5) = 0.53 a month, so eight of them come to more than 1/256 and no small month asks for it;
    // a ninth with n·p̄ = 0.1 and P = 0.9 doesn't bring the product below 1/256 either.
    expect(runAfter([100, 1000], times(8, 4), times(8, 55))).toEqual(["lower 1-8"]);
    expect(runAfter([100, 1000], [...times(8, 4), 0], [...times(8, 55), 1])).toEqual(["lower 1-9"]);
    expect(runAfter([100, 1000], [0, ...times(8, 4)], [1, ...times(8, 55)])).toEqual([]);
  });

  it("asks for the product over the whole run where a small month comes early", () => {
    expect(runAfter([100, 1000], [0, ...times(7, 90)], [1, ...times(7, 1000)])).toEqual([]);
    expect(runAfter([100, 1000], [0, ...times(8, 90)], [1, ...times(8, 1000)])).toEqual(["lower 1-9"]);
  });

  it("judges each run for itself", () => {
    const numerators = [...times(8, 0), 3, ...times(60, 0)];
    expect(runAfter([100, 1000], numerators, times(69, 1).fill(3, 8, 9))).toEqual(["lower 10-69"]);
  });
});
