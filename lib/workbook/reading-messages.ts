/** What is said when a file as a whole can't be read. Problems of single rows are in row-messages.ts. */
const count = (value: number) => value.toLocaleString("en-GB");

export const readingMessages = {
  empty: "The file is empty.",
  tooManyBytes: (megabytes: number) =>
    `The file is larger than ${megabytes} MB. Split it and bring in the parts.`,
  tooMuchUnpacked: (megabytes: number) =>
    `The workbook holds more than ${megabytes} MB once unpacked. Copy the sheet of tallies to a workbook of its own.`,
  tooManyRows: (rows: number) =>
    `The sheet has more than ${count(rows)} rows. Split it and bring in the parts.`,
  tooManyParts: "The workbook has too many parts. Copy the sheet of tallies to a workbook of its own.",
  tooMuchText: "The sheet holds too much text. Shorten the notes, or split the sheet.",
  tooMuchMemory:
    "The file needs too much memory to be read. Copy the sheet of tallies to a workbook of its own.",
  tooSlow: (seconds: number) =>
    `Reading the file took longer than ${seconds} seconds. Copy the sheet of tallies to a workbook of its own.`,
  unknownType: "This is neither an Excel workbook (.xlsx) nor a CSV file.",
  notWorkbook: "This file is not an Excel workbook (.xlsx).",
  oldOrProtected:
    "This is a workbook of an older kind (.xls), or one protected by a password. Save it as .xlsx without a password.",
  encrypted: "The workbook is protected by a password. Save a copy without one.",
  macros: "The workbook holds macros. Save a copy as .xlsx, which leaves them out.",
  damaged:
    "The workbook can't be opened: it is damaged or was cut short. Save it again and choose the new file.",
  doctype:
    "The workbook holds a document type declaration, which no spreadsheet program writes. It is not read.",
  notText:
    "This file is not plain text, so it is not a CSV. If it is a workbook, its name should end in .xlsx.",
  notUnicode: "The CSV can't be read as UTF-8 or UTF-16. Save it as “CSV UTF-8” and choose it again.",
  brokenQuotes: (row: number) => `Row ${row}: a quotation mark (") is opened but not closed properly.`,
  noSheet: (sheetNames: string[]) =>
    `No sheet is called “Tallies”. The workbook has: ${sheetNames.join(", ")}. Name the one to bring in “Tallies”.`,
  noVisibleSheet: "The workbook has no sheet called “Tallies” and none that can be seen.",
  twoSheets: "Two sheets are called “Tallies”. Give one of them another name.",
  headings: "The column headings in row 1 need fixing.",
  noHeadings: "Row 1 holds no column headings. It needs Ward, Indicator, Month, Numerator and Denominator.",
  missingColumn: (title: string) => `There is no column headed “${title}” in row 1.`,
  twiceColumn: (title: string, letters: string[]) =>
    `Columns ${letters.join(" and ")} are both headed “${title}”. Keep one of them.`,
};
