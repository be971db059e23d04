/** Closed lists of the domain. Columns, schemas and interface text all take them from here. */

export const kinds = ["proportion", "rate"] as const;
export type Kind = (typeof kinds)[number];

export const directions = ["lower", "higher", "neither"] as const;
export type Direction = (typeof directions)[number];

export const teams = ["infection_control", "quality"] as const;
export type Team = (typeof teams)[number];

/** Who counts the numerator: the ward, or the owning team on its own sheet. */
export const countedBy = ["ward", "team"] as const;
export type CountedBy = (typeof countedBy)[number];

export const limitChoices = ["auto", "three-sigma", "exact", "overdispersed"] as const;
export type LimitChoice = (typeof limitChoices)[number];

export const returnStatuses = ["open", "submitted", "accepted"] as const;
export type ReturnStatus = (typeof returnStatuses)[number];

/** Rules that a series can be watched by; the first three are on unless an indicator says otherwise. */
export const ruleNames = [
  "beyond-action",
  "two-of-three",
  "one-side",
  "four-of-five",
  "trend",
  "within-one-sigma",
] as const;
export type WatchedRule = (typeof ruleNames)[number];
export const defaultRules: { name: WatchedRule; length?: number }[] = [
  { name: "beyond-action" },
  { name: "two-of-three" },
  { name: "one-side", length: 8 },
];

export const signalStatuses = ["new", "in_review", "closed", "withdrawn"] as const;
export type SignalStatus = (typeof signalStatuses)[number];

export const sides = ["upper", "lower"] as const;

export const towardsValues = ["adverse", "favourable", "neither"] as const;
export type Towards = (typeof towardsValues)[number];

export const withdrawnReasons = [
  "correction",
  "baseline",
  "definition",
  "rules",
  "trial-limits",
  "recall",
  "import-taken-back",
] as const;
export type WithdrawnReason = (typeof withdrawnReasons)[number];

export const baselineStatuses = ["none", "trial", "provisional", "set"] as const;
export type BaselineStatus = (typeof baselineStatuses)[number];

/** Life of a stored baseline. */
export const baselineStates = ["proposed", "decided", "superseded", "declined"] as const;
export type BaselineState = (typeof baselineStates)[number];

export const revisionSources = ["form", "import", "api", "correction", "set-up"] as const;
export type RevisionSource = (typeof revisionSources)[number];

/**
 * What happened to a tally. `sent`, `corrected` and `completed` put its figures on the chart, `recalled` takes
 * them off; the others change no chart.
 */
export const revisionEvents = [
  "saved",
  "sent",
  "recalled",
  "reopened",
  "correction-asked",
  "correction-declined",
  "corrected",
  "completed",
] as const;
export type RevisionEvent = (typeof revisionEvents)[number];

/** Life of a correction: a nurse's waits for a quality lead, a lead's is agreed at once. */
export const correctionStates = ["waiting", "agreed", "declined"] as const;
export type CorrectionState = (typeof correctionStates)[number];
