import { z } from "zod";
import { baselineStatuses, directions, kinds, limitChoices } from "@/lib/indicators/vocabulary";
import { code, month } from "./common";
import { leftOutSchema } from "./baseline";
import { signalSchema } from "./signal";

export const chartParams = z.object({ ward: code, indicator: code });

const limitMethods = ["three-sigma", "exact", "overdispersed"] as const;
export const groupings = ["month", "quarter"] as const;

/** A date, or an instant with its offset. */
const asOf = z.union([z.iso.date(), z.iso.datetime({ offset: true })], {
  error: "Give a date (2026-03-31) or an instant (2026-03-31T12:00:00Z).",
});

export const chartQuery = z
  .object({
    from: month.optional(),
    to: month.optional(),
    limits: z.enum(limitMethods, { error: `Limits are one of: ${limitMethods.join(", ")}.` }).optional(),
    by: z.enum(groupings, { error: "By month or by quarter." }).default("month"),
    asOf: asOf.optional(),
  })
  .refine(({ from, to }) => from === undefined || to === undefined || to >= from, {
    path: ["to"],
    message: "The last month can't come before the first.",
  });
export type ChartQuery = z.output<typeof chartQuery>;

const fraction = z.number().nullable();
const side = z.enum(["upper", "lower"]);
const states = [
  "counted",
  "open",
  "ripening",
  "awaited",
  "not-collected",
  "nothing-to-count",
  "missing",
] as const;

/** Values and limits are fractions of 1; null where nothing is plotted or no limit exists. */
export const chartPointSchema = z.object({
  /** `YYYY-MM`, or `YYYY-Qn` by quarter. */
  month: z.string(),
  state: z.enum(states),
  numerator: z.number().int().nullable(),
  denominator: z.number().int().nullable(),
  value: fraction,
  z: fraction,
  centre: fraction,
  lowerAction: fraction,
  upperAction: fraction,
  lowerWarning: fraction,
  upperWarning: fraction,
  belowDetection: z.boolean(),
  beyond: side.nullable(),
  pastWarning: side.nullable(),
  leftOut: z.boolean(),
  corrected: z.boolean(),
  late: z.boolean(),
  notes: z.array(z.string()),
  /** By quarter: the counted months in it, and whether that is fewer than three. */
  months: z.array(month).optional(),
  incomplete: z.boolean().optional(),
});
export type ChartPointReply = z.infer<typeof chartPointSchema>;

const baseline = z.object({
  from: month.nullable(),
  to: month.nullable(),
  leftOut: z.array(leftOutSchema),
  status: z.enum(baselineStatuses),
  /** Null for the chart's beginning and for trial limits. */
  appliesFrom: month.nullable(),
  /** Counted months that take part, and the events in them. */
  months: z.number().int(),
  expected: z.number(),
});

const segment = z.object({
  from: month,
  to: month,
  begins: z.enum(["first", "baseline", "definition"]),
  centre: fraction,
  limits: z.enum(limitMethods),
  hasLimits: z.boolean(),
  sigmaZ: z.number().nullable(),
  baseline,
});
export type ChartSegmentReply = z.infer<typeof segment>;

/** Signals found on the chart as drawn; one that isn't on record (another view) has no id. */
const chartSignal = signalSchema.extend({
  id: z.string().nullable(),
  bornAt: z.iso.datetime().nullable(),
  changedAt: z.iso.datetime().nullable(),
});
export type ChartSignalReply = z.infer<typeof chartSignal>;

export const chartSchema = z.object({
  indicator: z.string(),
  ward: z.string(),
  indicatorName: z.string(),
  wardName: z.string(),
  numeratorLabel: z.string(),
  denominatorLabel: z.string(),
  kind: z.enum(kinds),
  per: z.number().int(),
  betterWhen: z.enum(directions),
  target: z.number().nullable(),
  by: z.enum(groupings),
  /** The instant that the chart was known at; null for now. */
  asOf: z.iso.datetime().nullable(),
  /** Of the limits in force, those of the last segment. */
  centre: fraction,
  baseline,
  sigmaZ: z.number().nullable(),
  limits: z.enum(limitMethods).nullable(),
  /** What the indicator is set to; `limits` above is what that came to. */
  limitsChosen: z.enum(limitChoices),
  hasLimits: z.boolean(),
  segments: z.array(segment),
  points: z.array(chartPointSchema),
  signals: z.array(chartSignal),
});
export type ChartReply = z.infer<typeof chartSchema>;
