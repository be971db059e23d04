import { requireTailArea } from "./guards";

/** Coefficients, highest power first, of the three ranges of algorithm AS 241 (PPND16). */
const CENTRAL = {
  over: [
    2509.0809287301226727, 33430.575583588128105, 67265.770927008700853, 45921.953931549871457,
    13731.693765509461125, 1971.5909503065514427, 133.14166789178437745, 3.387132872796366608,
  ],
  under: [
    5226.495278852545925, 28729.085735721942674, 39307.89580009271061, 21213.794301586595867,
    5394.1960214247511077, 687.1870074920579083, 42.313330701600911252, 1,
  ],
};
const NEAR = {
  over: [
    7.7454501427834140764e-4, 0.0227238449892691845833, 0.24178072517745061177, 1.27045825245236838258,
    3.64784832476320460504, 5.7694972214606914055, 4.6303378461565452959, 1.42343711074968357734,
  ],
  under: [
    1.05075007164441684324e-9, 5.475938084995344946e-4, 0.0151986665636164571966, 0.14810397642748007459,
    0.68976733498510000455, 1.6763848301838038494, 2.05319162663775882187, 1,
  ],
};
const FAR = {
  over: [
    2.01033439929228813265e-7, 2.71155556874348757815e-5, 0.0012426609473880784386, 0.026532189526576123093,
    0.29656057182850489123, 1.7848265399172913358, 5.4637849111641143699, 6.6579046435011037772,
  ],
  under: [
    2.04426310338993978564e-15, 1.4215117583164458887e-7, 1.8463183175100546818e-5, 7.868691311456132591e-4,
    0.0148753612908506148525, 0.13692988092273580531, 0.59983220655588793769, 1,
  ],
};

function polynomial(coefficients: number[], x: number): number {
  let value = 0;
  for (const coefficient of coefficients) value = value * x + coefficient;
  return value;
}

/**
 * Quantile of the standard normal distribution: the z with P(Z ≤ z) = probability.
 *
 * @param probability strictly between 0 and 1. Relative error about 10⁻¹⁶.
 * Source: Wichura MJ (1988) Algorithm AS 241, Applied Statistics 37:477-484.
 * Errors: RangeError on a probability outside (0, 1).
 */
export function normalQuantile(probability: number): number {
  requireTailArea("probability", probability);
  const offset = probability - 0.5;
  if (Math.abs(offset) <= 0.425) {
    const r = 0.180625 - offset * offset;
    return (offset * polynomial(CENTRAL.over, r)) / polynomial(CENTRAL.under, r);
  }
  const r = Math.sqrt(-Math.log(offset < 0 ? probability : 1 - probability));
  const range = r <= 5 ? NEAR : FAR;
  const shifted = r <= 5 ? r - 1.6 : r - 5;
  const size = polynomial(range.over, shifted) / polynomial(range.under, shifted);
  return offset < 0 ? -size : size;
}
