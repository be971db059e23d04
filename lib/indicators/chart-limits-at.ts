import { ACTION_SIGMAS, ACTION_TAIL, WARNING_SIGMAS, WARNING_TAIL } from "@/lib/limits/constants";
import { exactLimit } from "@/lib/limits/exact-limits";
import { sigmaScale, type LimitBasis } from "@/lib/limits/limit-basis";
import { pChartLimits } from "@/lib/limits/p-chart";
import { sigmaVerdict } from "@/lib/limits/sigma-verdict";
import type { Side } from "@/lib/limits/types";
import { uChartLimits } from "@/lib/limits/u-chart";

export interface LimitPair {
  lower: number;
  upper: number;
}

type Band = "action" | "warning";

const sigmasOf: Record<Band, number> = { action: ACTION_SIGMAS, warning: WARNING_SIGMAS };
const tailOf: Record<Band, number> = { action: ACTION_TAIL, warning: WARNING_TAIL };

/**
 * The limits of one denominator, as rates: of months taken together, or of a month that might be.
 *
 * @param basis of a segment that has limits. @param denominator above 0; a whole number where binomial.
 * Formulas and sources: p, u and exact limits in lib/limits. Errors: RangeError as those.
 */
export function limitsAt(basis: LimitBasis, denominator: number, band: Band): LimitPair {
  const { model, centre } = basis;
  if (basis.method === "exact") {
    const count = (side: Side) => exactLimit(model, side, denominator, centre, tailOf[band]);
    return { lower: count("lower") / denominator, upper: count("upper") / denominator };
  }
  const limits = model === "binomial" ? pChartLimits : uChartLimits;
  const { lower, upper } = limits(centre, Float64Array.of(denominator), sigmasOf[band] * sigmaScale(basis));
  return { lower: lower[0] ?? 0, upper: upper[0] ?? 0 };
}

/** On which side a count lies strictly outside those limits, or null. Compared as counts. */
export function sideBeyond(
  basis: LimitBasis,
  numerator: number,
  denominator: number,
  band: Band,
): Side | null {
  const { model, centre } = basis;
  if (basis.method !== "exact") {
    const verdict = sigmaVerdict(model, numerator, denominator, centre, sigmasOf[band] * sigmaScale(basis));
    return verdict === 0 ? null : verdict > 0 ? "upper" : "lower";
  }
  if (numerator < exactLimit(model, "lower", denominator, centre, tailOf[band])) return "lower";
  return numerator > exactLimit(model, "upper", denominator, centre, tailOf[band]) ? "upper" : null;
}
