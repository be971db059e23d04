import type { CountModel } from "./types";

/**
 * Standard deviation of a month's count (not of its rate) around the centre line.
 *
 * @param expected denominator times centre, from 0 up. @param centre proportion or rate per denominator unit.
 * Formula: √(n·p̄·(1 − p̄)) binomial, √(n·ū) Poisson. Dividing by n gives the rate's own sigma.
 */
export function countSigma(model: CountModel, expected: number, centre: number): number {
  return Math.sqrt(model === "binomial" ? expected * (1 - centre) : expected);
}

/** Half the width of the limits around a rate: k·√(p̄(1 − p̄)/n), or k·√(ū/n). */
export function rateHalfWidth(
  model: CountModel,
  denominator: number,
  centre: number,
  sigmas: number,
): number {
  return (sigmas * countSigma(model, denominator * centre, centre)) / denominator;
}
