import { z } from "zod";
import { baselineStates, baselineStatuses } from "@/lib/indicators/vocabulary";
import { code, id, month, optionalText, pageOf, reason, text, version } from "./common";

const limitMethods = ["three-sigma", "exact", "overdispersed"] as const;

export const leftOutSchema = z.object({ month, reason: text(300, "Give the cause that was found.") });

interface Months {
  from: string;
  to: string;
  appliesFrom: string | null;
  leftOut: readonly { month: string }[];
}

function checkMonths(months: Months, issues: z.core.$RefinementCtx): void {
  const { from, to, appliesFrom, leftOut } = months;
  const problem = (path: (string | number)[], message: string) =>
    issues.addIssue({ code: "custom", path, message });
  if (to < from) problem(["to"], "The last month can't come before the first.");
  if (appliesFrom !== null && appliesFrom > from) {
    problem(
      ["appliesFrom"],
      "A new baseline is worked out from its own months: it holds from the first one or earlier.",
    );
  }
  leftOut.forEach((each, index) => {
    const path = ["leftOut", index, "month"];
    if (each.month < from || each.month > to)
      problem(path, "A month left out lies between the first and the last.");
    if (leftOut.findIndex((other) => other.month === each.month) < index)
      problem(path, "This month is named twice.");
  });
}

const appliesFrom = month.nullable().default(null);

export const setBaselineSchema = z
  .object({
    from: month,
    to: month,
    leftOut: z.array(leftOutSchema, { error: "Give a list of months with reasons." }).max(240).default([]),
    appliesFrom,
    reason,
    /** Of the baseline that it would replace; 0 where there is none. */
    version: version.optional(),
  })
  .superRefine(checkMonths);
export type SetBaseline = z.output<typeof setBaselineSchema>;

export const decideBaselineSchema = z.object({
  id,
  agree: z.boolean({ error: "Say whether you agree." }),
  reason: optionalText(500).default(null),
  version,
});
export type DecideBaseline = z.output<typeof decideBaselineSchema>;

/** Months left out come as a comma-separated list. */
export const previewBaselineQuery = z
  .object({
    from: month,
    to: month,
    appliesFrom: month.optional(),
    leftOut: z
      .string()
      .max(2_000)
      .transform((list) => list.split(",").filter((each) => each !== ""))
      .pipe(z.array(month))
      .optional(),
  })
  .transform((query) => ({
    from: query.from,
    to: query.to,
    appliesFrom: query.appliesFrom ?? null,
    leftOut: (query.leftOut ?? []).map((each) => ({ month: each, reason: "" })),
  }))
  .superRefine(checkMonths);
export type PreviewBaseline = z.output<typeof previewBaselineQuery>;

export const baselineParams = z.object({ ward: code, indicator: code });

export const baselineSchema = z.object({
  id: z.string(),
  ward: z.string(),
  indicator: z.string(),
  from: month,
  to: month,
  leftOut: z.array(z.object({ month, reason: z.string() })),
  appliesFrom: month.nullable(),
  state: z.enum(baselineStates),
  limits: z.enum(limitMethods),
  /** At today's figures: total numerators over total denominators; null with nothing counted. */
  centre: z.number().nullable(),
  /** Counted months, left-out ones not among them. */
  months: z.number().int(),
  reason: z.string(),
  proposedBy: z.string(),
  proposedAt: z.iso.datetime(),
  decidedBy: z.string().nullable(),
  decidedAt: z.iso.datetime().nullable(),
  decisionReason: z.string().nullable(),
  supersededAt: z.iso.datetime().nullable(),
  version: z.number().int(),
});
export type BaselineReply = z.infer<typeof baselineSchema>;

export const baselineListSchema = pageOf(baselineSchema);

const side = z.enum(["upper", "lower"]);
const foundSignal = z.object({ rule: z.string(), side, from: month, to: month });
const limitsReply = z.object({
  centre: z.number().nullable(),
  limits: z.enum(limitMethods).nullable(),
  status: z.enum(baselineStatuses),
  months: z.number().int(),
});

export const previewBaselineSchema = z.object({
  before: limitsReply,
  after: limitsReply,
  signals: z.object({
    come: z.array(foundSignal),
    go: z.array(foundSignal),
    /** The same signals over other months. */
    change: z.array(foundSignal),
  }),
});
export type PreviewReply = z.infer<typeof previewBaselineSchema>;
