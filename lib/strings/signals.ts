/** Words on signals: the list, and the sentences about one. Trade terms and our own names are those of the glossary. */

export const signalsPageWords = {
  title: "Signals",
  subtitle: "Newest first. A signal is a prompt to look, never proof of cause, fault or harm.",
  none: "No signals here.",
  noneNote: "That is no proof of safety.",
  caption: "Signals, newest first",
  statusFilter: "Show",
  wardFilter: "Ward",
  allWards: "All wards",
  active: "New and in review",
  all: "All on record",
  filter: "Show these",
  mark: "Mark",
  indicatorAndWard: "Indicator and ward",
  seen: "What was seen",
  observed: "Observed",
  expected: "Expected",
  chance: "Exact chance",
  born: "On record",
  since: (date: string) => `Since ${date}`,
  next: "Earlier signals",
  first: "Newest signals",
  older: "On an earlier month when it came to light",
} as const;

export const signalStatusWords = {
  new: "New",
  in_review: "In review",
  closed: "Closed",
  withdrawn: "Withdrawn",
} as const;

/** Why a signal was withdrawn. */
export const withdrawnWords = {
  correction: "the counts were corrected",
  baseline: "the baseline changed",
  definition: "the definition changed",
  rules: "the rules in use changed",
  "trial-limits": "the trial limits moved with a new month",
  recall: "the return was taken back",
  "import-taken-back": "an import was taken back",
} as const;

export const towardsWords = {
  adverse: "away from better",
  favourable: "towards better",
  neither: null,
} as const;

const sideOfCentre = { upper: "above", lower: "below" } as const;
const limitName = { upper: "the upper action limit", lower: "the lower action limit" } as const;

/** Short names of what a rule saw, as a heading or a cell. */
export const ruleWords = {
  beyond: (side: "upper" | "lower") => `${side === "upper" ? "Above" : "Below"} ${limitName[side]}`,
  twoOfThree: (side: "upper" | "lower") => `Two of three past the ${side} warning limit`,
  run: (months: number, side: "upper" | "lower") => `Run of ${months} ${sideOfCentre[side]} the centre line`,
  fourOfFive: (side: "upper" | "lower") =>
    `Four of five more than one standard error ${sideOfCentre[side]} the centre line`,
  trend: (months: number, side: "upper" | "lower") =>
    `${months} months ${side === "upper" ? "rising" : "falling"} in a row`,
  withinOne: (months: number) => `${months} months in a row within one standard error of the centre line`,
  other: "A rule is met",
} as const;

/** Sentences; figures come in as text. */
export const signalSentences = {
  counted: (count: string, label: string, denominator: string, outOf: string, rate: string) =>
    `${count} ${label} in ${denominator} ${outOf}, ${rate}.`,
  oneCounted: (label: string, denominator: string, outOf: string, rate: string) =>
    `1 counted (${label}) in ${denominator} ${outOf}, ${rate}.`,
  noneCounted: (label: string, denominator: string, outOf: string) =>
    `None counted (${label}) in ${denominator} ${outOf}.`,
  limit: (side: "upper" | "lower", limit: string) => `The ${side} action limit is ${limit}.`,
  limitsPassed: (side: "upper" | "lower", months: number) =>
    `Each of the ${months} months is ${sideOfCentre[side]} its own ${side} action limit.`,
  warning: (side: "upper" | "lower", limit: string) =>
    `Two months of three in a row lie past the ${side} warning limit, the last at ${limit}.`,
  expected: (expected: string) => `${expected} were to be expected.`,
  expectedAtCentre: (expected: string, centre: string) =>
    `${expected} were to be expected at the centre line of ${centre}.`,
  oddsMore: (count: string, odds: string, what: "month" | "stretch") =>
    `${count} or more happen by chance in about ${odds} such ${what === "month" ? "months" : "stretches"}.`,
  oddsFewer: (count: string, odds: string, what: "month" | "stretch") =>
    `${count} or fewer happen by chance in about ${odds} such ${what === "month" ? "months" : "stretches"}.`,
  oddsNone: (odds: string, what: "month" | "stretch") =>
    `None at all happens by chance in about ${odds} such ${what === "month" ? "months" : "stretches"}.`,
  oddsRun: (odds: string) => `That many on one side happen by chance in about ${odds} such stretches.`,
  withinOne:
    "Counts this close to the centre line are rarer than they look: a reason to look at how they are counted.",
  spansGap: "It spans a month without a point.",
  evidenceGone: "The figures that it rested on have changed.",
  withdrawn: (why: string) => `Withdrawn: ${why}. It stays on record.`,
  heading: (what: string, months: string) => `${what}, ${months}`,
  monthSpan: (from: string, to: string) => `${from} to ${to}`,
} as const;
