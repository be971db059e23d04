export const roles = ["ward_nurse", "infection_control", "board_member", "quality_lead"] as const;
export type Role = (typeof roles)[number];

/** Extra power that may be added to any role but a board member's. */
export const grants = ["packs:draft"] as const;
export type Grant = (typeof grants)[number];

/** What a machine token may do; a token never exceeds these, whoever made it. */
export const tokenScopes = ["tallies:write", "read"] as const;
export type TokenScope = (typeof tokenScopes)[number];
