import { READERS_AT_ONCE } from "./upload-limits";

let free = READERS_AT_ONCE;
const waiting: (() => void)[] = [];

/** Runs `job` when one of the few slots is free: each reader may take a quarter of a gigabyte. */
export async function inReadingSlot<Result>(job: () => Promise<Result>): Promise<Result> {
  if (free > 0) free -= 1;
  else await new Promise<void>((resolve) => waiting.push(resolve));
  try {
    return await job();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else free += 1;
  }
}
