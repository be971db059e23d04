import { z } from "zod";
import { importStates, rowOutcomes } from "@/lib/indicators/import-row";
import { code, cursorQuery, id, month, pageOf, reason } from "./common";

/** Entries of messages in one reply; beyond them there is only the count. */
export const MAX_MESSAGES = 200;

const figure = z.number().int().nullable();

export const importRowSchema = z.object({
  row: z.number().int(),
  /** Ward, indicator and month as written where they aren't known, else by code and as `YYYY-MM`. */
  ward: z.string(),
  indicator: z.string(),
  month: z.string(),
  numerator: figure,
  denominator: figure,
  notCollected: z.string().nullable(),
  note: z.string().nullable(),
  outcome: z.enum(rowOutcomes),
  /** "D4: …" */
  messages: z.array(z.string()),
});
export type ImportRowReply = z.output<typeof importRowSchema>;

const sums = z.object({ numerator: z.number().int(), denominator: z.number().int() });

export const importSchema = z.object({
  id,
  fileName: z.string(),
  sheetName: z.string(),
  checksum: z.string(),
  state: z.enum(importStates),
  columns: z.array(z.object({ letter: z.string(), header: z.string(), readAs: z.string().nullable() })),
  rows: z.array(importRowSchema),
  nextCursor: z.string().nullable(),
  counts: z.record(z.enum(rowOutcomes), z.number().int()),
  /** The first row numbers without any figures. */
  skippedRows: z.array(z.number().int()),
  /** Messages on all rows of this reply; at most 200 of them are sent. */
  messageCount: z.number().int(),
  /** Sums over the rows that can be brought in. */
  totals: z.array(
    z.object({ indicator: z.string(), name: z.string(), rows: z.number().int(), before: sums, after: sums }),
  ),
  /** True where a row changes a month that was sent: bringing it in then needs a reason. */
  needsReason: z.boolean(),
  uploadedBy: z.string(),
  uploadedAt: z.iso.datetime(),
  committedAt: z.iso.datetime().nullable(),
  committedBy: z.string().nullable(),
  takenBackAt: z.iso.datetime().nullable(),
  reason: z.string().nullable(),
  accepted: z.boolean(),
  version: z.number().int(),
});
export type ImportReply = z.output<typeof importSchema>;

/** An import without its rows: in lists, and after bringing it in or taking it back. */
export const importSummarySchema = importSchema
  .omit({ columns: true, rows: true, nextCursor: true, skippedRows: true, messageCount: true, totals: true })
  .extend({
    /** Rows that were brought in: those that add and those that replace. */
    broughtIn: z.number().int(),
  });
export type ImportSummary = z.output<typeof importSummarySchema>;

export const importListSchema = pageOf(importSummarySchema);

export const importParams = z.object({ id });

export const importListQuery = z.object(cursorQuery);

export const importRowsQuery = z.object({ ...cursorQuery, show: z.enum(rowOutcomes).optional() });

export const commitImportSchema = z.object({
  /** Accepts the returns that are filled: loading history. */
  accept: z.boolean().optional(),
  reason: reason.optional(),
  leaveOutRejected: z.boolean().optional(),
});
export type CommitImport = z.output<typeof commitImportSchema>;

/** A plain form sends empty text for "all". */
const orAll = <S extends z.ZodType>(schema: S) =>
  z.union([schema, z.literal("").transform(() => undefined)]).optional();

export const templateQuery = z.object({ month, ward: orAll(code) });

export const exportQuery = z
  .object({ from: orAll(month), to: orAll(month), ward: orAll(code), indicator: orAll(code) })
  .refine(({ from, to }) => from === undefined || to === undefined || from <= to, {
    path: ["to"],
    message: "The last month can't come before the first.",
  });
export type ExportQuery = z.output<typeof exportQuery>;
