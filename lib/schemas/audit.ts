import { z } from "zod";
import { cursorQuery, pageOf } from "./common";

const auditEntrySchema = z.object({
  seq: z.number().int(),
  at: z.iso.datetime(),
  actor: z.object({ kind: z.string(), id: z.string().nullable(), name: z.string() }),
  action: z.string(),
  subjectType: z.string(),
  subjectId: z.string(),
  /** The record before and after, or null where there was none. */
  before: z.unknown(),
  after: z.unknown(),
  requestId: z.string(),
  hash: z.string(),
});

/** A page of the record of changes, newest first, and whether the whole chain verifies. */
export const auditPageSchema = pageOf(auditEntrySchema).extend({
  chain: z.object({
    intact: z.boolean(),
    entries: z.number().int(),
    brokenAt: z.number().int().nullable(),
    headHash: z.string(),
  }),
});
export type AuditPage = z.infer<typeof auditPageSchema>;

export const auditQuery = z.object({
  ...cursorQuery,
  cursor: z
    .string()
    .regex(/^\d{1,15}$/, "The cursor isn't one that this list gave.")
    .transform(Number)
    .optional(),
});
