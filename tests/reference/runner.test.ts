import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { parseReferenceFile, reportFolder, runCase } from "@/lib/commands/reference-cases";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "reference-"));
});
afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

const chart = {
  id: "a-small",
  source: "constructed",
  input: { x: [1, null, 5], n: [10, 20, 50], k: 3, k_warning: 2 },
  expected: { center: 0.1, p: [0.1, null, 0.1], beyond_action: [] as number[], skipped: [2] },
  tolerance: { rel: 1e-9, abs: 1e-12 },
};

function write(name: string, json: unknown): void {
  writeFileSync(path.join(folder, name), typeof json === "string" ? json : JSON.stringify(json));
}

function fileOf(topic: string, ...cases: unknown[]): unknown {
  return { topic, format_version: 1, index_base: 1, cases };
}

function statusOf(topic: string, one: unknown): { status: string; differences: string[] } {
  const file = parseReferenceFile(fileOf(topic, one));
  const [first] = file.cases;
  if (!first) throw new Error("no case");
  return runCase(file.letter, first);
}

describe("a folder's report", () => {
  it("passes a case that agrees, whatever its id", () => {
    write("more.json", fileOf("a. anything", { ...chart, id: "never-seen-before" }));
    const report = reportFolder(folder);
    expect(report.lines.at(-1)).toBe("1 passed, 0 failed");
    expect(report.lines).toContain("  never-seen-before: passed, 6 figures compared");
  });

  it("fails a case with one altered figure and prints the difference", () => {
    write("a.json", fileOf("a. x", { ...chart, expected: { ...chart.expected, center: 0.1000001 } }));
    const report = reportFolder(folder);
    expect(report.lines).toContain("    center: expected 0.1000001, computed 0.1");
    expect(report.lines.at(-1)).toBe("0 passed, 1 failed");
  });

  it("lists pending cases by id and doesn't count them", () => {
    write("a.json", fileOf("a. x", chart));
    write("g.json", fileOf("g. x", { ...chart, id: "g-new", expected: { gbar: 1 } }));
    const report = reportFolder(folder);
    expect(report.pending).toEqual(["g-new"]);
    expect(report.lines.slice(-2)).toEqual(["expected-pending (1): g-new", "1 passed, 0 failed"]);
  });

  it("fails files that aren't reference files, and an empty folder", () => {
    expect(reportFolder(folder).lines.at(-1)).toBe("0 passed, 1 failed");
    write("broken.json", "{");
    write("other.json", { cases: [] });
    write("numbered.json", fileOf("1. x", chart));
    write("no-input.json", fileOf("a. x", { id: "b" }));
    expect(reportFolder(folder).lines.at(-1)).toBe("0 passed, 4 failed");
  });
});

describe("a case's outcome", () => {
  it("fails where nothing could be compared and the kind isn't pending", () => {
    const outcome = statusOf("a. x", { ...chart, expected: { unknown_field: 1 } });
    expect(outcome.status).toBe("failed");
    expect(outcome.differences).toEqual(["nothing in this case could be compared"]);
    expect(statusOf("z. unknown topic", chart).status).toBe("failed");
  });

  it("fails a pending kind of which something could be compared", () => {
    const row = { n: 10, arl: 370, prob_zero: 0, duncan_n: 56, p: 1 };
    expect(statusOf("i. x", { ...chart, input: {}, expected: { rows: [row] } }).status).toBe("failed");
  });

  it("tells pending kinds by content", () => {
    const withRows = (row: object) => ({ ...chart, input: {}, expected: { rows: [row] } });
    expect(statusOf("h. x", withRows({ arl: 370 })).status).toBe("pending");
    expect(statusOf("h. x", withRows({ longest_run_limit: 6 })).status).toBe("pending");
    expect(statusOf("h. x", withRows({ counts_by_longest_run: [1] })).status).toBe("pending");
    expect(statusOf("i. x", withRows({ duncan_n: 56 })).status).toBe("pending");
    expect(statusOf("h. x", withRows({ something: 1 })).status).toBe("failed");
    expect(statusOf("h. x", { ...chart, input: { y: [1] }, expected: { longest_run: 1 } }).status).toBe(
      "pending",
    );
  });

  it("fails a case whose input breaks a method", () => {
    expect(statusOf("a. x", { ...chart, input: { x: "1", n: [1] } }).differences).toEqual([
      "x must be a list",
    ]);
    expect(statusOf("a. x", { ...chart, input: { x: [3], n: [2] } }).status).toBe("failed");
  });

  it("fails lists of another length, a null in place of a figure and a figure in place of a null", () => {
    const withExpected = (expected: object) => statusOf("a. x", { ...chart, expected });
    expect(withExpected({ beyond_action: [1] }).status).toBe("failed");
    expect(withExpected({ p: [0.1, 0.1, 0.1] }).status).toBe("failed");
    expect(withExpected({ p: [null, null, 0.1] }).status).toBe("failed");
    expect(withExpected({ center: { value: 1 } }).status).toBe("failed");
  });

  it("keeps whole counts apart where the tolerance says so", () => {
    const rows = [{ n: 10_000_000, p: 0.5, lower_limit: 4_995_258 }];
    const one = { ...chart, input: { alpha: 0.00135 }, expected: { rows }, tolerance: { rel: 1e-3, abs: 0 } };
    expect(statusOf("e. x", one).status).toBe("passed");
    expect(statusOf("e. x", { ...one, tolerance: { ...one.tolerance, counts: "exact" } }).status).toBe(
      "failed",
    );
  });

  it("checks printed figures that are said to agree", () => {
    const print = { printed: 0.2, digits: 1, agrees: true };
    expect(statusOf("a. x", { ...chart, source_prints: { center: print } }).status).toBe("failed");
    const unsettled = { center: { ...print, agrees: false }, sum_x: "six" };
    expect(statusOf("a. x", { ...chart, source_prints: unsettled }).status).toBe("passed");
  });

  it("works other widths, baselines and exposures out by the single methods", () => {
    const narrow = {
      ...chart,
      input: { ...chart.input, k: 2.5 },
      expected: { ucl: [0.33717082451262845, null, 0.20606601717798212] },
    };
    expect(statusOf("a. x", narrow).status).toBe("passed");
    const based = { ...chart, input: { ...chart.input, baseline: [1] }, expected: { center: 0.1, sum_x: 1 } };
    expect(statusOf("a. x", based).status).toBe("passed");
    const exact = { x: [2, 5], exposure: [10, 10.5] };
    expect(
      statusOf("e. x", { ...chart, input: exact, expected: { center: 7 / 20.5, lower_limit: [0, 0] } })
        .status,
    ).toBe("passed");
  });
});
