import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const file = path.resolve(import.meta.dirname, "../../../app/_components/ui/tokens.css");
const css = readFileSync(file, "utf8");

type Theme = Record<string, string>;

/** Colour tokens of the first block after a selector. */
function tokensOf(selector: string): Theme {
  const start = css.indexOf(`${selector} {`);
  if (start < 0) throw new Error(`No ${selector}`);
  const block = css.slice(start, css.indexOf("}", start));
  const theme: Theme = {};
  for (const [, name = "", value = ""] of block.matchAll(/--([a-z0-9]+): (#[0-9a-f]{3,6});/g))
    theme[name] = value;
  return theme;
}

const light = tokensOf(":root");
const dark = tokensOf(':root[data-theme="dark"]');

/** Relative luminance, WCAG 2.2. */
function luminance(hex: string): number {
  const channels = [1, 3, 5].map((start) => Number.parseInt(hex.slice(start, start + 2), 16) / 255);
  const [r = 0, g = 0, b = 0] = channels.map((c) =>
    c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4,
  );
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(theme: Theme, one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(theme[one] ?? ""), luminance(theme[other] ?? "")].sort(
    (a, b) => a - b,
  );
  return (high + 0.05) / (low + 0.05);
}

const textPairs = [
  ["ink", "paper"], ["ink", "sheet"], ["ink", "buff"], ["ink", "channel"], ["ink", "overtint"],
  ["ink2", "paper"], ["ink2", "sheet"], ["ink2", "buff"], ["ink2", "overtint"],
  ["over", "paper"], ["over", "sheet"], ["over", "channel"], ["over", "overtint"],
] as const; // prettier-ignore

const linePairs = [
  ["edge", "paper"],
  ["edge", "sheet"],
  ["edge", "channel"],
  ["rule", "paper"],
  ["rule", "sheet"],
] as const;

describe.each([
  ["light", light],
  ["dark", dark],
])("colours of the %s theme", (_, theme) => {
  it("are all eleven", () => {
    expect(Object.keys(theme).sort()).toEqual([
      "buff",
      "channel",
      "edge",
      "hair",
      "ink",
      "ink2",
      "over",
      "overtint",
      "paper",
      "rule",
      "sheet",
    ]);
  });

  it.each(textPairs)("%s on %s is readable as text", (ink, ground) => {
    expect(contrast(theme, ink, ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(linePairs)("%s on %s is visible as a line", (ink, ground) => {
    expect(contrast(theme, ink, ground)).toBeGreaterThanOrEqual(3);
  });
});

it("measures contrast as the design page does", () => {
  expect(contrast(light, "ink", "paper")).toBeCloseTo(13.8, 1);
  expect(contrast(dark, "over", "channel")).toBeCloseTo(5.94, 1);
});

it("dark by the system is the same as dark by choice, and packs stay light", () => {
  expect(tokensOf(':root:not([data-theme="light"])')).toEqual(dark);
  const page = tokensOf(".paper-page");
  expect({ ...page, paper: light.paper, sheet: light.sheet }).toEqual(light);
});

it("printing outweighs the dark theme", () => {
  const print = css.slice(css.indexOf("@media print"));
  expect(print).toMatch(/:root:root:root/);
  expect(print).toContain("--paper: #fff;");
});
