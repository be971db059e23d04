/**
 * The two corrections of Loader's saddle-point form of binomial and Poisson probabilities, which keeps full
 * precision where factorials and powers overflow before their ratio does.
 * Source: Loader C (2000) Fast and accurate computation of binomial probabilities.
 */

const SERIES_FROM = 16;

function stirlingSeries(n: number): number {
  const square = n * n;
  return (1 / 12 - (1 / 360 - (1 / 1260 - (1 / 1680 - 1 / 1188 / square) / square) / square) / square) / n;
}

/** δ(n) = δ(n + 1) + (n + ½)·log(1 + 1/n) − 1, run downwards from where the series is exact to rounding. */
function smallStirlingErrors(): Float64Array {
  const errors = new Float64Array(SERIES_FROM + 1);
  errors[SERIES_FROM] = stirlingSeries(SERIES_FROM);
  for (let n = SERIES_FROM - 1; n >= 1; n -= 1) {
    errors[n] = (errors[n + 1] as number) + ((n + 0.5) * Math.log1p(1 / n) - 1);
  }
  return errors;
}

const SMALL_ERRORS = smallStirlingErrors();

/**
 * What Stirling's formula leaves out: log n! − [(n + ½)·log n − n + ½·log 2π], for whole n from 1 up.
 */
export function stirlingError(n: number): number {
  return n < SERIES_FROM ? (SMALL_ERRORS[n] as number) : stirlingSeries(n);
}

/**
 * Deviance of a count x > 0 against a mean m > 0: x·log(x/m) + m − x, without cancellation where x is near m.
 */
export function deviance(x: number, mean: number): number {
  const difference = x - mean;
  if (Math.abs(difference) >= 0.1 * (x + mean)) return x * Math.log(x / mean) + mean - x;
  // With v = (x − m)/(x + m): log(x/m) = 2·(v + v³/3 + v⁵/5 + …).
  const v = difference / (x + mean);
  let sum = difference * v;
  let power = 2 * x * v;
  for (let odd = 3; ; odd += 2) {
    power *= v * v;
    const next = sum + power / odd;
    if (next === sum) return next;
    sum = next;
  }
}
