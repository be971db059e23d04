import "server-only";
import type { NextAuthOptions, User } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { uuidv7 } from "uuidv7";
import { getDb } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { now } from "@/lib/config/clock";
import { isDomainError } from "@/lib/errors";
import { anonymousActor } from "@/lib/policy";
import { ABSOLUTE_LIMIT, endSession, findSessionActor, startSession } from "@/lib/services/sessions";
import { networkAddress } from "./network-address";
import { safePath } from "./safe-path";
import { sessionSecret } from "./session-cookie";

declare module "next-auth" {
  interface User {
    sessionId?: string;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    /** Id of the session's row: all that the cookie holds. */
    sid?: string;
  }
}

/** Codes in the address of a refused sign-in; the page words them. */
export const TOO_MANY_TRIES = "TooManyTries";
export const UNEXPECTED = "Unexpected";

async function anonymousCtx(): Promise<Ctx> {
  return { actor: anonymousActor, db: await getDb(), now: now(), requestId: uuidv7() };
}

type Headers = Record<string, string | undefined>;

async function signIn(typed: Record<string, unknown> | undefined, headers: Headers): Promise<User | null> {
  try {
    const input = { email: typed?.email, password: typed?.password, address: networkAddress(headers) };
    const started = await startSession({ ctx: await anonymousCtx(), input });
    return { id: started.personId, sessionId: started.sessionId };
  } catch (error) {
    if (isDomainError(error, "unauthenticated")) return null;
    if (isDomainError(error, "rate-limited")) throw new Error(`${TOO_MANY_TRIES}-${error.retryAfter ?? 60}`);
    console.error(
      JSON.stringify({ event: "sign-in.failed", error: error instanceof Error ? error.stack : "" }),
    );
    // The library shows the message in an address.
    throw new Error(UNEXPECTED);
  }
}

async function signOut(sessionId: string | undefined): Promise<void> {
  const ctx = await anonymousCtx();
  const actor = await findSessionActor({ db: ctx.db, now: ctx.now, sessionId: sessionId ?? "" });
  if (actor) await endSession({ ctx: { ...ctx, actor } });
}

/** For the library's own session route: name and address of whoever the row says, or nothing. */
async function describeSession(sessionId: string | undefined) {
  const { db, now: at } = await anonymousCtx();
  const actor = await findSessionActor({ db, now: at, sessionId: sessionId ?? "" });
  if (!actor) throw new Error("The session has ended.");
  return { name: actor.name, email: actor.email };
}

export function authOptions(): NextAuthOptions {
  return {
    secret: sessionSecret(),
    session: { strategy: "jwt", maxAge: ABSOLUTE_LIMIT / 1000 },
    pages: { signIn: "/sign-in", error: "/sign-in", signOut: "/sign-in" },
    providers: [
      CredentialsProvider({
        credentials: { email: { type: "email" }, password: { type: "password" } },
        authorize: (typed, request) => signIn(typed, (request.headers ?? {}) as Headers),
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => ({ sid: user?.sessionId ?? token.sid }),
      session: async ({ session, token }) => ({ ...session, user: await describeSession(token.sid) }),
      redirect: ({ url, baseUrl }) => {
        const path = url.startsWith(`${baseUrl}/`) ? url.slice(baseUrl.length) : url;
        return `${baseUrl}${safePath(path)}`;
      },
    },
    events: { signOut: ({ token }) => signOut(token.sid) },
    logger: {
      // Cookies of ended sessions are everyday; anything else is worth a line, without what was sent.
      error: (code) => {
        if (code !== "JWT_SESSION_ERROR") console.error(JSON.stringify({ event: "sign-in.library", code }));
      },
      warn: () => undefined,
      debug: () => undefined,
    },
  };
}
