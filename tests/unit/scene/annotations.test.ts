import { describe, expect, it } from "vitest";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { chartOf, emptyPoint, monthsFrom, pointOf, readmissions, segmentOf } from "./sample-chart";
import { areas, glyphsAt, heights, labels, lines, texts } from "./find-shapes";

const months = monthsFrom("2025-06", 12);
const steady = months.map((month) => pointOf(month, 20, 200, 0.1));

describe("a missing month", () => {
  it("has two dotted posts inside its slot and the words", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    const slot = scene.slots[26];
    const [posts] = lines(scene, "no-return-post");
    expect(posts?.lines).toHaveLength(2);
    for (const post of posts?.lines ?? []) {
      expect(heights(post)).toEqual([scene.plot.top, scene.plot.floor]);
      expect(post[0]?.[0]).toBeGreaterThan(slot?.from ?? Infinity);
      expect(post[0]?.[0]).toBeLessThan(slot?.to ?? -Infinity);
    }
    expect(labels(scene, "gap").map(({ text, turn }) => [text, turn])).toEqual([["no return", -90]]);
    expect(glyphsAt(scene, 26)).toEqual(["missing"]);
  });

  it("two in a row share their posts and words", () => {
    const points = steady.map((point, index) =>
      index === 3 || index === 4 ? emptyPoint(point.month) : point,
    );
    const scene = buildControlChartScene(chartOf(points), "large");
    expect(lines(scene, "no-return-post")).toHaveLength(1);
    expect(texts(scene, "gap")).toEqual(["no return"]);
  });

  it("other gaps say what they are, without posts", () => {
    const points = [
      emptyPoint("2026-01", { state: "not-collected" }),
      emptyPoint("2026-02", { state: "nothing-to-count", denominator: 0 }),
    ];
    const scene = buildControlChartScene(chartOf(points), "large");
    expect(texts(scene, "gap")).toEqual(["not collected", "nothing to count"]);
    expect(lines(scene, "no-return-post")).toHaveLength(0);
    expect(texts(scene, "denominator")).toEqual(["–", "0"]);
  });
});

describe("a change of baseline", () => {
  it("is a double post over the full height at its first month's border, with a flag", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    const [posts] = lines(scene, "baseline-post");
    const border = scene.slots[13]?.from ?? 0;
    expect(posts?.lines.map((post) => post[0]?.[0])).toEqual([
      expect.closeTo(border - 1.5, 1),
      expect.closeTo(border + 1.5, 1),
    ]);
    expect(Math.max(...(posts?.lines ?? []).flatMap(heights))).toBe(scene.plot.floor);
    expect(Math.min(...(posts?.lines ?? []).flatMap(heights))).toBeLessThan(scene.plot.top);
    expect(texts(scene, "baseline")).toEqual(["New baseline from Jan 2025"]);
  });

  it("near the right end its flag flies to the left", () => {
    const segments = [
      segmentOf(0, 10),
      segmentOf(11, 11, { newBaselineLabel: "New baseline from May 2026" }),
    ];
    const scene = buildControlChartScene(chartOf(steady, { segments }), "large");
    const [flag] = areas(scene, "flag");
    const border = scene.slots[11]?.from ?? 0;
    expect(Math.max(...(flag?.outlines[0] ?? []).map(([x]) => x))).toBeLessThan(border + 2);
  });
});

describe("notes", () => {
  const noted = (notes: Record<number, string>) =>
    buildControlChartScene(
      chartOf(steady.map((point, index) => ({ ...point, note: notes[index] ?? null }))),
      "large",
    );

  it("have a single post down to their point and up to 24 characters in the flag", () => {
    const scene = noted({ 2: "New admission form and training for all staff" });
    const [text = ""] = texts(scene, "note");
    expect(text.length).toBeLessThanOrEqual(24);
    expect(text.endsWith("…")).toBe(true);
    const post = lines(scene, "note-post")[0]?.lines[0];
    expect(post?.every(([x]) => x === scene.slots[2]?.centre)).toBe(true);
  });

  it("short ones are whole", () => {
    expect(texts(noted({ 2: "Discharge calls start" }), "note")).toEqual(["Discharge calls start"]);
  });

  it("flags don't cover each other", () => {
    const scene = noted({
      2: "First note on a month",
      3: "Second note on a month",
      4: "Third note on a month",
    });
    const boxes = areas(scene, "flag").map((flag) => ({
      left: Math.min(...(flag.outlines[0] ?? []).map(([x]) => x)),
      right: Math.max(...(flag.outlines[0] ?? []).map(([x]) => x)),
      top: Math.min(...heights(flag.outlines[0] ?? [])),
      bottom: Math.max(...heights(flag.outlines[0] ?? [])),
    }));
    expect(boxes).toHaveLength(3);
    for (const [index, one] of boxes.entries()) {
      for (const other of boxes.slice(index + 1)) {
        const apart = one.right <= other.left || other.right <= one.left;
        expect(apart || one.bottom <= other.top || other.bottom <= one.top).toBe(true);
      }
    }
  });
});

