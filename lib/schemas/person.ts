import { z } from "zod";
import { grants, roles } from "@/lib/policy";
import { code, id, version } from "./common";
import { email, personName } from "./sign-in";

const MAX_WARDS = 200;

const role = z.enum(roles, { error: "Choose a role." });
const wardCodes = z.array(code).max(MAX_WARDS, `At most ${MAX_WARDS} wards.`);
const grantList = z.array(z.enum(grants)).max(grants.length);

export const invitePersonSchema = z.object({
  email,
  name: personName,
  role,
  wards: wardCodes.default([]),
  grants: grantList.default([]),
});
export type InvitePersonInput = z.output<typeof invitePersonSchema>;

/** A field that is left out keeps its value. */
export const updatePersonSchema = z.object({
  name: personName.optional(),
  role: role.optional(),
  wards: wardCodes.optional(),
  grants: grantList.optional(),
  state: z.enum(["active", "off"], { error: "A person is switched on (active) or off." }).optional(),
  version,
});
export type UpdatePersonInput = z.output<typeof updatePersonSchema>;

export const personParams = z.object({ id });

export const personSchema = z.object({
  id: z.string(),
  email: z.string(),
  name: z.string(),
  role,
  grants: z.array(z.enum(grants)),
  wards: z.array(z.string()),
  state: z.enum(["invited", "active", "off"]),
  version: z.number(),
  /** Instant of the last sign-in, null before the first. */
  lastSignedInAt: z.string().nullable(),
});
export type PersonRecord = z.output<typeof personSchema>;

export const invitationSchema = z.object({ link: z.string(), expiresAt: z.string() });
export const invitedPersonSchema = personSchema.extend({ invitation: invitationSchema });

export const meSchema = z.object({
  email: z.string(),
  name: z.string(),
  role,
  wards: z.array(z.string()),
});
export type Me = z.output<typeof meSchema>;
