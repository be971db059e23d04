import { NextResponse, type NextRequest } from "next/server";
import { PATH_HEADER } from "@/lib/auth/path-header";
import { env } from "@/lib/config/env";
import { contentPolicy } from "@/lib/http/content-policy";

/** Gives every page its content policy and says which path was asked for. It decides nothing about access. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = contentPolicy(nonce, env().NODE_ENV === "development");

  // The framework reads the policy from the request and puts the nonce on its own scripts.
  const headers = new Headers(request.headers);
  headers.set("Content-Security-Policy", policy);
  headers.set("x-nonce", nonce);
  headers.set(PATH_HEADER, `${request.nextUrl.pathname}${request.nextUrl.search}`);

  const response = NextResponse.next({ request: { headers } });
  response.headers.set("Content-Security-Policy", policy);
  response.headers.set("Cache-Control", "no-store");
  return response;
}

export const config = {
  // Pages alone. The API has no documents, and a body that passes here is cut at 10 MB: uploads must not.
  matcher: ["/((?!api/|_next/|[a-z-]+\\.svg$).*)"],
};
