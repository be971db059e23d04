/** Words of the chart pages: what a chart shows, which limits are in use, and the controls round it. */

export const chartPageWords = {
  charts: "Charts",
  shows: "What the chart shows",
  nothing: "Nothing stands out.",
  more: "More of this chart",
  limitsInUse: "Limits in use",
  version: (number: number) => `definition version ${number}`,
  subtitle: (numerator: string, denominator: string, unit: string) =>
    `${numerator} out of ${denominator}, ${unit}.`,
  better: { lower: "Lower is better.", higher: "Higher is better.", neither: "Neither direction is better." },
  title: (indicator: string, ward: string) => `${indicator}, ${ward}`,
  noMonths: "No months yet.",
  noMonthsNote: "The chart begins with the first return that is sent.",
  fewMonths: (count: number) => (count === 1 ? "One month so far." : `${count} months so far.`),
  figuresAsCsv: "Figures as CSV",
  baseline: "Baseline",
  byMonth: "By month",
  byQuarter: "By quarter",
  views: "How months are taken",
  limitViews: "Limits drawn",
  asSettled: "As settled",
  viewOnly: "These limits are for viewing only. Signals on record follow the settled ones.",
  signalsHere: "Signals on record",
  thisWard: "This ward's charts",
  asKnownOn: "As known on",
  show: "Show",
  range: "Months shown",
  rangeFrom: "From",
  rangeTo: "To",
  allMonths: "All months",
  asKnownNotice: (day: string) => `The chart as it was known on ${day}.`,
  today: "As known now",
  quarterNotice:
    "By quarter: the counts of three months taken together, against the same centre line. Runs belong to the months. The first month of each quarter is named.",
  cantShow: "That can't be shown:",
  addNote: "Add a note",
  noteMonth: "Month",
  noteText: "Note",
  noteHint:
    "Counts only: no patient details. The first 24 characters stand on the chart, all of it in the table.",
  noteSave: "Keep the note",
  noteSaved: "The note is kept.",
} as const;

/** Words that are drawn into a chart or divide its table. */
export const chartDataWords = {
  title: (indicator: string, ward: string) => `${indicator}, ${ward}`,
  until: (date: string) => `until ${date}`,
  newBaseline: (month: string) => `New baseline from ${month}`,
  newDefinition: (month: string) => `New definition from ${month}`,
  upTo: (upTo: string, sentence: string) => `Up to ${upTo}: ${sentence}`,
  centre: (centre: string, months: string, span: string) => `centre ${centre}, from ${months}, ${span}`,
  months: (count: number) => (count === 1 ? "1 month" : `${count} months`),
  span: (from: string, to: string) => (from === to ? from : `${from} to ${to}`),
  leftOut: (count: number, months: string) => `, ${count} left out (${months})`,
  standing: { trial: " Trial limits.", provisional: " Provisional." },
} as const;

export const chartIndexWords = {
  title: "Charts",
  subtitle: "Each ward's indicators, by name. The rate is that of the newest counted month.",
  ward: "Ward",
  allWards: "All wards",
  filter: "Show",
  indicator: "Indicator",
  newest: "Newest month",
  counted: "Counted",
  outOf: (numerator: string, denominator: string) => `${numerator} of ${denominator}`,
  value: "Rate",
  limits: "Limits",
  says: "What the chart says",
  none: "No indicators are counted here yet.",
  nothingYet: "Nothing counted yet",
  quiet: "No signal",
  proposed: "A baseline waits for a decision",
} as const;

export const baselineStatusWords = {
  none: "No limits",
  trial: "Trial limits",
  provisional: "Provisional",
  set: "Set",
} as const;

/** Which limits are in use and why; figures come in as text. */
export const limitsSentences = {
  exact: "Exact limits, because a baseline month expects fewer than 5.",
  exactChosen: "Exact limits, as chosen.",
  "three-sigma": "Action limits lie three standard errors from the centre line, warning limits two.",
  overdispersed: (sigmaZ: string) =>
    `Limits allow for the spread between months, ${sigmaZ} times what chance alone would bring (σz).`,
  centre: (rate: string, events: string, outOf: string, months: string) =>
    `Centre line ${rate}: ${events} out of ${outOf} over ${months}.`,
  trial: (span: string) =>
    `Trial limits, because no baseline is set: from the months so far (${span}), at most the first 25, then they stay.`,
  provisional: (months: string, events: string) =>
    `Provisional: the baseline has ${months} and ${events} expected events, and twenty of each are needed.`,
  set: (span: string) => `The baseline is ${span}.`,
  leftOut: (count: number, months: string) =>
    count === 1 ? `One month is left out: ${months}.` : `${count} months are left out: ${months}.`,
  noBaselineMonth: "There are no limits: no month of the baseline is counted.",
  noEvents:
    "There are no limits: no events were counted in the baseline. Limits of no width would flag the first event whatever its chance.",
  onlyEvents:
    "There are no limits: everything in the baseline was an event, which leaves limits of no width.",
  noSpread: "There are no limits: the baseline's months show no spread to allow for.",
  sigmaZ: (sigmaZ: string) => `The months vary ${sigmaZ} times as much as chance alone would bring (σz).`,
  suggestWider: "Limits that allow for that spread may suit better; a quality lead decides.",
  smallRuns: (length: string, odds: string) =>
    `Where a month expects fewer than 5, a run of ${length} counts only when chance alone brings it in at most 1 in ${odds} such stretches: Ebbline's own guard.`,
  months: (count: string) => (count === "1" ? "1 month" : `${count} months`),
} as const;

