/**
 * Ticks of a value axis that starts at zero: multiples of 1, 2, 5 (or 25, 250 …) times a power of ten, at most
 * `most` steps up to `max`. A `max` of zero or less gives the zero alone.
 */
export function niceTicks(max: number, most = 6): number[] {
  if (!(max > 0) || !Number.isFinite(max)) return [0];
  const power = 10 ** Math.floor(Math.log10(max / most));
  // 2.5 and 0.25 would need a further decimal on every other label; 25 and 250 don't.
  const steps = power >= 10 ? [1, 2, 2.5, 5] : [1, 2, 5];
  const step = (steps.find((each) => max / (each * power) <= most) ?? 10) * power;
  const count = Math.floor(max / step + 1e-9);
  return Array.from({ length: count + 1 }, (_, index) => Number((index * step).toPrecision(12)));
}

/** Labels with as many decimals as the step needs, and commas: 0, 0.5, 1.0; 1,000. */
export function tickLabels(ticks: number[]): string[] {
  const step = ticks[1] ?? 1;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  return ticks.map((tick) => {
    if (tick === 0) return "0";
    const [whole = "0", rest] = tick.toFixed(decimals).split(".");
    const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ",");
    return rest === undefined ? grouped : `${grouped}.${rest}`;
  });
}
