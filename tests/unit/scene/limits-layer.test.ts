import { describe, expect, it } from "vitest";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { chartOf, emptyPoint, monthsFrom, pointOf, readmissions, segmentOf } from "./sample-chart";
import { areas, heights, labels, lines, texts } from "./find-shapes";

const [jan = "", feb = "", mar = "", apr = ""] = monthsFrom("2026-01", 4);

describe("action limits", () => {
  const scene = buildControlChartScene(
    chartOf([pointOf(jan, 20, 200, 0.1), pointOf(feb, 40, 400, 0.1), pointOf(mar, 20, 200, 0.1)]),
    "large",
  );

  it("are level across each month's slot, with risers at the slots' borders", () => {
    const [upper] = lines(scene, "action-limit");
    const steps = upper?.lines[0] ?? [];
    const borders = scene.slots.flatMap((slot) => [slot.from, slot.to]);
    expect(steps.map(([x]) => x)).toEqual(borders);
    const [first, second, third] = [steps[0]?.[1], steps[2]?.[1], steps[4]?.[1]];
    expect(steps.map(([, y]) => y)).toEqual([first, first, second, second, third, third]);
    expect(first).toBe(third);
    expect(second).toBeGreaterThan(first ?? 0);
  });

  it("stand where the value axis puts them", () => {
    const point = pointOf(jan, 20, 200, 0.1);
    const [upper] = lines(scene, "action-limit");
    const [tick10] = labels(scene, "tick").filter((label) => label.text === "10");
    const perPercent = (scene.plot.floor - ((tick10?.at[1] ?? 0) - 4)) / 10;
    const expected = scene.plot.floor - (point.upperAction ?? 0) * 100 * perPercent;
    expect(upper?.lines[0]?.[0]?.[1]).toBeCloseTo(expected, 0);
  });

  it("hold the band between them", () => {
    const [band] = areas(scene, "band");
    expect(band?.outlines[0]).toHaveLength(12);
    const [upper, lower] = lines(scene, "action-limit");
    const edge = [...(upper?.lines[0] ?? []), ...[...(lower?.lines[0] ?? [])].reverse()];
    expect(band?.outlines[0]).toEqual(edge);
  });
});

describe("where no lower action limit exists", () => {
  const scene = buildControlChartScene(
    chartOf([pointOf(jan, 20, 200, 0.1), pointOf(feb, 3, 30, 0.1), pointOf(mar, 20, 200, 0.1)]),
    "large",
  );

  it("the band runs to the floor and no lower edge is drawn along it", () => {
    const [band] = areas(scene, "band");
    const slot = scene.slots[1];
    const onFloor = band?.outlines[0]?.filter(([, y]) => y === scene.plot.floor).map(([x]) => x);
    expect(onFloor).toEqual([slot?.to, slot?.from]);
    const [, lower] = lines(scene, "action-limit");
    expect(lower?.lines).toHaveLength(2);
    const along = lower?.lines.some((line) =>
      line.some(
        ([x, y], index) => y === scene.plot.floor && line[index + 1]?.[1] === y && x < (slot?.to ?? 0),
      ),
    );
    expect(along).toBe(false);
  });

  it("the label at the right says so when it is the last month", () => {
    const last = buildControlChartScene(chartOf([pointOf(jan, 3, 30, 0.1)]), "large");
    expect(texts(last, "limit")).toContain("No lower limit");
  });
});

it("a proportion without an upper limit has its band up to 100 %", () => {
  const scene = buildControlChartScene(
    chartOf([pointOf(jan, 95, 100, 0.95)], { segments: [segmentOf(0, 0, { centre: 0.95 })] }),
    "large",
  );
  expect(Math.min(...heights(areas(scene, "band")[0]?.outlines[0] ?? []))).toBe(scene.plot.top);
  expect(texts(scene, "tick")).toContain("100");
  expect(texts(scene, "limit")).toContain("No upper limit");
});

it("a limit far above the others leaves the picture at its top instead of flattening it", () => {
  const usual = monthsFrom("2026-01", 6).map((month) => pointOf(month, 20, 200, 0.1));
  const tiny = pointOf("2026-07", 1, 4, 0.1, { upperAction: 0.55, beyond: null, pastWarning: null });
  const scene = buildControlChartScene(chartOf([...usual, tiny]), "large");
  const [upper] = lines(scene, "action-limit");
  expect(upper?.lines[0]?.at(-1)).toEqual([scene.slots[6]?.from, scene.plot.top]);
  expect(texts(scene, "limit")).toContain("Upper action 55.0");
});

