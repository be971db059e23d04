/** Words about returns and their lines, shared by the pages and by what the services refuse. */

interface CountWords {
  numerator: string;
  denominator: string;
}

type Team = "infection_control" | "quality";
type Part = "line" | "numerator" | "denominator";
type Status = "open" | "submitted" | "accepted";

/** "2068" as "2,068". */
const figure = (count: number): string => String(count).replace(/\B(?=(\d{3})+$)/g, ",");

/** Inside a sentence; abbreviations keep their capitals. */
const lowerFirst = (words: string): string =>
  /^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;

export const teamWords: Record<Team, string> = {
  infection_control: "infection control",
  quality: "the quality team",
};

/** Why figures can't be kept. */
export const figureWords = {
  moreThanDenominator: (words: CountWords, numerator: number, denominator: number) =>
    `${words.numerator} (${figure(numerator)}) are more than ${lowerFirst(words.denominator)} (${figure(denominator)}).`,
  eventsWithoutDenominator: (words: CountWords, numerator: number) =>
    `${words.numerator} is ${figure(numerator)}, but ${lowerFirst(words.denominator)} is 0.`,
  inLine: (line: string, message: string) => `${line}: ${message}`,
  countedByTeam: (line: string, team: Team) => `${line} is counted by ${teamWords[team]}.`,
  changedMeanwhile: "Somebody changed this line meanwhile.",
  notOpen: {
    submitted: "This return has been sent. Take it back to change it, or ask for a correction.",
    accepted: "This return is accepted. Ask for a correction.",
  },
} as const;

/** What is still to enter. */
export const missingWords = {
  part: (words: CountWords, part: Part) =>
    part === "line" ? "Still to enter." : `${words[part]}: still to enter.`,
  inReturn: (line: string, words: CountWords, part: Part) =>
    part === "line" ? `${line} is still to enter.` : `${line}: ${lowerFirst(words[part])} still to enter.`,
} as const;

/** Why a step of a return isn't taken. */
export const returnChangeWords = {
  changedMeanwhile: "Somebody changed this return meanwhile.",
  monthNotOver: "The month isn't over yet. What you enter is kept; send it from its last day on.",
  missing: (lines: number) =>
    lines === 1 ? "One line is still to enter." : `${lines} lines are still to enter.`,
  wrongState: {
    open: "This return is open.",
    submitted: "This return has been sent already.",
    accepted: "This return is accepted.",
  } satisfies Record<Status, string>,
} as const;

/** Why a correction isn't taken. */
export const correctionWords = {
  returnOpen: "This return is open: change the line itself.",
  nothingChanges: "These are the figures already.",
  incomplete: "Give both figures, or say why nothing was collected.",
  notCollectedByLead: "Ask a quality lead to mark a sent month as not collected.",
  waitsAlready: "A correction of this line waits for a quality lead already.",
  decidedAlready: "This correction is decided already.",
  lineChanged:
    "The line has changed since this correction was asked for. Decline it, or correct the line anew.",
  changedMeanwhile: "Somebody changed this correction meanwhile.",
} as const;

/** The list of returns. */
export const returnListWords = {
  title: "Returns",
  subtitle: "The last twelve months. A return holds all counts of one ward for one month.",
  caption: "Returns, newest month first",
  ward: "Ward",
  month: "Month",
  state: "State",
  due: "Due",
  entered: "Lines filled in",
  open: "Open it",
  fillIn: "Fill in",
  carryOn: "Carry on",
  look: "What it shows",
  linesOf: (answered: number, lines: number) => `${answered} of ${lines}`,
  allWards: "All wards",
  allMonths: "All twelve months",
  filter: "Show these",
  none: "No returns here.",
  noneNote: "A ward has a return for each month in which it reports an indicator.",
  reopened: "opened again",
  late: "late",
  states: { open: "Open", submitted: "Sent", accepted: "Accepted" } satisfies Record<Status, string>,
  underWay: "month under way",
} as const;

/** The page of an open return. */
export const entryWords = {
  title: (month: string) => `${month} return`,
  crumb: "Returns",
  division: (ward: string, division: string) => `${ward} · ${division}`,
  savedOf: (saved: number, lines: number) => `${saved} of ${lines} lines are filled in`,
  toFix: (lines: number) => `${lines} to fix`,
  twoVersions: (lines: number) => `${lines} with two versions`,
  notSaved: (lines: number) => `${lines} not saved yet`,
  toEnter: (lines: number) => `${lines} still to enter`,
  due: "Due",
  wasDue: "It was due on",
  late: "Late.",
  reopened: (reason: string) =>
    `This return was opened again: “${reason}”. What was sent before stays on the charts until it is sent again.`,
  send: "Send return",
  sending: "Sending",
  canSend: "Everything is here. You can send the return.",
  cantSend: "You can send when these lines are ready:",
  notYours: "Only the ward or a quality lead sends this return.",
  bringIn: "Bring in from Excel",
  caption: (ward: string, earlier: number, month: string) =>
    `Monthly counts for ${ward}: ${earlier} earlier months, then ${month}, which is open for entry.`,
  indicator: "Indicator",
  count: "Count",
  openState: "open",
  thisMonth: "This month",
  earlierMonths: "Earlier months",
  checks: "Checks",
  asLine: (line: string) => `as ${line}`,
  box: (line: string, label: string, month: string) => `${line}, ${label}, ${month}`,
  soFar: (count: string) => `${count} so far`,
  awaited: "awaited",
  notCollected: "not collected",
  countedBy: (team: Team) => `by ${teamWords[team]}`,
  notCountedYet: "not counted yet",
  keys: "Keys",
  keyNext: "next box below",
  keyTab: "next box",
  keyBack: "put back",
  eachSaves: "Each box saves as you leave it.",
  care:
    "Before sending, counts are compared with this ward's own earlier months, high and low alike. Limits, and what " +
    "the month shows, appear once the return is sent. If a number looks odd but is right, send it and say why. " +
    "Counts only: no patient details.",
  noLines: "This ward reports nothing in this month.",
  noLinesNote: "A quality lead says which indicators a ward reports.",
} as const;

