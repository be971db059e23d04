/** Sentences on what a month was too small to show. Figures come in as text. */
export const detectionSentences = {
  panel: "Below detection",
  title: {
    lower: "Too small to show a fall",
    higher: "Too small to show a rise",
    neither: "Too small to show a fall",
  },
  months: (months: string) => `${months}.`,
  many: (count: string, all: string, latest: string) =>
    `${count} of the ${all} months, the latest ${latest}.`,
  evenBest: {
    lower: "Even a count of 0 would not have been below the lower action limit.",
    higher: "Even counting every one would not have been above the upper action limit.",
    neither: "Even a count of 0 would not have been below the lower action limit.",
  },
  wouldHaveShown: (change: "rise" | "fall", list: string) =>
    `A ${change} would probably (80%) have shown: ${list}.`,
  inMonth: (month: string, rate: string) => `in ${month} to ${rate}`,
  notEvenInMonth: (month: string) => `in ${month} none at all`,
  needs: (denominator: string, outOf: string, change: "rise" | "fall") =>
    `A month needs ${denominator} ${outOf} or more to show a ${change}.`,
  pool: (months: string, usual: string) =>
    `With the usual ${usual} a month, about ${months} months taken together would do.`,
  zero: (label: string, month: string, denominator: string, outOf: string, bound: string) =>
    `None were counted in ${month} (${label}) out of ${denominator} ${outOf}. The true rate could still be up to ${bound}.`,
  quiet: (month: string, change: "rise" | "fall", rate: string) =>
    `No signal in ${month}. A ${change} to ${rate} in one month would probably have shown.`,
  quietBlind: (month: string, change: "rise" | "fall") =>
    `No signal in ${month}, which was too small to show a ${change} at all.`,
  noProof: "No signal is no proof of safety.",
} as const;
