import { z } from "zod";
import { isCommonPassword } from "./common-passwords";

export const PASSWORD_MIN = 12;
export const PASSWORD_MAX = 200;
/** A shorter beginning of an address would turn up in passwords by accident. */
const LOCAL_PART_MIN = 3;

export const passwordMessages = {
  missing: "Choose a password.",
  tooShort: `At least ${PASSWORD_MIN} characters. A short sentence is easy to remember.`,
  tooLong: `At most ${PASSWORD_MAX} characters.`,
  common: "This password is among the first that others would guess. Choose one of your own.",
  holdsEmail: "Leave your email name out of the password.",
} as const;

/** Characters as people count them, not UTF-16 units. */
function lengthOf(password: string): number {
  return [...password].length;
}

/** A new password: long enough and not guessed first. What it is made of is nobody's business. */
export const newPassword = z
  .string({ error: passwordMessages.missing })
  .refine((value) => lengthOf(value) >= PASSWORD_MIN, passwordMessages.tooShort)
  .refine((value) => value.length <= PASSWORD_MAX, passwordMessages.tooLong)
  .refine((value) => !isCommonPassword(value), passwordMessages.common);

/** True where the password holds the part of the address before the @. */
export function holdsEmailName(password: string, email: string): boolean {
  const name = email.split("@")[0] ?? "";
  return name.length >= LOCAL_PART_MIN && password.toLowerCase().includes(name.toLowerCase());
}
