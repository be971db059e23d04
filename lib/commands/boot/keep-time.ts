import "server-only";
import { Cron } from "croner";
import { uuidv7 } from "uuidv7";
import type { Db } from "@/db/client";
import { now } from "@/lib/config/clock";
import { systemActor } from "@/lib/policy";
import { ripenSeries } from "@/lib/services/series";

/** Every hour, and once at the start. */
const SCHEDULE = "7 * * * *";

/**
 * What happens because time passes: months whose outcome has had its time join their charts. Two processes on one
 * server may both try; the second finds nothing left to do.
 */
export function keepTime(db: Db): void {
  const work = async () => {
    await ripenSeries({ ctx: { actor: systemActor("schedule"), db, now: now(), requestId: uuidv7() } });
  };
  const job = new Cron(SCHEDULE, { protect: true, unref: true, catch: report }, work);
  void job.trigger();
}

/** A failure here must not end the server: the next hour tries again. */
function report(error: unknown): void {
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error);
  console.error(JSON.stringify({ event: "schedule.failed", error: text }));
}
