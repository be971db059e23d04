import type { ReferenceCase } from "./case-format";
import { rowsIn } from "./read-fields";

/** Whether any row of the expectation has this field. */
function rowsHave({ expected }: ReferenceCase, field: string): boolean {
  return rowsIn(expected).some((row) => field in row);
}

/**
 * The kinds of case that no function of the product answers yet: days and units between events (g), run-chart tests
 * and average run lengths (h), sample size by Duncan's rule (i), funnel plots (j), CUSUM and EWMA (k).
 * Told by topic and content, never by a case's id, so that a further case of a kind is treated as its fellows.
 */
export function isPendingKind(letter: string, referenceCase: ReferenceCase): boolean {
  switch (letter) {
    case "g":
    case "j":
    case "k":
      return true;
    case "h":
      return (
        rowsHave(referenceCase, "arl") ||
        rowsHave(referenceCase, "longest_run_limit") ||
        rowsHave(referenceCase, "counts_by_longest_run") ||
        "longest_run" in referenceCase.expected
      );
    case "i":
      return rowsHave(referenceCase, "duncan_n");
    default:
      return false;
  }
}
