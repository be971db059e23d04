import "server-only";
import { cache } from "react";
import { getDb } from "@/db/client";
import { now } from "@/lib/config/clock";
import { anonymousActor, type Actor } from "@/lib/policy";
import { findSessionActor } from "@/lib/services/sessions";
import { sessionIdOfRequest } from "./session-cookie";

/**
 * Who asks, read fresh from the database: whoever was switched off or moved to other wards loses the old access
 * with this very request. One query; remembered only while one page is rendered.
 */
export const currentActor = cache(async (): Promise<Actor> => {
  const sessionId = await sessionIdOfRequest();
  if (sessionId === null) return anonymousActor;
  const actor = await findSessionActor({ db: await getDb(), now: now(), sessionId });
  return actor ?? anonymousActor;
});
