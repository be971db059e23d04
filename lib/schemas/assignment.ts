import { z } from "zod";
import { code, month, pageOf, version } from "./common";

export const assignmentSchema = z.object({
  ward: z.string(),
  indicator: z.string(),
  from: month,
  to: month.nullable(),
  version: z.number().int(),
});
export type AssignmentReply = z.infer<typeof assignmentSchema>;

export const assignmentListSchema = pageOf(assignmentSchema);

export const setAssignmentSchema = z
  .object({ from: month, to: month.nullable().default(null), version: version.optional() })
  .refine((months) => months.to === null || months.to >= months.from, {
    path: ["to"],
    message: "The last month can't come before the first.",
  });
export type SetAssignment = z.output<typeof setAssignmentSchema>;

export const assignmentParams = z.object({ ward: code, indicator: code });

export const assignmentQuery = z.object({ ward: code.optional(), indicator: code.optional() });