describe("provisional and trial limits", () => {
  it("are dashed steps over a half-strength band, with the word at their right end", () => {
    const points = [pointOf(jan, 20, 200, 0.1), pointOf(feb, 20, 200, 0.1), emptyPoint(mar)];
    const scene = buildControlChartScene(
      chartOf(points, { segments: [segmentOf(0, 2, { provisional: true })] }),
      "large",
    );
    expect(lines(scene, "action-limit")).toHaveLength(0);
    expect(lines(scene, "action-limit-provisional")).toHaveLength(2);
    expect(areas(scene, "band-provisional")).toHaveLength(1);
    const [word] = labels(scene, "provisional");
    expect(word?.text).toBe("provisional");
    expect(word?.at[0]).toBeCloseTo((scene.slots[1]?.to ?? 0) - 8, 1);
  });

  it("trial limits are named as such", () => {
    const scene = buildControlChartScene(
      chartOf([pointOf(jan, 20, 200, 0.1)], { segments: [segmentOf(0, 0, { trial: true })] }),
      "large",
    );
    expect(texts(scene, "provisional")).toEqual(["trial limits"]);
  });
});

it("warning limits are dashes inside each slot, never joined", () => {
  const scene = buildControlChartScene(readmissions(), "large");
  for (const shape of lines(scene, "warning-limit")) {
    const slot = scene.slots[shape.month ?? -1];
    expect(shape.lines.length).toBeGreaterThan(0);
    for (const [start, end] of shape.lines) {
      expect(start?.[0]).toBeGreaterThan(slot?.from ?? Infinity);
      expect(end?.[0]).toBeLessThan(slot?.to ?? -Infinity);
      expect(start?.[1]).toBe(end?.[1]);
    }
  }
  expect(lines(scene, "warning-limit")).toHaveLength(34);
});

describe("slots without limits", () => {
  it("a missing month, an open return and a month not complete yet interrupt the band", () => {
    const points = [
      pointOf(jan, 20, 200, 0.1),
      pointOf(feb, 20, 200, 0.1, { state: "open" }),
      emptyPoint(mar, { state: "ripening", denominator: 200, countSoFar: 5 }),
      pointOf(apr, 20, 200, 0.1),
    ];
    const scene = buildControlChartScene(chartOf(points), "large");
    const bands = areas(scene, "band").map((band) => band.outlines[0]?.map(([x]) => x) ?? []);
    expect(bands.map((xs) => [Math.min(...xs), Math.max(...xs)])).toEqual([
      [scene.slots[0]?.from, scene.slots[0]?.to],
      [scene.slots[3]?.from, scene.slots[3]?.to],
    ]);
  });

  it("no limits are drawn or named where none exist", () => {
    const scene = buildControlChartScene(
      chartOf([pointOf(jan, 0, 40, null)], {
        hasLimits: false,
        segments: [segmentOf(0, 0, { centre: null })],
      }),
      "large",
    );
    expect(areas(scene, "band")).toHaveLength(0);
    expect(lines(scene, "centre")).toHaveLength(0);
    expect(texts(scene, "limit")).toEqual([]);
  });
});

describe("centre lines", () => {
  it("run from the first to the last month that each holds for", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    const [earlier, later] = lines(scene, "centre").map((shape) => shape.lines[0]);
    expect([earlier?.[0]?.[0], earlier?.[1]?.[0]]).toEqual([scene.plot.left, scene.slots[12]?.to]);
    expect([later?.[0]?.[0], later?.[1]?.[0]]).toEqual([scene.slots[13]?.from, scene.plot.right]);
    expect(later?.[0]?.[1]).toBeGreaterThan(earlier?.[0]?.[1] ?? Infinity);
  });

  it("the earlier centre line after a shift is drawn through the new baseline's months and named", () => {
    const points = [jan, feb, mar, apr].map((month) => pointOf(month, 20, 200, 0.1));
    const segments = [segmentOf(0, 1), segmentOf(2, 3, { centre: 0.12, earlierCentre: 0.1 })];
    const scene = buildControlChartScene(chartOf(points, { segments }), "large");
    const [line] = lines(scene, "earlier-centre")[0]?.lines ?? [];
    expect([line?.[0]?.[0], line?.[1]?.[0]]).toEqual([scene.slots[2]?.from, scene.slots[3]?.to]);
    expect(texts(scene, "limit")).toContain("Earlier centre 10.0");
  });
});
