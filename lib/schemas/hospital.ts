import { z } from "zod";
import { text, version } from "./common";

export const DEFAULT_DUE_DAY = 8;
const MAX_HOLIDAYS = 500;

function isTimeZone(name: string): boolean {
  try {
    // Offsets such as "+01:00" are taken by Intl too, but know no summer time.
    new Intl.DateTimeFormat("en", { timeZone: name });
    return /^[A-Za-z]/.test(name);
  } catch {
    return false;
  }
}

/** A date that exists: 30 February parses in many ways, but not back to itself. */
function isCalendarDate(value: string): boolean {
  const instant = new Date(`${value}T00:00:00Z`);
  return !Number.isNaN(instant.valueOf()) && instant.toISOString().startsWith(value);
}

const hospitalName = text(120, "Give the hospital's name.");
const timeZone = z
  .string({ error: "Give a time zone." })
  .max(60)
  .refine(isTimeZone, "Give a time zone by its IANA name, such as Europe/Lisbon.");
const dueDay = z
  .number({ error: "Give a day of the month." })
  .int("Give a whole day.")
  .min(1, "From the 1st on.")
  .max(28, "Up to the 28th, which every month has.");
const holidays = z
  .array(
    z
      .string()
      .regex(/^\d{4}-\d{2}-\d{2}$/, "Give dates as YYYY-MM-DD.")
      .refine(isCalendarDate, "There is no such date."),
  )
  .max(MAX_HOLIDAYS, `At most ${MAX_HOLIDAYS} holidays.`)
  .transform((dates) => [...new Set(dates)].sort());

export const setUpHospitalSchema = z.object({
  name: hospitalName,
  timeZone,
  dueDay: dueDay.default(DEFAULT_DUE_DAY),
  holidays: holidays.default([]),
});
export type SetUpHospitalInput = z.input<typeof setUpHospitalSchema>;

export const updateHospitalSchema = z.object({
  name: hospitalName.optional(),
  timeZone: timeZone.optional(),
  dueDay: dueDay.optional(),
  holidays: holidays.optional(),
  version,
});
export type UpdateHospitalInput = z.output<typeof updateHospitalSchema>;

export const hospitalSchema = z.object({
  name: z.string(),
  timeZone: z.string(),
  dueDay: z.number(),
  holidays: z.array(z.string()),
  version: z.number(),
});
export type HospitalRecord = z.output<typeof hospitalSchema>;
