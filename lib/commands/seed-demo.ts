import { rmSync, writeFileSync } from "node:fs";
import { closeStore, dataFolder, getDb } from "@/db/client";
import { holdFolder } from "@/db/folder-lock";
import { now } from "@/lib/config/clock";
import { databasePath, isDemoFolder, seedMarkPath, seedState } from "@/lib/config/data-folder.mjs";
import { env } from "@/lib/config/env";
import { seedDemo } from "@/lib/demo/seed";
import { getHospitalName } from "@/lib/services/hospital";

const DEMO_HOSPITAL = "Harrowmere District Hospital";

/**
 * Fills the demo's store once; a second run changes nothing. A seed that was cut short begins anew: nobody could
 * sign in before it ended, so nothing that anybody entered is lost.
 */
async function seedOnce(): Promise<void> {
  const folder = dataFolder();
  if (!isDemoFolder(folder)) throw new Error(`${folder} is not the demo's data folder.`);
  const isEmbedded = env().DATABASE_URL === undefined;
  if (isEmbedded && seedState(folder) === "whole") return;
  if (seedState(folder) === "begun") {
    if (!isEmbedded) throw new Error("Filling was cut short. Empty the database, then try again.");
    await clear(folder);
  }

  // On a server the database is looked at first; a folder has to say before it is made that it isn't whole yet.
  if (!isEmbedded && (await isFilled())) return;
  writeFileSync(seedMarkPath(folder), "The demo is being filled.\n");
  console.log("Inventing a hospital with three years of counts. The first time this takes a moment.");
  await seedDemo({ db: await getDb(), now: now() });
  await closeStore();
  rmSync(seedMarkPath(folder));
}

/** On a PostgreSQL server the folder says little: the database itself may hold the demo already, or real data. */
async function isFilled(): Promise<boolean> {
  const name = await getHospitalName({ db: await getDb() });
  if (name !== "" && name !== DEMO_HOSPITAL) throw new Error(`The database already belongs to ${name}.`);
  return name !== "";
}

/** Under the folder's lock, so that no other process has the database open. */
async function clear(folder: string): Promise<void> {
  const lock = await holdFolder(folder);
  rmSync(databasePath(folder), { recursive: true, force: true });
  await lock.release();
}

try {
  await seedOnce();
  process.exit(0);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
}
