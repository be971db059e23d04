import path from "node:path";
import { isDemoFolder } from "./data-folder.mjs";
import { env } from "./env";

let fixed: Date | null | undefined;

/** The fixed instant that the environment asks for, or null. Throws where the data folder doesn't allow one. */
export function fixedClock(): Date | null {
  const { EBBLINE_CLOCK, EBBLINE_DATA } = env();
  if (EBBLINE_CLOCK === undefined) return null;
  const folder = path.resolve(/* turbopackIgnore: true */ process.cwd(), EBBLINE_DATA);
  if (!isDemoFolder(folder)) {
    throw new Error(`EBBLINE_CLOCK is set, but ${folder} is neither the demo's nor a test's data folder.`);
  }
  return new Date(EBBLINE_CLOCK);
}

/** This instant, for the ctx of a request or command. Verbs read `ctx.now` instead. */
export function now(): Date {
  if (fixed === undefined) fixed = fixedClock();
  return fixed === null ? new Date() : new Date(fixed);
}
