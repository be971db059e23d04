import {
  ACTION_TAIL,
  binomialMass,
  centreLine,
  exactLimit,
  lowerTail,
  markExactLimits,
  midPSignals,
  poissonMass,
  upperTail,
  type CountModel,
} from "@/lib/limits";
import type { Fields, ReferenceCase } from "../case-format";
import { columnIn, hasNumber, maskIn, numberIn, positionsWhere, rowsIn } from "../read-fields";

/** Topic e: exact limits of a chart, limits row by row, and tails row by row. */
export function exactLimitFields(referenceCase: ReferenceCase): Fields {
  const { input, expected } = referenceCase;
  const tail = numberIn(input, "alpha", ACTION_TAIL);
  if (Array.isArray(input.x)) return chartFields(input, tail);
  const rows = rowsIn(expected).map((row) => rowFields(row, tail));
  return rows.some((row) => Object.keys(row).length > 0) ? { rows } : {};
}

function chartFields(input: Fields, tail: number): Fields {
  const isRate = input.exposure !== undefined;
  const model: CountModel = isRate ? "poisson" : "binomial";
  const numerators = columnIn(input, "x");
  const denominators = columnIn(input, isRate ? "exposure" : "n");
  const counts = { numerators, denominators };
  const { centre } = centreLine(counts, maskIn(input, "baseline", numerators.length));
  if (centre === null) return { center: null };
  const verdicts = new Int8Array(numerators.length);
  const limits = markExactLimits(model, counts, centre, tail, verdicts);
  const asCount = (rate: number, slot: number) => Math.round(rate * (denominators[slot] ?? NaN));
  const chance = (chanceOf: typeof lowerTail) =>
    Array.from(numerators, (count, slot) => {
      const size = denominators[slot] ?? NaN;
      return size > 0 && !Number.isNaN(count) ? chanceOf(model, count, size, centre) : NaN;
    });
  return {
    center: centre,
    lower_limit: Array.from(limits.lower, asCount),
    upper_limit: Array.from(limits.upper, asCount),
    beyond_exact: positionsWhere(verdicts),
    p_le: chance(lowerTail),
    p_ge: chance(upperTail),
  };
}

/** A row states its distribution itself: n and p, or a mean; with x it asks for tails, else for limits. */
function rowFields(row: Fields, tail: number): Fields {
  const isRate = hasNumber(row, "mean");
  if (!isRate && !(hasNumber(row, "n") && hasNumber(row, "p"))) return {};
  const model: CountModel = isRate ? "poisson" : "binomial";
  const size = isRate ? 1 : numberIn(row, "n");
  const rate = numberIn(row, isRate ? "mean" : "p");
  if (hasNumber(row, "x")) {
    const x = numberIn(row, "x");
    return {
      p_le: lowerTail(model, x, size, rate),
      p_ge: upperTail(model, x, size, rate),
      p_eq: isRate ? poissonMass(x, rate) : binomialMass(x, size, rate),
    };
  }
  const lower = exactLimit(model, "lower", size, rate, tail);
  const upper = exactLimit(model, "upper", size, rate, tail);
  const midP = midPSignals(model, size, rate, tail);
  return {
    lower_limit: lower,
    upper_limit: upper,
    prob_below_lower: lowerTail(model, lower - 1, size, rate),
    prob_above_upper: upperTail(model, upper + 1, size, rate),
    midp_largest_low_signal: midP.low,
    midp_smallest_high_signal: midP.high,
  };
}
