import { describe, expect, it } from "vitest";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { niceTicks, tickLabels } from "@/lib/scene/ticks";
import { spread } from "@/lib/scene/spread";
import { textWidth } from "@/lib/scene/pens";
import { chartOf, monthsFrom, pointOf, readmissions } from "./sample-chart";
import { areas, glyphsAt, labels, lines, texts } from "./find-shapes";

describe("the value axis", () => {
  it("starts at zero and has round ticks", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    expect(texts(scene, "tick")).toEqual(["0", "5", "10", "15", "20", "25"]);
    const zero = labels(scene, "tick").find((label) => label.text === "0");
    expect(zero?.at[1]).toBe(scene.plot.floor + 4);
  });

  it.each([
    [28.5, [0, 5, 10, 15, 20, 25]],
    [100, [0, 20, 40, 60, 80, 100]],
    [0.9, [0, 0.2, 0.4, 0.6, 0.8]],
    [120, [0, 20, 40, 60, 80, 100, 120]],
    [140, [0, 25, 50, 75, 100, 125]],
    [0, [0]],
    [Number.NaN, [0]],
  ])("ticks up to %d", (max, ticks) => {
    expect(niceTicks(max)).toEqual(ticks);
  });

  it("labels have the decimals that the step needs", () => {
    expect(tickLabels([0, 0.5, 1])).toEqual(["0", "0.5", "1.0"]);
    expect(tickLabels([0, 500, 1000])).toEqual(["0", "500", "1,000"]);
    expect(tickLabels([0, 25, 50])).toEqual(["0", "25", "50"]);
  });
});

describe("spreading labels", () => {
  it("keeps what is far enough apart", () => {
    expect(spread([10, 40, 90], 14, 0, 100)).toEqual([10, 40, 90]);
  });

  it("moves neighbours apart, keeps their order and stays inside", () => {
    const placed = spread([50, 52, 48, 3], 14, 5, 100);
    expect(placed[3]).toBe(5);
    const [first = 0, second = 0, third = 0] = placed;
    expect(third).toBeLessThan(first);
    expect(first).toBeLessThan(second);
    expect(first - third).toBeGreaterThanOrEqual(14 - 1e-6);
    expect(second - first).toBeGreaterThanOrEqual(14 - 1e-6);
  });

  it("pushes back from the far end", () => {
    expect(spread([99, 99], 14, 0, 100)).toEqual([86, 100]);
  });
});

describe("the month scale", () => {
  const scene = buildControlChartScene(readmissions(), "large");

  it("alternates filled and empty, one segment a month", () => {
    expect(areas(scene, "scale-full")[0]?.outlines).toHaveLength(18);
    expect(areas(scene, "scale-empty")[0]?.outlines).toHaveLength(18);
    expect(areas(scene, "scale-full")[0]?.outlines[0]?.[0]?.[0]).toBe(scene.plot.left);
    expect(areas(scene, "scale-empty")[0]?.outlines[0]?.[0]?.[0]).toBe(scene.slots[1]?.from);
  });

  it("names every month, and the year under January and the first month", () => {
    expect(texts(scene, "month")).toHaveLength(36);
    expect(texts(scene, "month").slice(0, 3)).toEqual(["Dec", "Jan", "Feb"]);
    expect(labels(scene, "year").map(({ text, month }) => [text, month])).toEqual([
      ["2023", 0],
      ["2024", 1],
      ["2025", 13],
      ["2026", 25],
    ]);
  });

  it("years side by side don't touch", () => {
    const [first, second] = labels(scene, "year");
    expect(first?.anchor).toBe("end");
    expect(first?.at[0]).toBeLessThanOrEqual(second?.at[0] ?? 0);
  });
});

describe("rows beneath", () => {
  it("print the denominators and several marks of a month side by side", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    expect(texts(scene, "row-head")).toEqual(["Discharges", "Marks"]);
    expect(glyphsAt(scene, 31)).toEqual(["shallow", "corrected"]);
    expect(glyphsAt(scene, 28)).toEqual(["late"]);
  });

  it("leave the row of marks out where there are none", () => {
    const scene = buildControlChartScene(chartOf([pointOf("2026-01", 20, 200, 0.1)]), "large");
    expect(texts(scene, "row-head")).toEqual(["Discharges"]);
    expect(lines(scene, "row-line")[0]?.lines).toHaveLength(2);
  });

  it("stay inside the picture however many marks a month has", () => {
    const busy = pointOf("2026-01", 3, 30, 0.1, { late: true, corrected: true, leftOut: true });
    const data = chartOf(monthsFrom("2026-01", 36).map((month) => ({ ...busy, month })));
    const scene = buildControlChartScene(data, "large");
    expect(glyphsAt(scene, 0)).toEqual(["shallow", "late", "corrected", "leftout"]);
    const bottoms = scene.shapes.flatMap((shape) =>
      shape.shape === "glyph" ? [shape.at[1] + shape.size] : [],
    );
    expect(Math.max(...bottoms)).toBeLessThan(scene.height);
  });
});

describe("many months", () => {
  const dense = (denominator: number, count: number) =>
    buildControlChartScene(
      chartOf(
        monthsFrom("2018-01", count).map((month) => pointOf(month, denominator / 10, denominator, 0.1)),
      ),
      "large",
    );

  it("36 months keep the picture's width", () => {
    expect(dense(140, 36).width).toBe(1016);
    expect(dense(3600, 36).width).toBe(1016);
  });

  it("96 months make it wider, so that month names and denominators never touch", () => {
    const scene = dense(3600, 96);
    const slot = (scene.slots[0]?.to ?? 0) - (scene.slots[0]?.from ?? 0);
    expect(scene.width).toBeGreaterThan(2000);
    expect(texts(scene, "denominator-tight")).toHaveLength(96);
    expect(textWidth("3600", "denominator-tight")).toBeLessThan(slot);
    expect(textWidth("May", "month")).toBeLessThan(slot);
  });

  it("five figures keep their comma and get the room they need", () => {
    const scene = dense(36_000, 36);
    const slot = (scene.slots[0]?.to ?? 0) - (scene.slots[0]?.from ?? 0);
    expect(texts(scene, "denominator-tight")[0]).toBe("36,000");
    expect(textWidth("36,000", "denominator-tight")).toBeLessThan(slot);
  });
});

it("the picture's name says what it is and points to the table", () => {
  expect(buildControlChartScene(readmissions(), "large").label).toBe(
    "Control chart of unplanned readmissions, Osier ward, December 2023 to November 2026. " +
      "The same figures are in the table below.",
  );
  expect(buildControlChartScene(chartOf([]), "large").label).toContain("No months yet");
});
