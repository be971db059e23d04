import { valuesInOrder } from "@/lib/limits/rules/find-hits";
import { plottedOrder, type PlottedOrder } from "@/lib/limits/rules/plotted-order";
import type { RuleHits } from "@/lib/limits/rules/rule-hits";
import { runOfCode } from "@/lib/limits/rules/run-of-code";
import { someOfWindow } from "@/lib/limits/rules/some-of-window";
import { trend } from "@/lib/limits/rules/trend";
import { withinCodes, zoneCodes } from "@/lib/limits/rules/zones";
import { isFields, type Fields, type ReferenceCase } from "../case-format";
import { columnIn } from "../read-fields";

/** A rule of the product by the name of its expectation; null where the product has no such rule. */
function hitsOf(name: string, z: Float64Array, restarts: Uint8Array): RuleHits | null {
  if (name === "beyond_3sigma") return runOfCode(zoneCodes(z, 3), restarts, 1);
  if (name === "two_of_three_beyond_2sigma") return someOfWindow(zoneCodes(z, 2), restarts, 2, 3);
  if (name === "four_of_five_beyond_1sigma") return someOfWindow(zoneCodes(z, 1), restarts, 4, 5);
  const length = Number(/_(\d+)$/.exec(name)?.[1]);
  if (!Number.isInteger(length)) return null;
  if (name.startsWith("run_one_side_")) return runOfCode(zoneCodes(z, 0), restarts, length);
  if (name.startsWith("trend_")) return trend(z, restarts, length);
  if (name.startsWith("within_1sigma_")) return runOfCode(withinCodes(z, 1), restarts, length);
  return null;
}

/**
 * Topic h: pattern rules on standardised values. The product's convention is `ties_break` (a point on the centre ends
 * a run); `ties_skip` has no counterpart. The cases know no longest gap, so none is set.
 */
export function runRuleFields({ input, expected }: ReferenceCase): Fields {
  if (input.z === undefined || !isFields(expected.ties_break)) return {};
  const column = columnIn(input, "z");
  const order = plottedOrder(column, 0, column.length, Infinity);
  const z = valuesInOrder(column, order);
  const found: Fields = {};
  for (const name of Object.keys(expected.ties_break)) {
    const hits = hitsOf(name, z, order.restarts);
    if (hits !== null) found[name] = completedAt(hits, order);
  }
  return { ties_break: found };
}

/** Positions in the case's own list, counted from 1, at which a rule is complete. */
function completedAt({ sides }: RuleHits, { slots }: PlottedOrder): number[] {
  return Array.from(slots)
    .filter((_, position) => sides[position] !== 0)
    .map((slot) => slot + 1);
}
