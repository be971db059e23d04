import { z } from "zod";
import type { Month } from "@/lib/indicators/month";
import { code, month, newCode, pageOf, text, version } from "./common";

const name = text(80, "Give the ward a name.");
const division = text(80, "Give the division that the ward belongs to.");

const CLOSES_FIRST = "The last month can't come before the first.";

/** True where a ward closes before it opens. */
export function closesBeforeOpening(open: { openFrom?: Month; openTo?: Month | null }): boolean {
  return open.openFrom !== undefined && !!open.openTo && open.openTo < open.openFrom;
}

export const wardSchema = z.object({
  code: z.string(),
  name: z.string(),
  division: z.string(),
  openFrom: month,
  openTo: month.nullable(),
  version: z.number().int(),
});
export type WardReply = z.infer<typeof wardSchema>;

export const wardListSchema = pageOf(wardSchema);

export const createWardSchema = z
  .object({ code: newCode, name, division, openFrom: month, openTo: month.nullable().default(null) })
  .refine((ward) => !closesBeforeOpening(ward), { path: ["openTo"], message: CLOSES_FIRST });
export type CreateWard = z.infer<typeof createWardSchema>;

export const updateWardSchema = z
  .object({
    name: name.optional(),
    division: division.optional(),
    openFrom: month.optional(),
    openTo: month.nullable().optional(),
    /** Of the ward that was seen; without one the change holds for the ward as it stands. */
    version: version.optional(),
  })
  .refine((ward) => !closesBeforeOpening(ward), { path: ["openTo"], message: CLOSES_FIRST });
export type UpdateWard = z.infer<typeof updateWardSchema>;

export const wardParams = z.object({ code });
