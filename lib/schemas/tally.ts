import { z } from "zod";
import { countedBy, kinds, revisionEvents, revisionSources, teams } from "@/lib/indicators/vocabulary";
import { code, count, month, optionalText, version } from "./common";

const NOTE_LENGTH = 300;
const REASON_LENGTH = 300;

/** What a save may change: a field left out keeps its value, null clears it. */
export const saveTallySchema = z.object({
  numerator: count.optional(),
  denominator: count.optional(),
  /** Reason why nothing was collected. */
  notCollected: optionalText(REASON_LENGTH).optional(),
  /** The source that the denominator is still to come from. */
  awaited: optionalText(REASON_LENGTH).optional(),
  note: optionalText(NOTE_LENGTH).optional(),
  version,
  /** Version of the shared denominator, where the save changes one. */
  denominatorVersion: version.optional(),
});
export type SaveTally = z.output<typeof saveTallySchema>;

export const tallyReplySchema = z.object({
  indicator: z.string(),
  name: z.string(),
  kind: z.enum(kinds),
  per: z.number().int(),
  numeratorLabel: z.string(),
  denominatorLabel: z.string(),
  numeratorBy: z.enum(countedBy),
  team: z.enum(teams),
  sharedDenominator: z.string().nullable(),
  /** From this date on the month's outcome has had its time. */
  matureOn: z.string(),
  isMature: z.boolean(),
  numerator: z.number().int().nullable(),
  denominator: z.number().int().nullable(),
  notCollected: z.string().nullable(),
  awaited: z.string().nullable(),
  note: z.string().nullable(),
  version: z.number().int(),
  /** Only where the denominator is shared. */
  denominatorVersion: z.number().int().optional(),
  corrected: z.boolean(),
  savedBy: z.string().nullable(),
  savedAt: z.iso.datetime().nullable(),
  denominatorSavedBy: z.string().nullable(),
  denominatorSavedAt: z.iso.datetime().nullable(),
});
export type TallyReply = z.output<typeof tallyReplySchema>;

export const tallyParams = z.object({ ward: code, month, indicator: code });

export const tallyRevisionSchema = z.object({
  event: z.enum(revisionEvents),
  /** True: on the chart from then; false: taken off; null: no change of the chart. */
  charted: z.boolean().nullable(),
  numerator: z.number().int().nullable(),
  denominator: z.number().int().nullable(),
  notCollected: z.string().nullable(),
  awaited: z.string().nullable(),
  note: z.string().nullable(),
  version: z.number().int(),
  source: z.enum(revisionSources),
  reason: z.string().nullable(),
  by: z.string(),
  at: z.iso.datetime(),
});
export type TallyRevision = z.output<typeof tallyRevisionSchema>;

export const tallyHistorySchema = z.object({
  ward: z.string(),
  wardName: z.string(),
  month,
  tally: tallyReplySchema,
  /** Oldest first. */
  items: z.array(tallyRevisionSchema),
});
export type TallyHistory = z.output<typeof tallyHistorySchema>;
