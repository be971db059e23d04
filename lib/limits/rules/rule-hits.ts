/**
 * Where a rule is complete: one position a plotted point, as in `PlottedOrder`. A point can complete a rule on one
 * side only, so one column holds both sides.
 */
export interface RuleHits {
  /** -1 or 1 where the point completes the rule on the lower or upper side, else 0. */
  sides: Int8Array;
  /** First position of the evidence, where `sides` isn't 0. */
  firsts: Int32Array;
}

export function noHits(length: number): RuleHits {
  return { sides: new Int8Array(length), firsts: new Int32Array(length) };
}