/** Items of the list beside the chart: a lead in bold, then the rest. */
export const showsSentences = {
  warning: (month: string, rate: string) => `${month}, ${rate}`,
  warningInside: (warning: string, action: string) =>
    `is past the warning limit (${warning}) but inside the action limit (${action}).`,
  warningAlone: (warning: string) => `is past the warning limit (${warning}).`,
  oneAlone: "One month alone isn't a signal; two of three in a row would be.",
  ripeningUntil: (date: string, numerator: string, denominator: string) =>
    `isn't complete until ${date}: ${numerator} of ${denominator} so far.`,
  ripening: "It takes no part in limits or rules before then.",
  awaited: (source: string | null) =>
    source === null
      ? "isn't drawn: its denominator is awaited."
      : `isn't drawn: its denominator is awaited from ${source}.`,
  openReturn: "isn't sent yet. Its counts are drawn hollow and judged by nothing.",
  missing: "has no return. That neither counts in a run nor ends one.",
  newBaseline: (month: string) => `New baseline from ${month}.`,
  firstBaseline: (span: string) => `Baseline ${span}.`,
  byPeople: (proposed: string, decided: string, date: string) =>
    `Proposed by ${proposed}, decided by ${decided}, ${date}.`,
  byOne: (decided: string, date: string) => `Set by ${decided}, ${date}.`,
  newDefinition: (month: string) => `New definition from ${month}.`,
  newDefinitionNote: "Months before can't be compared with those after: new limits begin.",
  leftOut: (cause: string) => `is left out of the baseline: ${cause}`,
  quiet: "No signal.",
} as const;

export const baselineWords = {
  title: "Baseline",
  subtitle: "The months that centre line and limits are worked out from.",
  formTitle: { set: "Set the first baseline", propose: "Propose a baseline" },
  formNote: {
    set: "You may set the first baseline alone. Every later one is proposed by one person and decided by another.",
    propose: "One person proposes, another decides. Until then the limits stay as they are.",
  },
  noForm: "You can read the baselines of this chart. Setting one is not yours to do.",
  limitsNow: "Limits in use",
  from: "First month",
  to: "Last month",
  appliesFrom: "New limits from",
  appliesFromHint:
    "For a change of baseline, the month in which the change began. Blank for the beginning of the chart.",
  leftOut: "Months left out",
  leftOutHint: "A month is left out only for a found cause that won't recur.",
  leftOutMonth: "Month",
  leftOutReason: "Cause",
  leftOutLine: (month: string, cause: string) => `${month} left out: ${cause}`,
  addLeftOut: "Leave out a month",
  removeLeftOut: "Take it back in",
  reason: "Reason",
  reasonHint:
    "For a change: the sustained signal, its cause, and why it is expected to last. No patient details.",
  preview: "Show before and after",
  save: { set: "Set the baseline", propose: "Propose it" },
  savedSet: "The baseline is set.",
  savedProposed: "It is proposed. Another person decides.",
  before: "Before",
  after: "After",
  comeAndGo: "Signals that come and go",
  comes: (what: string) => `Comes: ${what},`,
  goes: (what: string) => `Goes: ${what},`,
  changes: (what: string) => `Other months: ${what},`,
  goesNote: "Withdrawn because the baseline changed; it stays on record.",
  noneComes: "No signal comes.",
  noneGoes: "No signal goes.",
  limitsFor: "Action limits for a month",
  stoodOut: "Stood out at",
  wouldStandOut: "Would at",
  orMore: (count: string) => `${count} or more`,
  noCount: "no count",
  none: "none",
  range: (from: string, to: string) => `${from} to ${to}`,
  waiting: "Waiting for a decision",
  draft: (months: string, from: string | null) =>
    from === null ? `${months}, for the beginning of the chart` : `${months}, new limits from ${from}`,
  history: "Baselines so far",
  noHistory: "None has been set.",
  months: "Months",
  state: "State",
  centre: "Centre",
  limits: "Limits",
  who: "By whom",
  leftOutCount: (count: number) => (count === 0 ? "none left out" : `${count} left out`),
  holdsFrom: (month: string) => `new limits from ${month}`,
  holdsFromStart: "beginning of the chart",
  proposedBy: (name: string, date: string) => `Proposed by ${name}, ${date}`,
  decidedBy: (name: string, date: string) => `Decided by ${name}, ${date}`,
  declinedBy: (name: string, date: string) => `Declined by ${name}, ${date}`,
  decide: "Decide",
  agree: "Agree.",
  agreeNote: "The limits change, and with them the signals shown above.",
  decline: "Not now.",
  declineNote: "The limits stay.",
  why: "Why",
  record: "Record decision",
  otherDecides: "Somebody other than the proposer decides.",
  backToChart: "Back to the chart",
  packsNote: "Published packs keep the limits that they were printed with.",
  needs: "What a new baseline needs",
  needsList: [
    "A sustained signal, such as a run on one side of the centre line.",
    "A cause that is understood.",
    "An expectation that it lasts.",
  ],
} as const;

export const baselineStateWords = {
  proposed: "Proposed",
  decided: "Decided",
  superseded: "Earlier",
  declined: "Declined",
} as const;

export const limitMethodWords = {
  "three-sigma": "Three standard errors",
  exact: "Exact",
  overdispersed: "Allowing for spread",
} as const;
