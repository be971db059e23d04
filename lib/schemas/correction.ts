import { z } from "zod";
import { correctionStates } from "@/lib/indicators/vocabulary";
import { code, count, cursorQuery, id, month, optionalText, pageOf, reason, version } from "./common";
import { tallyReplySchema } from "./tally";

export const correctTallySchema = z.object({
  indicator: code,
  /** A figure left out keeps its value. */
  numerator: count.optional(),
  denominator: count.optional(),
  /** Reason why nothing was collected after all; only a quality lead may say so of a sent month. */
  notCollected: optionalText(300).optional(),
  reason,
  version,
  denominatorVersion: version.optional(),
});
export type CorrectTally = z.output<typeof correctTallySchema>;

export const correctionSchema = z.object({
  id,
  ward: z.string(),
  wardName: z.string(),
  indicator: z.string(),
  indicatorName: z.string(),
  month,
  numerator: z.number().int().nullable(),
  denominator: z.number().int().nullable(),
  reason: z.string(),
  state: z.enum(correctionStates),
  askedBy: z.string(),
  askedAt: z.iso.datetime(),
  decidedBy: z.string().nullable(),
  decidedAt: z.iso.datetime().nullable(),
  decisionReason: z.string().nullable(),
  version: z.number().int(),
});
export type CorrectionReply = z.output<typeof correctionSchema>;

/** The correction with the line as it stands after it. */
export const correctionResultSchema = correctionSchema.extend({ tally: tallyReplySchema });
export type CorrectionResult = z.output<typeof correctionResultSchema>;

export const decideCorrectionSchema = z.object({
  agree: z.boolean({ error: "Say whether you agree." }),
  reason: optionalText(500).optional(),
  version: version.optional(),
});
export type DecideCorrection = z.output<typeof decideCorrectionSchema>;

export const correctionParams = z.object({ id });

export const correctionListQuery = z.object({
  state: z.enum(correctionStates).optional(),
  ward: code.optional(),
  ...cursorQuery,
});
export type CorrectionListQuery = z.output<typeof correctionListQuery>;

export const correctionListSchema = pageOf(correctionSchema);
