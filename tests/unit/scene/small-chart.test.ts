import { describe, expect, it } from "vitest";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { chartOf, monthsFrom, pointOf, readmissions, segmentOf } from "./sample-chart";
import { areas, discs, labels, lines } from "./find-shapes";

describe("a small chart", () => {
  const scene = buildControlChartScene(readmissions(), "small");

  it("is 96 by 40 and shows the latest twelve months", () => {
    expect([scene.width, scene.height]).toEqual([96, 40]);
    expect(scene.slots).toHaveLength(12);
  });

  it("has band, edges, centre and record, and no words or warning limits", () => {
    expect(areas(scene, "band").length).toBeGreaterThan(0);
    expect(lines(scene, "action-limit").length).toBeGreaterThan(0);
    expect(lines(scene, "centre")).toHaveLength(1);
    expect(lines(scene, "record")).toHaveLength(1);
    expect(lines(scene, "warning-limit")).toHaveLength(0);
    expect(labels(scene)).toHaveLength(0);
  });

  it("breaks at the missing month and marks the last value", () => {
    expect(lines(scene, "record")[0]?.lines.map((line) => line.length)).toEqual([2, 8]);
    expect(areas(scene, "warning-diamond").map((area) => area.month)).toEqual([10]);
  });

  it("stays inside its box, up to the reach of a mark", () => {
    const points = scene.shapes.flatMap((shape) =>
      shape.shape === "line" ? shape.lines.flat() : shape.shape === "area" ? shape.outlines.flat() : [],
    );
    expect(Math.min(...points.map(([x]) => x))).toBeGreaterThanOrEqual(0);
    expect(Math.max(...points.map(([x]) => x))).toBeLessThanOrEqual(96);
    expect(Math.min(...points.map(([, y]) => y))).toBeGreaterThanOrEqual(-1);
    expect(Math.max(...points.map(([, y]) => y))).toBeLessThanOrEqual(41);
  });

  it("may share a scale that starts above zero", () => {
    const data = chartOf(
      monthsFrom("2026-01", 12).map((month) => pointOf(month, 90, 100, 0.9)),
      {
        segments: [segmentOf(0, 11, { centre: 0.9 })],
      },
    );
    const shared = buildControlChartScene(data, "small", { domain: [0.8, 1] });
    expect(lines(shared, "centre")[0]?.lines[0]?.[0]?.[1]).toBe(20);
  });

  it("before sending shows the earlier months alone, without verdicts, and the open month dashed", () => {
    const months = monthsFrom("2026-01", 8);
    const points = months.map((month, index) =>
      index === 7
        ? pointOf(month, 12, 100, null, { state: "open" })
        : pointOf(month, index === 3 ? 40 : 10, 100, 0.1),
    );
    const bare = buildControlChartScene(chartOf(points), "small", { channel: false, months: 8 });
    expect(areas(bare, "band")).toHaveLength(0);
    expect(lines(bare, "centre")).toHaveLength(0);
    expect(areas(bare, "beyond-diamond")).toHaveLength(0);
    expect(discs(bare, "point-open").map((disc) => disc.month)).toEqual([7]);
    expect(lines(bare, "record")[0]?.lines[0]).toHaveLength(7);
  });

  it("draws a change of baseline inside the window as two stretches", () => {
    const points = monthsFrom("2025-01", 24).map((month) => pointOf(month, 20, 200, 0.1));
    const data = chartOf(points, { segments: [segmentOf(0, 17), segmentOf(18, 23, { centre: 0.08 })] });
    const small = buildControlChartScene(data, "small");
    expect(areas(small, "band")).toHaveLength(2);
    expect(lines(small, "record")[0]?.lines.map((line) => line.length)).toEqual([6, 6]);
  });
});
