import { at, codeAt, indexAt } from "../columns";
import { ONE_SIDE_LENGTH, TREND_LENGTH, WITHIN_ONE_SIGMA_LENGTH } from "../constants";
import type { CountModel, RuleSettings } from "../types";
import type { PlottedOrder } from "./plotted-order";
import type { RuleHits } from "./rule-hits";
import { runOfCode } from "./run-of-code";
import { guardSmallCounts } from "./small-count-guard";
import { someOfWindow } from "./some-of-window";
import { trend } from "./trend";
import { withinCodes, zoneCodes } from "./zones";

/** What the rules of one segment look at. Verdicts and denominators are columns of the whole series. */
export interface RuleGround {
  model: CountModel;
  centre: number;
  denominators: Float64Array;
  beyondAction: Int8Array;
  beyondWarning: Int8Array;
  order: PlottedOrder;
  /** Standardised value of each position of `order`, divided by σ_z where limits are overdispersed. */
  z: Float64Array;
}

/** The slots' values of an order, position by position. */
export function valuesInOrder(column: Float64Array, { slots }: PlottedOrder): Float64Array {
  const values = new Float64Array(slots.length);
  for (let position = 0; position < slots.length; position += 1) {
    values[position] = at(column, indexAt(slots, position));
  }
  return values;
}

function codesInOrder(column: Int8Array, { slots }: PlottedOrder): Int8Array {
  const codes = new Int8Array(slots.length);
  for (let position = 0; position < slots.length; position += 1) {
    codes[position] = codeAt(column, indexAt(slots, position));
  }
  return codes;
}

/**
 * Where one rule is complete. Beyond an action or warning limit goes by the limits in use, the other rules by z.
 * Source: the rules' own files. Errors: RangeError on a run length that isn't a whole number from 2 up.
 */
export function findHits(rule: RuleSettings, ground: RuleGround): RuleHits {
  const { order, z } = ground;
  const { restarts } = order;
  switch (rule.name) {
    case "beyond-action":
      return runOfCode(codesInOrder(ground.beyondAction, order), restarts, 1);
    case "two-of-three":
      return someOfWindow(codesInOrder(ground.beyondWarning, order), restarts, 2, 3);
    case "four-of-five":
      return someOfWindow(zoneCodes(z, 1), restarts, 4, 5);
    case "one-side": {
      const length = runLength(rule, ONE_SIDE_LENGTH);
      const hits = runOfCode(zoneCodes(z, 0), restarts, length);
      guardSmallCounts(hits, order, ground.model, ground.denominators, ground.centre, length);
      return hits;
    }
    case "trend":
      return trend(z, restarts, runLength(rule, TREND_LENGTH));
    case "within-one-sigma":
      return runOfCode(withinCodes(z, 1), restarts, runLength(rule, WITHIN_ONE_SIGMA_LENGTH));
  }
}

function runLength(rule: RuleSettings, fallback: number): number {
  const length = rule.length ?? fallback;
  if (!Number.isInteger(length) || length < 2) {
    throw new RangeError(`the run length of ${rule.name} must be a whole number from 2 up`);
  }
  return length;
}
