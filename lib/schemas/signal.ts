import { z } from "zod";
import {
  signalStatuses,
  sides,
  teams,
  towardsValues,
  withdrawnReasons,
  type SignalStatus,
} from "@/lib/indicators/vocabulary";
import { code, cursorQuery, month, pageOf } from "./common";

/** A signal as every list says it. */
export const signalSchema = z.object({
  id: z.string(),
  ward: z.string(),
  indicator: z.string(),
  rule: z.string(),
  from: month,
  to: month,
  side: z.enum(sides),
  towards: z.enum(towardsValues),
  status: z.enum(signalStatuses),
  version: z.number().int(),
  withdrawnWhy: z.enum(withdrawnReasons).nullable(),
  spansGap: z.boolean(),
  /** Born on the newest counted month of its day, or brought to light later. */
  onNewest: z.boolean(),
  bornAt: z.iso.datetime(),
  changedAt: z.iso.datetime(),
});
export type SignalReply = z.infer<typeof signalSchema>;

export const signalPageSchema = pageOf(signalSchema);

const isStatus = (value: string): value is SignalStatus =>
  (signalStatuses as readonly string[]).includes(value);

/** One status, or several with commas between. */
const statusList = z
  .string()
  .transform((list) => list.split(","))
  .pipe(
    z.array(
      z.custom<SignalStatus>((each) => typeof each === "string" && isStatus(each), {
        error: `A status is one of: ${signalStatuses.join(", ")}.`,
      }),
    ),
  );

/** `<born at>_<id>` of the last signal seen; written by the list alone. */
const cursor = z
  .string()
  .regex(
    /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z_[0-9a-f-]{36}$/,
    "The cursor isn't one that this list gave.",
  )
  .transform((text) => ({ bornAt: text.slice(0, 24), id: text.slice(25) }));

export const signalQuery = z.object({
  ...cursorQuery,
  cursor: cursor.optional(),
  status: statusList.optional(),
  team: z.enum(teams, { error: `A team is one of: ${teams.join(", ")}.` }).optional(),
  ward: code.optional(),
  indicator: code.optional(),
});
export type SignalQuery = z.output<typeof signalQuery>;
