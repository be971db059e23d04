import { z } from "zod";
import { text } from "./common";
import { holdsEmailName, newPassword, passwordMessages } from "./password";

const EMAIL_MAX = 254;
/** Longer ones are refused before any hashing: nobody types them, and hashing them costs the server. */
export const SIGN_IN_PASSWORD_MAX = 1000;

/** An address, kept and compared in lower case. */
export const email = z
  .string({ error: "Give an email address." })
  .trim()
  .toLowerCase()
  .min(1, "Give an email address.")
  .max(EMAIL_MAX, "That is longer than an email address can be.")
  .pipe(z.email("This doesn't look like an email address."));

export const signInSchema = z.object({
  email,
  password: z
    .string({ error: "Give your password." })
    .min(1, "Give your password.")
    .max(SIGN_IN_PASSWORD_MAX, "That is longer than a password can be."),
});
export type SignInInput = z.output<typeof signInSchema>;

export const invitationToken = z.string().regex(/^[A-Za-z0-9_-]{43}$/, "This link isn't complete.");

export const personName = text(120, "Give a name.");

/** Taking up an invitation; the first quality lead also says who they are. */
export const acceptInvitationSchema = z.object({
  token: invitationToken,
  password: newPassword,
  name: personName.optional(),
  email: email.optional(),
});
export type AcceptInvitationInput = z.output<typeof acceptInvitationSchema>;

/** The form of the same: the password typed twice, checked against the address that it will belong to. */
export const choosePasswordForm = (knownEmail: string | null) =>
  z
    .object({
      email: knownEmail === null ? email : z.string().optional(),
      name: knownEmail === null ? personName : z.string().optional(),
      password: newPassword,
      again: z.string(),
    })
    .superRefine((form, ctx) => {
      if (form.again !== form.password) {
        ctx.addIssue({ code: "custom", path: ["again"], message: "The two passwords differ." });
      }
      if (holdsEmailName(form.password, knownEmail ?? form.email ?? "")) {
        ctx.addIssue({ code: "custom", path: ["password"], message: passwordMessages.holdsEmail });
      }
    });
export type ChoosePassword = z.output<ReturnType<typeof choosePasswordForm>>;
