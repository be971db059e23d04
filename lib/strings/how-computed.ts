/** How the limits are worked out, for a reader with a pocket calculator. */
export const howComputedWords = {
  title: "How the limits are worked out",
  subtitle:
    "Every number on a chart can be worked out again from the counts. The figures here are an example.",
  link: "How the limits are worked out",
  exampleNote: "Example: 21 readmitted out of 146 discharges; 273 out of 2,877 in the baseline months.",
  centre: {
    title: "The centre line",
    text: "Sums first, then one division. Never the mean of monthly percentages, which would count small months too much.",
    top: "all readmissions of the baseline",
    bottom: "all discharges of the baseline",
  },
  rate: { title: "The month’s rate", text: "What was counted, out of what." },
  spread: {
    title: "How far chance spreads a month",
    text: "One standard error. A larger denominator, a smaller spread: this is why the channel changes its width.",
    square: "the square root of",
  },
  limits: {
    title: "Action and warning limits",
    text:
      "Action limits lie 3 standard errors from the centre line, warning limits 2, each month with its own " +
      "denominator. A limit below zero doesn’t exist. For events per exposure, such as infections per 1000 catheter " +
      "days, the spread is the square root of the centre over the month’s exposure.",
    and: "and",
  },
  exact: {
    title: "Where counts are small",
    text:
      "Where a baseline month expects fewer than 5 events (or fewer than 5 without one), the bell curve misleads. " +
      "Ebbline then takes exact limits from the binomial or Poisson distribution, with the same chance of lying " +
      "outside: about 1 in 740 on each side for an action limit. The chart says which limits are in use.",
  },
  comparison: {
    title: "The comparison",
    text:
      "A month is outside only when it lies strictly beyond its own limit. This month is past the warning limit, " +
      "which is marked, but inside the action limit, so there is no signal by itself.",
  },
  blind: {
    title: "What the month could have shown",
    text:
      "Below this denominator even a month without any event would lie inside the limits: too small to show a fall. " +
      "The chart marks such months as below detection.",
    result: (count: number) => `so ${count} discharges or more can show a fall`,
  },
  rules: {
    title: "What makes a signal",
    text:
      "One month beyond an action limit; two of three months in a row past the same warning limit; eight months in a " +
      "row on one side of the centre line. A month without a return neither counts in a run nor breaks it.",
  },
  baseline: {
    title: "Trial and provisional limits",
    text:
      "Until a baseline is set, limits come from the months so far, at most the first 25: trial limits. With fewer than 20 " +
      "months or 20 expected events they are provisional, and drawn so.",
  },
  rounding: "Four decimals here; Ebbline computes with about sixteen. Last digits may differ by one.",
} as const;
