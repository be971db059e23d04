/** Words of the pages on which indicators are set up. */
export const indicatorWords = {
  subtitle: (count: number) => (count === 1 ? "1 indicator." : `${count} indicators.`),
  add: "Add an indicator",
  newTitle: "New indicator",
  caption: "Indicators",
  empty: "No indicators yet.",
  emptyNext: "Say what will be counted, and out of what. Begin with few.",
  assign: "Assign to wards",
  headLine: (code: string, team: string, wards: number) =>
    `${code}, owned by ${team}, counted on ${wards === 1 ? "1 ward" : `${wards} wards`}.`,
  versionLine: (number: number, since: string) => `Definition version ${number}, ${since}.`,

  definition: "Definition",
  definitionNote: "new words make a new version, from a month that you choose",
  code: "Code",
  codeHint: "Up to 16 capital letters, digits or hyphens, as in workbooks. It can't be changed later.",
  name: "Name",
  numerator: "What is counted",
  numeratorHint: "The numerator, as the ward reads it.",
  denominator: "Out of what",
  denominatorHint: "The denominator, such as discharges or occupied bed days.",
  attribution: "Which ward an event belongs to",
  attributionHint: "Such as: the ward where it was seen. Counts only: no patient details.",
  kind: "Kind",
  kindFixed: "Fixed once counts exist.",
  betterWhen: "Better when",
  numeratorBy: "Who counts the events",
  team: "Owned by",
  per: "Shown as",
  matureAfterDays: "Days until complete",
  matureHint: "0: with month end.",
  target: "Target, none is fine",
  targetHint: "In the unit shown, such as 7 for 7%. A target is no limit.",
  shared: "Shared denominator, none is fine",
  sharedHint:
    "A code such as BED-DAYS. Indicators with the same code count out of one value, typed once a month.",

  limitsAndRules: "Rules and limits",
  limitsNote: "for the whole chart, earlier months too",
  limits: "Limits",
  limitsHint: "Baselines that are set keep the limits that were settled with them.",
  rules: "Rules in use",
  ruleLength: (rule: string) => `Months in a row: ${rule}`,

  change: "In force",
  changeNote: (number: number) => `your words make version ${number}`,
  effectiveFrom: "In force from",
  reason: "Reason",
  reasonHint: "Kept in the record of changes.",
  comparable: "Can months before and after be compared?",
  isComparable: "Comparable.",
  isComparableNote: "Only the words change. Runs, limits and sums go on.",
  notComparable: "Not comparable.",
  notComparableNote:
    "Runs end in the month before; trial limits start with this month; nothing is summed across.",

  create: "Add the indicator",
  saveVersion: (number: number) => `Save as version ${number}`,
  versions: "Versions",
  from: (month: string) => `From ${month}`,
  fromBeginning: "From the beginning",
  since: (month: string) => `in force since ${month}`,
  sinceBeginning: "in force from the beginning",
  comparableWith: (number: number) => `comparable with ${number}`,
  notComparableShort: "not comparable",
  versionReason: (reason: string, who: string, when: string) => `${reason}. ${who}, ${when}`,
  asRead: "As the ward will read it",
} as const;

export const kindWords = {
  proportion: "Part of the whole",
  rate: "Events over exposure",
} as const;

export const kindNotes = {
  proportion: "Each of the denominator has it at most once, such as readmitted of discharged.",
  rate: "One may have it more than once, such as falls in bed days.",
} as const;

export const directionWords = { lower: "lower", higher: "higher", neither: "neither" } as const;

export const countedByWords = { ward: "The ward", team: "The owning team" } as const;

export const teamNames = { infection_control: "Infection control", quality: "Quality team" } as const;

/** The same inside a sentence. */
export const teamWords = { infection_control: "infection control", quality: "the quality team" } as const;

export const limitWords = {
  auto: "Ebbline chooses: exact where counts are small",
  "three-sigma": "Three standard errors",
  exact: "Exact",
  overdispersed: "Allowing for spread beyond chance",
} as const;

export const ruleWords = {
  "beyond-action": "A month outside an action limit",
  "two-of-three": "Two of three past the warning limit",
  "one-side": "A run on one side of the centre line",
  "four-of-five": "Four of five beyond one standard error on one side",
  trend: "Months in a row rising, or falling",
  "within-one-sigma": "Months in a row within one standard error: look at how they are counted",
} as const;

/** Units that rates are shown in; others that an indicator already has are added beside them. */
export const perChoices = [
  { per: 100, label: "percent" },
  { per: 1_000, label: "per 1000" },
  { per: 10_000, label: "per 10,000" },
  { per: 100_000, label: "per 100,000" },
] as const;
