/** One month worked out by the textbook formulas, so that the page's figures can't drift from its words. */
const baseline = { events: 273, discharges: 2877 };
const month = { events: 21, discharges: 146 };

const centre = baseline.events / baseline.discharges;
const rate = month.events / month.discharges;
const standardError = Math.sqrt((centre * (1 - centre)) / month.discharges);
const limitsAt = (k: number) => ({ lower: centre - k * standardError, upper: centre + k * standardError });

const ACTION = 3;
const WARNING = 2;

export const example = {
  baseline,
  month,
  centre,
  rate,
  standardError,
  action: limitsAt(ACTION),
  warning: limitsAt(WARNING),
  /** Denominator up to which a month without events lies inside the lower action limit. */
  leastToShowFall: (ACTION ** 2 * (1 - centre)) / centre,
} as const;

export const fourDecimals = (value: number) => value.toFixed(4);
export const fiveDecimals = (value: number) => value.toFixed(5);
export const percent = (value: number) => `${(value * 100).toFixed(1)}%`;
