/** What is said about the rows of a sheet before it is brought in. Problems of single cells are said by the reader. */
const MONTH_NAMES = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "Nov 2026" of "2026-11"; other text stays as it is. */
export function monthName(month: string): string {
  const name = MONTH_NAMES[Number(month.slice(5, 7)) - 1];
  return /^\d{4}-\d{2}$/.test(month) && name ? `${name} ${month.slice(0, 4)}` : month;
}

const listed = (names: readonly string[]) =>
  names.length < 2 ? (names[0] ?? "") : `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;

const MAX_LISTED_WARDS = 6;

/** Messages on rows. Each is put behind the name of its cell: "D4: …". */
export const rowWords = {
  unknownWard: (written: string, nearest: string | null, mine: readonly string[] | null) => {
    const hint = nearest ? ` Did you mean ${nearest}?` : "";
    const scope = mine && mine.length <= MAX_LISTED_WARDS ? ` You can send for ${listed(mine)}.` : "";
    return `No ward has the code “${written}”.${hint}${mine?.length === 0 ? " You have no ward yet." : scope}`;
  },
  unknownIndicator: (written: string, nearest: string | null) =>
    `No indicator has the code “${written}”.${nearest ? ` Did you mean ${nearest}?` : ""}`,
  futureMonth: (month: string) => `${monthName(month)} is still to come.`,
  notAssigned: (ward: string, indicator: string) => `${ward} doesn't report ${indicator}.`,
  outsideMonths: (ward: string, indicator: string, from: string, to: string | null) =>
    `${ward} reports ${indicator} from ${monthName(from)}${to ? ` to ${monthName(to)}` : " on"}.`,
  numeratorAbove: (numerator: number, denominator: number) =>
    `Numerator ${numerator} is more than denominator ${denominator}. The two may be the wrong way round.`,
  eventsWithoutDenominator: (numerator: number) =>
    `${numerator} counted out of 0. With nothing to count, the numerator is 0 too.`,
  countedByTeam: (indicator: string, team: string, stored: number | null) =>
    `${indicator} is counted by ${team}. Leave the numerator ${stored === null ? "blank" : `at ${stored}`}.`,
  denominatorOnly: (team: string) => `Denominator only: the numerator is counted by ${team}.`,
  tooLong: (characters: number) => `The text is longer than ${characters} characters. Shorten it.`,
  twice: (rows: readonly number[]) =>
    `${rows.length === 1 ? `Row ${rows[0]} is` : `Rows ${listed(rows.map(String))} are`} for the same ward, indicator and month. Keep one.`,
  sharedTwice: (rows: readonly number[]) =>
    `${rows.length === 1 ? `Row ${rows[0]} gives` : `Rows ${listed(rows.map(String))} give`} another value for the same denominator in this month.`,
  breaksSibling: (indicator: string, numerator: number, denominator: number) =>
    `${indicator} counts out of the same denominator and has ${numerator} counted, which ${denominator} doesn't allow. Put both in the sheet.`,
  sentMonth: (month: string, state: "submitted" | "accepted") =>
    `${monthName(month)} was ${state === "accepted" ? "accepted" : "sent"} already. Ask for a correction instead.`,
  needsReason: (month: string, state: "submitted" | "accepted") =>
    `${monthName(month)} was ${state === "accepted" ? "accepted" : "sent"} already, so this needs a reason.`,
} as const;

export const teamNames = { infection_control: "infection control", quality: "the quality team" } as const;

const rowsOf = (count: number) => (count === 1 ? "1 row" : `${count.toLocaleString("en-GB")} rows`);

/** What is said about an import as a whole. */
export const importWords = {
  noRows: "The sheet has no rows under its headings.",
  rejectedRows: (rejected: number, rest: number) =>
    `${rowsOf(rejected)} ${rejected === 1 ? "needs" : "need"} fixing. Put ${rejected === 1 ? "it" : "them"} right and choose the file again, or: leave out ${rowsOf(rejected)}, bring in ${rest.toLocaleString("en-GB")}.`,
  nothingToBringIn: "No row can be brought in.",
  checkCutShort: "This check was cut short. Choose the file again.",
  notYourWards: "You don't send for all of these wards any more. Choose the file again.",
  notYourLines: "Some of these lines are counted by another team now. Choose the file again.",
  leadBringsIn: "Months that were sent are changed by a quality lead.",
  reasonMissing: "Rows change months that were sent. Give a reason.",
  takenBackAlready: "This import was taken back. Choose the file again.",
  nothingBroughtIn: "Nothing of this sheet was brought in.",
  leadTakesBack: "This import changed or accepted returns that were sent. A quality lead takes it back.",
  movedSinceCheck: (count: number) =>
    `${count === 1 ? "1 row has" : `${rowsOf(count)} have`} changed since the check. Nothing was brought in. Choose the file again.`,
  changedSince: (count: number) =>
    `${count === 1 ? "1 row was" : `${rowsOf(count)} were`} changed after the import, so it can't be taken back.`,
  namedRow: (row: number, ward: string, indicator: string, month: string) =>
    `Row ${row}: ${ward}, ${indicator}, ${month}`,
  takenBackReason: "Import taken back",
  oneFile: "Choose one file.",
  sendAsForm: "Send the file as a form (multipart/form-data) with one field called file.",
  unreadableForm: "The form can't be read. Choose the file again.",
  unnamedFile: "sheet",
} as const;

