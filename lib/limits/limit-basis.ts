import { requireNonNegative, requirePositive, requireProbability } from "./guards";
import type { CountModel, LimitMethod, SegmentResult } from "./types";

/** All that the limits of a month depend on besides its own denominator. */
export interface LimitBasis {
  model: CountModel;
  centre: number;
  method: LimitMethod;
  /** Laney's σ_z; used where the method is `overdispersed` alone. */
  sigmaZ: number | null;
}

/** The basis of a segment's limits, or null where it has none. */
export function limitBasis(model: CountModel, segment: SegmentResult): LimitBasis | null {
  if (segment.centre === null || !segment.hasLimits) return null;
  return { model, centre: segment.centre, method: segment.method, sigmaZ: segment.sigmaZ };
}

/**
 * Whether limits exist: not at centre 0, not at centre 1 of a proportion (a band of no width would flag the first
 * event), and not without a spread where limits allow for overdispersion.
 * Errors: RangeError on a centre outside the model's domain.
 */
export function existsBasis(basis: LimitBasis): boolean {
  if (basis.model === "binomial") requireProbability("centre", basis.centre);
  else requireNonNegative("centre", basis.centre);
  if (basis.centre === 0 || (basis.model === "binomial" && basis.centre === 1)) return false;
  return basis.method !== "overdispersed" || basis.sigmaZ !== null;
}

/** What every sigma is multiplied by: σ_z where limits allow for overdispersion, else 1. */
export function sigmaScale(basis: LimitBasis): number {
  if (basis.method !== "overdispersed") return 1;
  const scale = basis.sigmaZ ?? NaN;
  requirePositive("sigmaZ", scale);
  return scale;
}
