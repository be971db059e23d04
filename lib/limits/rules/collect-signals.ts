import { codeAt, indexAt } from "../columns";
import type { DetectedSignal, RuleName } from "../types";
import type { PlottedOrder } from "./plotted-order";
import type { RuleHits } from "./rule-hits";

/**
 * Joins the hits of a rule into signals: hits of one side whose evidence overlaps are one signal that grew.
 * Signals come upper side first, then lower, each in time order, appended to `signals`.
 */
export function collectSignals(
  hits: RuleHits,
  order: PlottedOrder,
  rule: RuleName,
  segment: number,
  signals: DetectedSignal[],
): void {
  collectSide(1, hits, order, rule, segment, signals);
  collectSide(-1, hits, order, rule, segment, signals);
}

function collectSide(
  side: 1 | -1,
  hits: RuleHits,
  order: PlottedOrder,
  rule: RuleName,
  segment: number,
  signals: DetectedSignal[],
): void {
  let first = -1;
  let last = -1;
  for (let position = 0; position < hits.sides.length; position += 1) {
    if (codeAt(hits.sides, position) !== side) continue;
    const begins = indexAt(hits.firsts, position);
    if (last >= 0 && begins > last) {
      signals.push(signalOf(rule, side, segment, first, last, order));
      first = -1;
    }
    if (first < 0) first = begins;
    last = position;
  }
  if (last >= 0) signals.push(signalOf(rule, side, segment, first, last, order));
}

function signalOf(
  rule: RuleName,
  side: 1 | -1,
  segment: number,
  firstPosition: number,
  lastPosition: number,
  order: PlottedOrder,
): DetectedSignal {
  const first = indexAt(order.slots, firstPosition);
  const last = indexAt(order.slots, lastPosition);
  return {
    rule,
    side: side > 0 ? "upper" : "lower",
    first,
    last,
    segment,
    spansGap: last - first > lastPosition - firstPosition,
  };
}
