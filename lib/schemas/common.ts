import { z } from "zod";
import { isMonth, type Month } from "@/lib/indicators/month";

// Where a schema has no words of its own, the library's would speak to programmers.
z.config({
  customError: (issue) =>
    issue.code === "invalid_type"
      ? "Something is missing here, or of the wrong kind."
      : "This can't be taken as it is.",
});

/** Largest count that can be entered; far above any hospital's, far below where numbers lose exactness. */
export const MAX_COUNT = 1_000_000_000;

/** A whole number of 0 or more, or null for "not entered". Never coerced: blank is not zero. */
export const count = z
  .number({ error: "Give a whole number, or leave it blank." })
  .int("Give a whole number.")
  .min(0, "A count can't be below zero.")
  .max(MAX_COUNT, "That is more than can be counted here.")
  .nullable();

export const month = z
  .custom<Month>((value) => typeof value === "string" && isMonth(value), {
    error: "Give a month as YYYY-MM.",
  })
  .meta({ type: "string", pattern: "^(19|20|21)\\d{2}-(0[1-9]|1[0-2])$", description: "A month, YYYY-MM" });

/** Codes of wards and indicators are compared without case and kept in capitals. */
export const code = z
  .string({ error: "Give a code." })
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9-]{1,16}$/, "A code has 1 to 16 capital letters, digits or hyphens.");

/** A code that may be given to something new. */
export const newCode = code.refine(
  (value) => value !== "HOSPITAL",
  "HOSPITAL is kept for the whole-hospital charts.",
);

// Control characters other than tab and line ends, halves of characters, and marks that turn the direction of
// writing: nobody types them, the database refuses or alters some, and others make a text read as what it isn't.
const CONTROL = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F\u202A-\u202E\u2066-\u2069]|\p{Surrogate}/u;

/** Trimmed text without control characters, at least one character. */
export const text = (max: number, missing = "Fill this in.") =>
  z
    .string({ error: missing })
    .trim()
    .min(1, missing)
    .max(max, `At most ${max} characters.`)
    .refine((value) => !CONTROL.test(value), "There are characters here that can't be kept.");

/** Text that may be left empty; empty becomes null. */
export const optionalText = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `At most ${max} characters.`)
    .refine((value) => !CONTROL.test(value), "There are characters here that can't be kept.")
    .nullable()
    .transform((value) => (value === "" ? null : value));

export const reason = text(500, "Give a reason.");

/** The version that a change was based on. */
export const version = z.number({ error: "Give the version that you saw." }).int().min(0).max(2_147_483_647);

export const id = z.uuid();

/** Paging: opaque cursor and page size. */
export const cursorQuery = {
  cursor: z.string().max(200).optional(),
  limit: z
    .string()
    .regex(/^\d{1,3}$/, "A limit is a number up to 500.")
    .transform(Number)
    .pipe(z.number().min(1).max(500))
    .optional(),
};

export const pageOf = <S extends z.ZodType>(item: S) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });
