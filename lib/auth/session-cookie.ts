import "server-only";
import { cookies } from "next/headers";
import { decode } from "next-auth/jwt";
import { env } from "@/lib/config/env";

/** The names that next-auth gives its cookie; the prefix binds it to https where Ebbline is reached so. */
function cookieName(): string {
  const isSecure = env().NEXTAUTH_URL?.startsWith("https://") ?? false;
  return `${isSecure ? "__Secure-" : ""}next-auth.session-token`;
}

/** The secret that signs sessions. Without one nobody is signed in: nothing is ever signed with an empty text. */
export function sessionSecret(): string {
  const secret = env().NEXTAUTH_SECRET;
  if (!secret) throw new Error("NEXTAUTH_SECRET is missing. Start Ebbline with npm start, which makes one.");
  return secret;
}

/** The session id in this request's cookie, or null where there is none or it wasn't signed here. */
export async function sessionIdOfRequest(): Promise<string | null> {
  const token = (await cookies()).get(cookieName())?.value;
  if (!token) return null;
  try {
    const payload = await decode({ token, secret: sessionSecret() });
    return typeof payload?.sid === "string" ? payload.sid : null;
  } catch {
    // Signed by another secret, cut short, or made up: the same as no cookie.
    return null;
  }
}
