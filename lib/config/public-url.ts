import { env } from "./env";

/** Addresses that mean "every network interface" can be listened on but not visited. */
const ANY_ADDRESS = new Set(["0.0.0.0", "::", "[::]"]);

/** The address that people type: as configured, else worked out from HOST and PORT. No slash at its end. */
export function publicUrl(): string {
  const { NEXTAUTH_URL, HOST, PORT } = env();
  if (NEXTAUTH_URL) return NEXTAUTH_URL.replace(/\/+$/, "");
  return `http://${ANY_ADDRESS.has(HOST) ? "localhost" : HOST}:${PORT}`;
}

/** The link of an invitation, shown once to whoever made it. */
export function invitationLink(token: string): string {
  return `${publicUrl()}/invitation/${token}`;
}