/** What stands beside a line of an open return. */
export const checkWords = {
  dirty: "Saves when you leave the box",
  saving: "Saving",
  saved: "Saved.",
  savedAt: (time: string) => `Saved ${time}.`,
  offline: "Not saved: no connection.",
  saveAgain: "Save it again",
  wholeNumber: "Give a whole number, or leave the box blank.",
  wrongWayRound: "Check whether the two are the wrong way round.",
  swap: "Swap them",
  twoVersions: (label: string) => `Two versions of “${label}”.`,
  mineAndTheirs: (mine: string, name: string, time: string, theirs: string) =>
    `You: ${mine}. ${name}, ${time}: ${theirs}.`,
  keep: (value: string) => `Keep ${value}`,
  use: (value: string) => `Use ${value}`,
  blank: "nothing",
  notCollected: "Not collected.",
  awaitedFrom: (label: string, source: string) => `${label} awaited from ${source}.`,
  awaitedNote: "You may send without it.",
  nothingToCount: "Nothing to count: there is no rate.",
  ripening: "Not complete yet.",
  ripeningUntil: (date: string) => `The month is complete on ${date}. It doesn't hold back this return.`,
  countedByTeam: (label: string, team: Team) => `${label}: counted by ${teamWords[team]}.`,
  within: (least: string, most: string) => `Within the earlier months (${least} to ${most}).`,
  above: (label: string, least: string, most: string) =>
    `${label}: above the earlier months (${least} to ${most}).`,
  below: (label: string, least: string, most: string) =>
    `${label}: below the earlier months (${least} to ${most}).`,
  wellAbove: (value: string, least: string, most: string) =>
    `${value} is well above the earlier months (${least} to ${most}). If it's right,`,
  wellBelow: (value: string, least: string, most: string) =>
    `${value} is well below the earlier months (${least} to ${most}). If it's right,`,
  sayWhy: "say why",
  otherAnswer: "Other answer or note",
  otherAnswerFor: (line: string) => `${line}: other answer or note`,
} as const;

/** The small window for answers that aren't counts. */
export const answerWords = {
  title: (line: string) => `${line}: what is it?`,
  answer: "This month",
  count: "A count, in the boxes",
  nothing: "Nothing to count",
  nothingHint: (label: string) => `${label} is 0, so there is no rate.`,
  notCollected: "Not collected",
  notCollectedHint: "It could have been counted, but wasn't.",
  awaited: "Denominator still to come",
  awaitedHint: (label: string) => `${label} will come from somebody else. You may send without it.`,
  why: "Why was it not collected?",
  from: "Where does it come from?",
  note: "Note",
  noteHint: "Goes with the figures. No patient details.",
  save: "Keep this",
  cancel: "Cancel",
  whyMissing: "Say why.",
  fromMissing: "Say where it comes from.",
} as const;

/** The page of one line of a sent return. */
export const historyWords = {
  title: (month: string) => `${month} and how it changed`,
  subtitle: (indicator: string, ward: string) =>
    `${indicator}, ${ward}. Every value is kept; nothing is written over.`,
  backToReturn: "Back to the return",
  toChart: "Chart",
  caption: "History",
  captionNote: "newest last",
  when: "When",
  who: "Who",
  from: "From",
  what: "What",
  reason: "Reason",
  none: "Nothing was entered for this line.",
  events: {
    saved: "saved",
    sent: "sent",
    recalled: "taken back",
    reopened: "opened again",
    "correction-asked": "correction asked for",
    "correction-declined": "correction declined",
    corrected: "corrected",
    completed: "completed",
  },
  offChart: "left off the chart",
  sources: {
    form: "form",
    import: "Excel",
    api: "another system",
    correction: "correction",
    "set-up": "set-up",
  },
  notCollected: "not collected",
  awaited: "awaited",
  correct: "Correct it",
  askFor: "Ask for a correction",
  nowIs: (figures: string) => `It is ${figures} now.`,
  of: (numerator: string, denominator: string) => `${numerator} of ${denominator}`,
  newFigures: "New figures",
  wasNotCollected: "It was not collected after all",
  whyNotCollected: "Why was it not collected?",
  reasonLabel: "Reason",
  reasonHint: "No patient details.",
  holdsAtOnce: "The correction holds at once, on this chart and in the hospital's figures.",
  holdsShared: "The denominator is shared: it changes for every line that counts out of it.",
  waitsForLead: "A quality lead decides. Until then the chart stays as it is.",
  send: "Correct",
  ask: "Ask",
  asked: "Asked. A quality lead decides.",
  done: "Corrected.",
  stale: "Somebody changed this line meanwhile. These are the figures now; look again, then correct.",
  openHint: "The return is open: change the line itself.",
  waiting: "Waits for a decision",
  waitingBy: (name: string, when: string) => `Asked by ${name}, ${when}.`,
  wouldBe: (before: string, after: string) => `${before} would become ${after}.`,
  agree: "Agree",
  decline: "Decline",
  declineWhy: "Why not? (shown to whoever asked)",
  onlyLead: "A quality lead decides.",
} as const;

/** Why a line keeps its return from being sent. */
export const holdWords = {
  fix: "needs fixing",
  conflict: "two versions",
  unsaved: "not saved yet",
  missing: "still to enter",
} as const;