/** The pages: choosing a file, and the check before anything is kept. */
export const importPageWords = {
  title: "Bring in from Excel",
  returns: "Returns",
  subtitle: "A workbook or a CSV file. You see row by row what it would do before anything is kept.",
  chooseTitle: "Choose a file",
  file: "Workbook (.xlsx) or CSV",
  fileHint: "Up to 5 MB and 50,000 rows. Counts only: no patient details, in notes neither.",
  fileMissing: "Choose a file first.",
  check: "Check the file",
  checking: "Reading the file…",
  templateTitle: "Get the template",
  templateNote: "A workbook with a row for each line of a month. Fill in the counts and choose it here.",
  month: "Month",
  ward: "Ward",
  allWards: "All my wards",
  getTemplate: "Get the template",
  exportTitle: "Take the figures out",
  exportNote: "The same sheet with what is stored now, to correct and bring in again.",
  exportWorkbook: "As a workbook",
  exportCsv: "As CSV",
  historyTitle: "Earlier files",
  historyCaption: "Files that were checked or brought in",
  noHistory: "No file has been checked yet.",
  more: "Earlier ones",
  columns: { file: "File", checked: "Checked", outcome: "What became of it", action: "To do" },
  look: "Look at it",
  takeBack: "Take it back",
  takingBack: "Taking it back…",
  takeBackSure: (rows: number) =>
    `The figures that stood before ${rows === 1 ? "this row" : `these ${rowsOf(rows)}`} come back, with a record of it.`,
  takeBackYes: "Yes, take it back",
  keep: "Keep it",
  by: (name: string, when: string) => `${when}, ${name}`,
  outcomes: {
    checked: "Nothing kept yet",
    committed: (rows: number, by: string, when: string) => `${rowsOf(rows)} brought in ${when}, ${by}`,
    takenBack: (when: string) => `Taken back ${when}`,
  },
} as const;

export const checkPageWords = {
  steps: "Bring in from Excel",
  titles: {
    checked: "Check before anything is saved",
    committed: "Brought in",
    "taken-back": "Taken back",
  },
  subtitle: (sheet: string, rows: number) => `${sheet ? `, sheet “${sheet}”` : ""}, ${rowsOf(rows)}.`,
  nothingSaved: "Nothing has been saved yet.",
  another: "Choose another file",
  tabsLabel: "Rows by what they do",
  tabs: { all: "All", rejected: "Needs fixing", changed: "Replaces", new: "Adds", same: "Same as now" },
  caption: "Rows in the sheet and what will happen to each",
  heads: {
    row: "Row",
    ward: "Ward",
    indicator: "Indicator",
    month: "Month",
    numerator: "Numerator",
    denominator: "Denominator",
    outcome: "What will happen",
    why: "Why",
  },
  outcome: {
    new: "Adds",
    changed: "Replaces",
    same: "Same as now, nothing to do",
    rejected: "Needs fixing",
    skipped: "Skipped",
  },
  needsReason: "needs a reason",
  notCollected: (reason: string) => `Not collected: ${reason}`,
  note: (note: string) => `Note: ${note}`,
  was: (numerator: string, denominator: string) => `Was ${numerator} of ${denominator}.`,
  wasNotCollected: (reason: string) => `Was not collected: ${reason}`,
  blank: "blank",
  noRows: "No rows of this kind.",
  further: "Further rows",
  panelTitle: "Before you bring it in",
  needFixing: (count: number) => `${rowsOf(count)} ${count === 1 ? "needs" : "need"} fixing.`,
  needFixingNext: "Put them right in Excel and choose the file again, or leave them out.",
  replaceSent: "Some rows change months that were sent.",
  replaceSentNext: "Each is kept as a correction with your reason; the earlier figure stays on record.",
  replace: (count: number) =>
    `${rowsOf(count)} ${count === 1 ? "replaces" : "replace"} figures that are not sent yet.`,
  skipped: (count: number, rows: string) =>
    `${rowsOf(count)} without figures ${count === 1 ? "is" : "are"} skipped${rows ? `: ${rows}` : ""}.`,
  allFine: "Every row can be brought in.",
  nothingToDo: "Every row is the same as now. There is nothing to bring in.",
  reason: "Reason for changing sent months",
  accept: "Accept the returns that it fills",
  acceptDetail:
    "For loading history: months that are over are sent and accepted with it, blank lines included.",
  bringIn: (rows: number) => `Bring in ${rowsOf(rows)}`,
  leaveOut: (rejected: number, rows: number) =>
    `Leave out ${rowsOf(rejected)}, bring in ${rows.toLocaleString("en-GB")}`,
  bringingIn: "Bringing in…",
  broughtInTitle: "Brought in",
  broughtIn: (rows: number, leftOut: number) =>
    `${rowsOf(rows)} brought in${leftOut > 0 ? `, ${rowsOf(leftOut)} left out` : ""}.`,
  accepted: "The returns that it fills were accepted.",
  reasonGiven: (reason: string) => `Reason: ${reason}`,
  takenBack: "It was taken back: the figures before it hold again.",
  columnsTitle: "How the columns were read",
  inYourSheet: "In your sheet",
  readAs: "Read as",
  notUsed: "not used",
  columnNames: {
    ward: "Ward",
    indicator: "Indicator",
    month: "Month",
    numerator: "Numerator",
    denominator: "Denominator",
    notCollected: "Reason not collected",
    note: "Note",
  },
  columnsNote: "Columns are found by their heading, in any order.",
  sumsTitle: "Sums of these rows",
  sumsHeads: { indicator: "Indicator", now: "Now", after: "After" },
  allOrNothing:
    "Bringing in is all or nothing: if one row fails while saving, none are kept. You can take it back while nothing later stands on top of it.",
} as const;
