import { isFields, type Fields, type Tolerance } from "./case-format";

export interface Comparison {
  /** Figures that were set against each other. */
  compared: number;
  /** One line a figure that differs. */
  differences: string[];
  /** Expected fields that the product has nothing to set against. */
  uncompared: string[];
}

export function emptyComparison(): Comparison {
  return { compared: 0, differences: [], uncompared: [] };
}

/**
 * Sets everything that the product worked out against what is expected, field by field and item by item. Fields
 * that the product doesn't know are noted, not failed. Numbers agree when |a − b| ≤ abs + rel·|b|.
 */
export function compareFields(
  expected: Fields,
  actual: Fields,
  tolerance: Tolerance,
  into: Comparison,
  path = "",
): void {
  for (const [name, value] of Object.entries(expected)) {
    const place = path === "" ? name : `${path}.${name}`;
    if (name in actual) compareValues(value, actual[name], tolerance, into, place);
    else into.uncompared.push(place);
  }
}

function compareValues(
  expected: unknown,
  actual: unknown,
  tolerance: Tolerance,
  into: Comparison,
  path: string,
): void {
  if (Array.isArray(expected)) {
    compareLists(expected, actual, tolerance, into, path);
  } else if (isFields(expected)) {
    if (isFields(actual)) compareFields(expected, actual, tolerance, into, path);
    else note(into, path, JSON.stringify(expected), actual);
  } else {
    into.compared += 1;
    if (!agree(expected, actual, tolerance, path)) into.differences.push(difference(path, expected, actual));
  }
}

function compareLists(
  expected: unknown[],
  actual: unknown,
  tolerance: Tolerance,
  into: Comparison,
  path: string,
): void {
  if (!Array.isArray(actual) || actual.length !== expected.length) {
    note(into, path, JSON.stringify(expected), Array.isArray(actual) ? JSON.stringify(actual) : actual);
    return;
  }
  // An empty list that both sides have is a figure too: nothing stands out.
  if (expected.length === 0) into.compared += 1;
  expected.forEach((item, index) => {
    compareValues(item, (actual as unknown[])[index], tolerance, into, `${path}[${index + 1}]`);
  });
}

function note(into: Comparison, path: string, expected: unknown, actual: unknown): void {
  into.compared += 1;
  into.differences.push(difference(path, expected, actual));
}

function difference(path: string, expected: unknown, actual: unknown): string {
  return `${path}: expected ${String(expected)}, computed ${String(actual)}`;
}

function agree(expected: unknown, actual: unknown, tolerance: Tolerance, path: string): boolean {
  if (typeof expected !== "number") return expected === (isMissing(actual) ? null : actual);
  if (typeof actual !== "number" || Number.isNaN(actual)) return false;
  if (tolerance.counts === "exact" && Number.isInteger(expected) && Number.isInteger(actual)) {
    return expected === actual;
  }
  const isMidP = /(^|\.)mid_p/.test(path);
  const absolute = isMidP ? (tolerance.mid_p_abs ?? tolerance.abs) : tolerance.abs;
  return Math.abs(actual - expected) <= absolute + tolerance.rel * Math.abs(expected);
}

function isMissing(value: unknown): boolean {
  return value === null || value === undefined || Number.isNaN(value);
}

/**
 * Sets the product's figures against the rounded ones that the source prints, where the two are said to agree.
 */
export function comparePrints(prints: Fields, actual: Fields, into: Comparison): void {
  for (const [name, print] of Object.entries(prints)) {
    if (!isFields(print) || print.agrees !== true) continue;
    const { printed, digits } = print;
    const value = actual[name];
    if (typeof printed !== "number" || typeof digits !== "number" || typeof value !== "number") continue;
    into.compared += 1;
    const half = 0.5 * 10 ** -digits;
    if (Math.abs(value - printed) > half * (1 + 1e-9)) {
      into.differences.push(difference(`source_prints.${name}`, printed, value));
    }
  }
}
