import "server-only";
import NextAuth from "next-auth";
import { NextRequest } from "next/server";
import { uuidv7 } from "uuidv7";
import { authOptions, TOO_MANY_TRIES } from "@/lib/auth";
import { DomainError } from "@/lib/errors";
import { problemResponse } from "./problem";
import { readBytes } from "./read-body";
import { requireSameOrigin } from "./same-origin";

/** What the library may answer; its own pages and its log of whatever a browser sends are shut. */
const OPEN: Record<string, ReadonlySet<string>> = {
  GET: new Set(["csrf", "session", "providers", "signin", "error"]),
  POST: new Set(["callback/credentials", "signout"]),
};
const MAX_BODY = 16 * 1024;

interface AuthContext {
  params: Promise<{ nextauth: string[] }>;
}

/** next-auth behind the same doors as every other route: known actions only, small bodies, no other site. */
export async function authHandler(request: NextRequest, context: AuthContext): Promise<Response> {
  const requestId = uuidv7();
  try {
    const action = (await context.params).nextauth.join("/");
    if (action === "_log") return new Response(null, { status: 204 });
    if (!OPEN[request.method]?.has(action)) throw new DomainError("not-found", "There is no such address.");
    // The library's own token stands against other sites; where the browser says more, that must fit too.
    if (request.headers.has("origin") || request.headers.has("sec-fetch-site")) requireSameOrigin(request);
    const response = (await NextAuth(await bounded(request), context, authOptions())) as Response;
    const answer = slowedDown(response, await errorOf(response)) ?? response;
    answer.headers.set("Cache-Control", "no-store");
    return answer;
  } catch (error) {
    return problemResponse(error, requestId);
  }
}

/** The same request with a body that was counted while it was read. */
async function bounded(request: NextRequest): Promise<NextRequest> {
  if (request.method !== "POST") return request;
  const bytes = await readBytes(request, MAX_BODY);
  return new NextRequest(request.url, {
    method: "POST",
    headers: request.headers,
    body: new Uint8Array(bytes),
  });
}

/** The library says what went wrong in an address: of a redirect, or in JSON for its own client. */
async function errorOf(response: Response): Promise<string | null> {
  const isJson = response.headers.get("content-type")?.startsWith("application/json") ?? false;
  const body: unknown = isJson
    ? await response
        .clone()
        .json()
        .catch(() => null)
    : null;
  const fromBody = body !== null && typeof body === "object" && "url" in body ? String(body.url) : null;
  const address = response.headers.get("location") ?? fromBody;
  return address && URL.canParse(address) ? new URL(address).searchParams.get("error") : null;
}

function slowedDown(response: Response, error: string | null): Response | null {
  if (!error?.startsWith(TOO_MANY_TRIES)) return null;
  const headers = new Headers(response.headers);
  headers.set("Retry-After", error.split("-")[1] ?? "60");
  headers.delete("location");
  return new Response(response.body, { status: 429, headers });
}
