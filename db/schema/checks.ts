import { sql, type SQL } from "drizzle-orm";
import type { AnyPgColumn } from "drizzle-orm/pg-core";

/** `YYYY-MM` with a month from 01 to 12; NULL passes. */
export const isMonthText = (column: AnyPgColumn): SQL =>
  sql`${column} ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'`;

export const isDateText = (column: AnyPgColumn): SQL =>
  sql`${column} ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])-(0[1-9]|[12][0-9]|3[01])$'`;

/** Codes of wards and indicators: `[A-Z0-9-]{1,16}`, and the name of the whole-hospital chart is kept free. */
export const isCode = (column: AnyPgColumn): SQL =>
  sql`${column} ~ '^[A-Z0-9-]{1,16}$' and ${column} <> 'HOSPITAL'`;

/** One of a closed list that TypeScript shares with the column. */
export const isOneOf = (column: AnyPgColumn, values: readonly string[]): SQL =>
  sql`${column} in (${sql.raw(values.map((value) => `'${value}'`).join(", "))})`;
