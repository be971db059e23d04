import { uuidv7 } from "uuidv7";
import { closeStore, getDb } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { now } from "@/lib/config/clock";
import { systemActor } from "@/lib/policy";
import { rebuildSeries } from "@/lib/services/series";

/**
 * Works every series out again from its figures and prints what that changed: nothing, after normal use.
 * Run with `tsx --conditions=react-server lib/commands/redetect.ts` while no server holds the data folder.
 */
async function redetect(): Promise<void> {
  const db = await getDb();
  try {
    const ctx: Ctx = { actor: systemActor("re-detection"), db, now: now(), requestId: uuidv7() };
    const found = await rebuildSeries({ ctx });
    const { series, states, born, moved, cameBack, withdrawn } = found;
    console.log(`${series} series worked out again; ${states} stored states differed.`);
    console.log(
      `Signals: ${born} new, ${moved} over other months, ${cameBack} came back, ${withdrawn} withdrawn.`,
    );
  } finally {
    await closeStore();
  }
}

redetect().catch((error: unknown) => {
  // A data folder that a server holds says so here, in one line.
  console.error(error instanceof Error ? error.message : String(error));
  process.exitCode = 1;
});
