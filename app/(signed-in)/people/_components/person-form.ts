import { z } from "zod";
import { grants, hasNamedWards, mayHoldGrants, roles } from "@/lib/policy";
import { email, personName } from "@/lib/schemas/sign-in";

const fields = {
  name: personName,
  role: z.enum(roles),
  wards: z.array(z.string()),
  grants: z.array(z.enum(grants)),
};

/** Boxes of a role that isn't chosen any more are hidden, and count as not ticked. */
const withoutHidden = <F extends { role: (typeof roles)[number]; wards: string[]; grants: unknown[] }>(
  form: F,
): F => ({
  ...form,
  wards: hasNamedWards(form.role) ? form.wards : [],
  grants: mayHoldGrants(form.role) ? form.grants : [],
});

export const editForm = z.object(fields).transform(withoutHidden);
export const inviteForm = z.object({ ...fields, email }).transform(withoutHidden);

export type PersonForm = z.input<typeof editForm> & { email?: string };
export const personFields = ["name", "email", "role", "wards", "grants"] as const;
