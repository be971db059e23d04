/** Words of the set-up pages: wards, indicators, who counts what, and the record of changes. */
export const setUpWords = {
  title: "Set-up",
  menu: "Set-up pages",
  subtitle:
    "What is counted, where and by whom. Every change is written to the record of changes with your name.",
  hospital: "Hospital",
  wards: "Wards",
  indicators: "Indicators",
  assignments: "Who counts what",
  people: "People and roles",
  baselines: "Baselines",
  record: "Record of changes",
  about: {
    hospital: "Name, time zone, the day on which returns are due, and holidays.",
    wards: "Codes, names, divisions, and the months in which each is open.",
    indicators: "What is counted out of what, with versions, limits and rules.",
    assignments: "Which ward reports which indicator, from which month on.",
    people: "Who signs in, in which role, for which wards.",
    baselines: "Set on each chart: the months that its limits are worked out from.",
    record: "Who changed what and when, and whether the record is whole.",
  },
  startWith: (what: string) => `Start here: ${what}.`,
} as const;

/** Words that the forms share. */
export const formWords = {
  save: "Save changes",
  saving: "Saving",
  cancel: "Cancel",
  saved: "Saved.",
  monthHint: "Year and month, such as 2026-03.",
  openEnd: "Leave it blank for no end.",
  staleTitle: "Two versions.",
  stale: "Somebody else saved this meanwhile.",
  staleLine: (label: string, yours: string, theirs: string) =>
    `${label}. You: ${yours}. Saved meanwhile: ${theirs}.`,
  keepMine: "Keep mine",
  useTheirs: "Use the saved version",
  keptMine: "Yours is kept on this page. Save again to put it in place of the other.",
  nothing: "nothing",
  yes: "yes",
  no: "no",
  edit: "Edit",
} as const;

export const hospitalWords = {
  subtitle: "What holds for every ward. Returns that are open keep the due day that they were given.",
  name: "Name of the hospital",
  timeZone: "Time zone",
  timeZoneHint: "By its IANA name, such as Europe/Lisbon. Due days and the current month follow it.",
  dueDay: "Day of the next month on which returns are due",
  dueDayHint: "From 1 to 28. A weekend or holiday moves it to the next working day.",
  holidays: "Holidays",
  holidaysHint: "One date a line, such as 2026-12-25.",
} as const;

export const wardWords = {
  subtitle: (count: number) => (count === 1 ? "1 ward." : `${count} wards.`),
  add: "Add a ward",
  newTitle: "New ward",
  editNote: (code: string) => `Code ${code}. The code stays as it is, since workbooks name the ward by it.`,
  caption: "Wards",
  empty: "No wards yet.",
  emptyNext: "Add the first one; indicators and people are given to wards.",
  code: "Code",
  codeHint: "Up to 16 capital letters, digits or hyphens, as in workbooks. It can't be changed later.",
  name: "Name",
  division: "Division",
  divisionHint: "Wards of one division stand together in lists.",
  open: "Open",
  openFrom: "Open from",
  openTo: "Open until",
  openRange: (from: string, to: string | null) => (to === null ? `since ${from}` : `${from} to ${to}`),
  reports: "Who counts what",
} as const;

export const assignmentWords = {
  subtitle: "Which ward reports which indicator, from month to month.",
  choose: "Choose a ward or an indicator.",
  byWard: "By ward",
  byIndicator: "By indicator",
  reported: (count: number) => (count === 1 ? "1 assigned" : `${count} assigned`),
  wardTitle: (name: string) => `What ${name} reports`,
  wardNote: (range: string) => `Open ${range}. Months outside can't be chosen.`,
  indicatorTitle: (name: string) => `Wards that report ${name}`,
  from: "From",
  to: "Until",
  assign: "Assign",
  change: "Change",
  assignTo: (name: string) => `Assign: ${name}`,
  changeOf: (name: string) => `Change: ${name}`,
  notCounted: "not counted here",
  noIndicators: "No indicators yet.",
  noWards: "No wards yet.",
  endHint: "To end it, give the last month. Counts that were sent stay on the chart.",
} as const;

export const recordWords = {
  subtitle: "Who changed what and when. Entries are only ever added.",
  intact: (entries: string) =>
    `All ${entries} entries fit together: none was changed, taken out or put in between.`,
  intactEmpty: "No entries yet.",
  broken: (entry: string) =>
    `The record doesn't fit together from entry ${entry} on. Somebody reached the database past Ebbline. ` +
    "Keep a copy as it is and ask whoever looks after the server.",
  head: "Checksum of the newest entry",
  headNote: "Note it elsewhere: a record that was cut off and continued shows another one.",
  caption: "Entries",
  captionNote: (zone: string) => `newest first, times in ${zone}`,
  number: "No.",
  when: "When",
  who: "Who",
  what: "What",
  details: (count: number) => (count === 1 ? "1 field" : `${count} fields`),
  ofEntry: (number: string) => `in entry ${number}`,
  change: (before: string | null, after: string) => (before === null ? after : `${before}, now ${after}`),
  nothing: "nothing",
  earlier: "Earlier entries",
  newest: "Newest entries",
  paging: "Pages of the record",
} as const;
