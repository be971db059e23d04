import { z } from "zod";
import { returnStatuses } from "@/lib/indicators/vocabulary";
import { code, month, pageOf, reason, version } from "./common";
import { tallyReplySchema } from "./tally";

export const returnParams = z.object({ ward: code, month });

/** A change of a return may say which version it saw; without one it takes the return as it stands. */
export const changeReturnSchema = z.object({ version: version.optional() });

export const reopenReturnSchema = z.object({ reason, version: version.optional() });

export const wardReturnSchema = z.object({
  ward: z.string(),
  wardName: z.string(),
  division: z.string(),
  month,
  status: z.enum(returnStatuses),
  dueOn: z.string(),
  version: z.number().int(),
  /** By the first sending, or by today where nothing was sent. */
  late: z.boolean(),
  firstSubmittedAt: z.iso.datetime().nullable(),
  submittedAt: z.iso.datetime().nullable(),
  submittedBy: z.string().nullable(),
  acceptedAt: z.iso.datetime().nullable(),
  acceptedBy: z.string().nullable(),
  /** True while it waits to be sent again; its last sent figures stay on the charts. */
  reopened: z.boolean(),
  reopenedReason: z.string().nullable(),
  tallies: z.array(tallyReplySchema),
});
export type WardReturnReply = z.output<typeof wardReturnSchema>;

export const returnListQuery = z.object({ ward: code.optional(), month: month.optional() });
export type ReturnListQuery = z.output<typeof returnListQuery>;

export const returnListItemSchema = z.object({
  ward: z.string(),
  wardName: z.string(),
  month,
  status: z.enum(returnStatuses),
  dueOn: z.string(),
  late: z.boolean(),
  submittedAt: z.iso.datetime().nullable(),
  submittedBy: z.string().nullable(),
  acceptedAt: z.iso.datetime().nullable(),
  reopened: z.boolean(),
  /** Lines that the ward reports in the month, and how many of them say something. */
  lines: z.number().int(),
  answered: z.number().int(),
  awaited: z.number().int(),
});
export type ReturnListItem = z.output<typeof returnListItemSchema>;

export const returnListSchema = pageOf(returnListItemSchema);
