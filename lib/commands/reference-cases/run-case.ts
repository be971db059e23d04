import type { ReferenceCase, ReferenceFile } from "./case-format";
import { comparePrints, compareFields, emptyComparison, type Comparison } from "./compare";
import { isPendingKind } from "./pending";
import { topics } from "./topics";

export interface CaseOutcome extends Comparison {
  id: string;
  /** `pending`: a kind of case that no function of the product answers yet, and none could be compared. */
  status: "passed" | "failed" | "pending";
}

/** Works one case out with the product's functions and compares. Never throws: a case that breaks has failed. */
export function runCase(letter: string, referenceCase: ReferenceCase): CaseOutcome {
  const { id, expected, tolerance, sourcePrints } = referenceCase;
  const comparison = emptyComparison();
  try {
    const actual = topics[letter]?.(referenceCase) ?? {};
    compareFields(expected, actual, tolerance, comparison);
    comparePrints(sourcePrints, actual, comparison);
  } catch (error) {
    comparison.differences.push(error instanceof Error ? error.message : String(error));
  }
  return { id, ...judge(comparison, isPendingKind(letter, referenceCase)) };
}

function judge(comparison: Comparison, isPending: boolean): Omit<CaseOutcome, "id"> {
  const differences = [...comparison.differences];
  if (comparison.compared === 0 && differences.length === 0) {
    if (isPending) return { ...comparison, status: "pending" };
    differences.push("nothing in this case could be compared");
  } else if (isPending) {
    differences.push(`${comparison.compared} figures could be compared, so its kind is no longer pending`);
  }
  return { ...comparison, differences, status: differences.length === 0 ? "passed" : "failed" };
}

export function runFile(file: ReferenceFile): CaseOutcome[] {
  return file.cases.map((referenceCase) => runCase(file.letter, referenceCase));
}
