import { describe, expect, it } from "vitest";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { chartOf, emptyPoint, monthsFrom, pointOf, readmissions, segmentOf } from "./sample-chart";
import { areas, discs, glyphsAt, labels, lines, texts } from "./find-shapes";

const [jan = "", feb = "", mar = "", apr = ""] = monthsFrom("2026-01", 4);

describe("the record", () => {
  const scene = buildControlChartScene(readmissions(), "large");

  it("breaks at a missing month and at a change of baseline", () => {
    const runs = lines(scene, "record")[0]?.lines ?? [];
    expect(runs.map((run) => run.length)).toEqual([13, 13, 8]);
    expect(runs[0]?.at(-1)?.[0]).toBe(scene.slots[12]?.centre);
    expect(runs[1]?.[0]?.[0]).toBe(scene.slots[13]?.centre);
    expect(runs[2]?.[0]?.[0]).toBe(scene.slots[27]?.centre);
  });

  it("doesn't join an open return or a month not complete yet", () => {
    const open = pointOf(feb, 9, 80, 0.1, { state: "open" });
    const drawn = buildControlChartScene(chartOf([pointOf(jan, 20, 200, 0.1), open]), "large");
    expect(lines(drawn, "record")).toHaveLength(0);
    expect(discs(drawn, "point-open").map((disc) => disc.month)).toEqual([1]);
    expect(discs(drawn, "point")).toHaveLength(1);
  });

  it("lone months keep their disc", () => {
    const points = [pointOf(jan, 20, 200, 0.1), emptyPoint(feb), pointOf(mar, 21, 200, 0.1)];
    const drawn = buildControlChartScene(chartOf(points), "large");
    expect(discs(drawn, "point").map((disc) => disc.month)).toEqual([0, 2]);
    expect(lines(drawn, "record")).toHaveLength(0);
  });
});

it("a month below detection is an open ring with its denominator in bold and its mark beneath", () => {
  const scene = buildControlChartScene(
    chartOf([pointOf(jan, 20, 200, 0.1), pointOf(feb, 3, 30, 0.1)]),
    "large",
  );
  expect(discs(scene, "point-below-detection").map((disc) => disc.month)).toEqual([1]);
  expect(labels(scene, "denominator-strong").map(({ text, month }) => [text, month])).toEqual([["30", 1]]);
  expect(glyphsAt(scene, 1)).toEqual(["shallow"]);
  expect(glyphsAt(scene, 0)).toEqual([]);
});

describe("outside the action limits", () => {
  const drawn = (numerator: number) =>
    buildControlChartScene(
      chartOf([
        pointOf(jan, 40, 400, 0.1),
        pointOf(feb, numerator, 400, 0.1),
        pointOf(mar, 40, 400, 0.1),
        pointOf(apr, 40, 400, 0.1),
      ]),
      "large",
    );

  it("is a filled diamond with a bar under it when above, and the value beside it", () => {
    const scene = drawn(80);
    const [diamond] = areas(scene, "beyond-diamond");
    const [bar] = lines(scene, "beyond-bar");
    const lowest = Math.max(...(diamond?.outlines[0] ?? []).map(([, y]) => y));
    expect(diamond?.month).toBe(1);
    expect(bar?.lines[0]?.[0]?.[1]).toBeGreaterThan(lowest);
    expect(texts(scene, "value")).toEqual(["20.0%"]);
    expect(discs(scene, "point").map((disc) => disc.month)).toEqual([0, 2, 3]);
  });

  it("has the bar above it when below the lower limit", () => {
    const scene = drawn(8);
    const [diamond] = areas(scene, "beyond-diamond");
    const highest = Math.min(...(diamond?.outlines[0] ?? []).map(([, y]) => y));
    expect(lines(scene, "beyond-bar")[0]?.lines[0]?.[0]?.[1]).toBeLessThan(highest);
  });

  it("rates stand without a percent sign", () => {
    const points = [pointOf(jan, 6, 268, 0.004, { beyond: "upper" })];
    const scene = buildControlChartScene(chartOf(points, { per: 1000, kind: "rate" }), "large");
    expect(texts(scene, "value")).toEqual(["22.4"]);
  });
});

it("past a warning limit is an open diamond without a bar; only the latest month's value is printed", () => {
  const past = (month: string) => pointOf(month, 55, 400, 0.1);
  const scene = buildControlChartScene(chartOf([past(jan), pointOf(feb, 40, 400, 0.1), past(mar)]), "large");
  expect(areas(scene, "warning-diamond").map((area) => area.month)).toEqual([0, 2]);
  expect(lines(scene, "beyond-bar")).toHaveLength(0);
  expect(texts(scene, "value-in-band")).toEqual(["13.8%"]);
});

it("a month left out of the baseline has square brackets about its point and a stroke across it", () => {
  const scene = buildControlChartScene(chartOf([pointOf(jan, 40, 400, 0.1, { leftOut: true })]), "large");
  const [shape] = lines(scene, "left-out");
  expect(shape?.lines.map((line) => line.length)).toEqual([4, 4, 2]);
  expect(glyphsAt(scene, 0)).toEqual(["leftout"]);
  const [x = 0] = discs(scene, "point")[0]?.at ?? [];
  const [left, right] = (shape?.lines ?? []).map((line) => line[1]?.[0] ?? x);
  expect((left ?? x) < x && x < (right ?? x)).toBe(true);
});

describe("a month not complete yet", () => {
  const ripening = emptyPoint(feb, { state: "ripening", denominator: 200, countSoFar: 6 });
  const scene = buildControlChartScene(chartOf([pointOf(jan, 20, 200, 0.1), ripening]), "large");

  it("is a hollow ring at its count so far, with a dotted stem to the warning limit's height", () => {
    const [ring] = discs(scene, "point-ripening");
    const [stem, level] = lines(scene, "ripening-stem")[0]?.lines ?? [];
    const warning = lines(scene, "warning-limit")[0]?.lines[0]?.[0]?.[1];
    expect(level?.[0]?.[1]).toBe(warning);
    expect(stem?.[0]?.[1]).toBeCloseTo((ring?.at[1] ?? 0) - 5, 1);
    expect(stem?.[1]?.[1]).toBeCloseTo((warning ?? 0) + 2, 1);
    expect(glyphsAt(scene, 1)).toEqual(["ripening"]);
  });

  it("has no ring while its denominator is unknown", () => {
    const unknown = emptyPoint(feb, { state: "ripening", countSoFar: 6 });
    const drawn = buildControlChartScene(chartOf([pointOf(jan, 20, 200, 0.1), unknown]), "large");
    expect(discs(drawn, "point-ripening")).toHaveLength(0);
    expect(glyphsAt(drawn, 1)).toEqual(["ripening"]);
  });
});

it("an awaited denominator has no point, only its mark", () => {
  const awaited = emptyPoint(feb, { state: "awaited", numerator: 5 });
  const scene = buildControlChartScene(
    chartOf([pointOf(jan, 20, 200, 0.1), awaited], { segments: [segmentOf(0, 1)] }),
    "large",
  );
  const drawn = scene.shapes.filter((shape) => shape.month === 1).map((shape) => shape.shape);
  expect(drawn).toEqual(["label", "label", "glyph"]);
  expect(glyphsAt(scene, 1)).toEqual(["awaited"]);
});