describe("a run", () => {
  const stretch = (side: "upper" | "lower", label: string) =>
    buildControlChartScene(chartOf(steady, { runs: [{ from: 2, to: 9, side, label }] }), "large");

  it("has a bracket along its points, beneath them when below the centre line, and its words", () => {
    const scene = stretch("lower", "Run of 8 below the centre line");
    const bracket = lines(scene, "run-bracket")[0]?.lines[0] ?? [];
    const record = lines(scene, "record")[0]?.lines[0] ?? [];
    expect(bracket).toHaveLength(4);
    expect(Math.min(...heights(bracket))).toBeGreaterThan(Math.max(...heights(record)));
    expect(bracket[0]?.[0]).toBeCloseTo((scene.slots[2]?.centre ?? 0) - 5, 1);
    expect(bracket[3]?.[0]).toBeCloseTo((scene.slots[9]?.centre ?? 0) + 5, 1);
    expect(texts(scene, "run")).toEqual(["Run of 8 below the centre line"]);
  });

  it("lies over them when above", () => {
    const scene = stretch("upper", "Run of 8 above the centre line");
    const bracket = lines(scene, "run-bracket")[0]?.lines[0] ?? [];
    expect(Math.max(...heights(bracket))).toBeLessThan(
      Math.min(...heights(lines(scene, "record")[0]?.lines[0] ?? [])),
    );
  });

  it("two of three has its mark at the completing month", () => {
    const pairs = [{ from: 4, to: 6, side: "upper" as const, label: "Two of three past the warning limit" }];
    const scene = buildControlChartScene(chartOf(steady, { pairs }), "large");
    expect(glyphsAt(scene, 6)).toEqual(["pair"]);
    expect(glyphsAt(scene, 5)).toEqual([]);
  });
});

it("a target is dots across the plot with a pointer and its words, and no limit", () => {
  const scene = buildControlChartScene(chartOf(steady, { target: 0.07 }), "large");
  const [line] = lines(scene, "target")[0]?.lines ?? [];
  expect([line?.[0]?.[0], line?.[1]?.[0]]).toEqual([scene.plot.left, scene.plot.right]);
  expect(areas(scene, "target-pointer")[0]?.outlines[0]?.[0]).toEqual([scene.plot.right, line?.[0]?.[1]]);
  expect(texts(scene, "target")).toEqual(["Target 7.0%"]);
  expect(texts(buildControlChartScene(chartOf(steady), "large"), "target")).toEqual([]);
});

describe("labels at the right", () => {
  it("give the last limits in order and are at least 14 pixels apart", () => {
    const near = steady.map((point) => ({ ...point, upperWarning: 0.101, lowerWarning: 0.099 }));
    const scene = buildControlChartScene(chartOf(near, { target: 0.1 }), "large");
    const beside = labels(scene).filter((label) => ["limit", "centre", "target"].includes(label.role));
    const ordered = [...beside].sort((one, other) => one.at[1] - other.at[1]);
    expect(ordered[0]?.text).toBe("Upper action 16.4");
    expect(ordered.at(-1)?.text).toBe("Lower action 3.6");
    for (const [index, label] of ordered.slice(1).entries()) {
      expect(label.at[1] - (ordered[index]?.at[1] ?? 0)).toBeGreaterThanOrEqual(13.98);
    }
  });

  it("are those of the last month with limits, though a later one has none", () => {
    const scene = buildControlChartScene(readmissions(), "large");
    expect(texts(scene, "limit")).toEqual([
      "Upper action 16.8",
      "Upper warning 14.4",
      "Lower warning 4.6",
      "Lower action 2.2",
    ]);
    expect(texts(scene, "centre")).toEqual(["Centre 9.5"]);
  });
});
