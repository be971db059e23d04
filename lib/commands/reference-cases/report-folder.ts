import { loadCases } from "./load-cases";
import { runFile, type CaseOutcome } from "./run-case";

export interface FolderReport {
  /** What to print, the closing line included. */
  lines: string[];
  passed: number;
  failed: number;
  pending: string[];
}

/**
 * Runs every case of a folder: each difference, the pending cases by id, and as the last line "N passed, N failed".
 * A file that can't be read as reference cases counts as one failure, and so does a folder without any case.
 */
export function reportFolder(folder: string): FolderReport {
  const report: FolderReport = { lines: [], passed: 0, failed: 0, pending: [] };
  for (const { name, file, problem } of loadCases(folder)) {
    if (file === null) {
      report.failed += 1;
      report.lines.push(`${name}: failed`, `  ${problem ?? ""}`);
      continue;
    }
    report.lines.push(`${name}: ${file.topic}`);
    for (const outcome of runFile(file)) addOutcome(report, outcome);
  }
  if (report.passed + report.failed + report.pending.length === 0) {
    report.failed += 1;
    report.lines.push(`no reference cases in ${folder}`);
  }
  if (report.pending.length > 0) {
    report.lines.push(`expected-pending (${report.pending.length}): ${report.pending.join(", ")}`);
  }
  report.lines.push(`${report.passed} passed, ${report.failed} failed`);
  return report;
}

function addOutcome(report: FolderReport, outcome: CaseOutcome): void {
  if (outcome.status === "pending") {
    report.pending.push(outcome.id);
    return;
  }
  if (outcome.status === "passed") report.passed += 1;
  else report.failed += 1;
  report.lines.push(`  ${outcome.id}: ${outcome.status}, ${outcome.compared} figures compared`);
  report.lines.push(...outcome.differences.map((difference) => `    ${difference}`));
  const unknown = topFields(outcome.uncompared);
  if (unknown.length > 0) report.lines.push(`    without a counterpart: ${unknown.join(", ")}`);
}

/** Field names without their rows' numbers, each once. */
function topFields(paths: string[]): string[] {
  return [...new Set(paths.map((path) => path.replace(/\[\d+\]/g, "[]")))];
}
