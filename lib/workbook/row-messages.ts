import { cutText } from "./cut-text";

/** What is said about single rows, in the words of the person who fills in the sheet. */
const quoted = (text: string) => `“${cutText(text)}”`;

/** Letters of the columns that a remedy speaks of; null where the sheet has no such column. */
export interface RemedyColumns {
  numerator: string;
  denominator: string;
  reason: string | null;
}

function giveReason({ numerator, denominator, reason }: RemedyColumns): string {
  const where = reason === null ? "in a column headed “Not collected”" : `in ${reason}`;
  return `leave ${numerator} and ${denominator} blank and give a reason ${where}`;
}

export const rowMessages = {
  blank: (what: string) => `The ${what} is blank.`,
  sheetError: (text: string) =>
    `${quoted(text)} is an error in the sheet. Put the formula right, or type the value.`,
  noResult:
    "The formula's result is not stored in the file. Save the sheet in your spreadsheet program first.",
  dateAsText: (what: string) => `This is a date, not ${what}. Format the cell as text and type it again.`,
  tooLong: (characters: number) =>
    `The text is longer than ${characters.toLocaleString("en-GB")} characters. Shorten it.`,
  unprintable: "The text holds a character that can't be shown. Type it again.",

  notWhole: (text: string, columns: RemedyColumns) =>
    `${quoted(text)} isn't a whole number. If it wasn't collected, ${giveReason(columns)}.`,
  fraction: (text: string) => `${quoted(text)} isn't a whole number.`,
  negative: (text: string) => `${quoted(text)} is below zero. A count is 0 or more.`,
  tooManyToCount: (text: string) => `${quoted(text)} is too large for a count.`,
  twoReadings: (text: string, plain: string) =>
    `${quoted(text)} can be read in more than one way. Write it without dots, commas or spaces: ${plain}.`,
  dateAsCount: "This is a date, not a whole number. Format the cell as a number and type it again.",

  notMonth: (text: string) => `${quoted(text)} isn't a month. Write it like 2026-11.`,
  monthTwoReadings: (text: string) => `${quoted(text)} can be read as two months. Write it like 2026-11.`,

  halfBlank: (blankColumn: string, columns: RemedyColumns) =>
    `${blankColumn} is blank, and blank is not zero. Fill it in; or, if it wasn't collected, ${giveReason(columns)}.`,
  reasonAndCount: ({ numerator, denominator }: RemedyColumns) =>
    `A reason for not collecting stands beside a count. Clear the reason, or leave ${numerator} and ${denominator} blank.`,
  nothingEntered: ({ numerator, denominator }: RemedyColumns) =>
    `Skipped: ${numerator} and ${denominator} are blank and no reason is given.`,
};
