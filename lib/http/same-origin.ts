import { env } from "@/lib/config/env";
import { DomainError } from "@/lib/errors";

const SAFE_METHODS = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Refuses a change that another site may have set off with somebody's cookie. Every signal that the browser sent
 * must say "same origin", and there must be one.
 */
export function requireSameOrigin(request: Request): void {
  if (SAFE_METHODS.has(request.method)) return;
  const site = request.headers.get("sec-fetch-site");
  const origin = request.headers.get("origin");
  const siteFits = site === null || site === "same-origin";
  const originFits = origin === null || allowedOrigins(request).has(origin);
  const saysSomething = site !== null || origin !== null;
  if (!siteFits || !originFits || !saysSomething) {
    throw new DomainError("forbidden", "Changes are taken from Ebbline's own pages only.");
  }
}

/** The configured address, and the one that the browser itself addressed (a page can't forge its Host header). */
function allowedOrigins(request: Request): Set<string> {
  const origins = new Set<string>();
  const { NEXTAUTH_URL } = env();
  if (NEXTAUTH_URL) origins.add(new URL(NEXTAUTH_URL).origin);
  const host = request.headers.get("host");
  if (host) origins.add(`${new URL(NEXTAUTH_URL ?? "http://localhost").protocol}//${host}`);
  return origins;
}
