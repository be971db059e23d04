import "server-only";
import { headers } from "next/headers";
import { forbidden, notFound, redirect } from "next/navigation";
import { uuidv7 } from "uuidv7";
import { getDb } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { now } from "@/lib/config/clock";
import { isDomainError } from "@/lib/errors";
import { currentActor } from "./current-actor";
import { PATH_HEADER } from "./path-header";
import { safePath } from "./safe-path";

async function goToSignIn(): Promise<never> {
  const path = safePath((await headers()).get(PATH_HEADER));
  redirect(path === "/" ? "/sign-in" : `/sign-in?from=${encodeURIComponent(path)}`);
}

/** The ctx of a page that needs somebody signed in; sends everybody else to the sign-in page. */
export async function pageCtx(): Promise<Ctx> {
  const actor = await currentActor();
  if (actor.kind === "anonymous") return goToSignIn();
  return { actor, db: await getDb(), now: now(), requestId: uuidv7() };
}

/** The ctx of a page that anybody may open. */
export async function publicPageCtx(): Promise<Ctx> {
  return { actor: await currentActor(), db: await getDb(), now: now(), requestId: uuidv7() };
}

/** Turns what a read refused into the page that says so, with its status. */
export async function forPage<Result>(work: Promise<Result>): Promise<Result> {
  try {
    return await work;
  } catch (error) {
    if (isDomainError(error, "not-found")) notFound();
    if (isDomainError(error, "forbidden")) forbidden();
    if (isDomainError(error, "unauthenticated")) return goToSignIn();
    throw error;
  }
}
