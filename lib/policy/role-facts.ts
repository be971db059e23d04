import type { Role } from "./roles";

/** The role that can set everything up; one active person at least always has it. */
export const LEAD_ROLE: Role = "quality_lead";

/** True where wards are named for each person; the other roles see all of them, or none. */
export function hasNamedWards(role: Role): boolean {
  return role === "ward_nurse";
}

/** True where a person may be given powers beyond the role's own. */
export function mayHoldGrants(role: Role): boolean {
  return role !== "board_member";
}
