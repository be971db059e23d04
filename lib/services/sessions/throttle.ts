import "server-only";
import { createHash } from "node:crypto";
import { eq, lt } from "drizzle-orm";
import type { Db } from "@/db/client";
import { signInThrottle } from "@/db/schema";
import { withBookkeeping, type Ctx } from "@/db/transaction";
import { countFailure, freeTries, secondsBlocked, takeBack } from "./throttle-rule";

const DAY = 24 * 60 * 60 * 1000;

export interface TryKeys {
  email: string;
  /** Network address of whoever tries, where it is known for certain. */
  address: string | null;
}

interface Counter {
  key: string;
  free: number;
}

/** Hashed, because people also type other things than addresses into that field. */
function countersOf({ email, address }: TryKeys): Counter[] {
  const keyOf = (kind: string, value: string) =>
    `${kind}:${createHash("sha256").update(value).digest("hex")}`;
  const counters = [{ key: keyOf("email", email), free: freeTries.email as number }];
  if (address !== null) counters.push({ key: keyOf("address", address), free: freeTries.address });
  // One order for everybody, so that two tries never wait for each other.
  return counters.sort((a, b) => (a.key < b.key ? -1 : 1));
}

async function lockCounter(db: Db, key: string, now: Date) {
  await db.insert(signInThrottle).values({ key, failures: 0, windowStartedAt: now }).onConflictDoNothing();
  const [row] = await db.select().from(signInThrottle).where(eq(signInThrottle.key, key)).for("update");
  if (!row) throw new Error("A counter of tries vanished while it was locked.");
  return row;
}

/**
 * Counts a try as failed before its password is looked at, so that many at once can't outrun the count. Gives the
 * seconds to wait where the try isn't taken at all.
 */
export async function countTry({ ctx, keys }: { ctx: Ctx; keys: TryKeys }): Promise<number> {
  return withBookkeeping(ctx, async ({ db, now }) => {
    const counters = countersOf(keys);
    const rows = [];
    for (const counter of counters) rows.push({ ...counter, row: await lockCounter(db, counter.key, now) });
    const wait = Math.max(...rows.map(({ row }) => secondsBlocked(row, now)));
    if (wait > 0) return wait;

    for (const { key, free, row } of rows) {
      await db
        .update(signInThrottle)
        .set(countFailure(row, now, free))
        .where(eq(signInThrottle.key, key));
    }
    await db.delete(signInThrottle).where(lt(signInThrottle.windowStartedAt, new Date(now.valueOf() - DAY)));
    return 0;
  });
}

/** After a sign-in: the account's failures are forgotten, the address loses only the try that was right. */
export async function forgetTries({ ctx, keys }: { ctx: Ctx; keys: TryKeys }): Promise<void> {
  await withBookkeeping(ctx, async ({ db, now }) => {
    for (const { key, free } of countersOf(keys)) {
      const row = await lockCounter(db, key, now);
      const cleared = { failures: 0, windowStartedAt: now, blockedUntil: null };
      const next = key.startsWith("email:") ? cleared : takeBack(row, free);
      await db.update(signInThrottle).set(next).where(eq(signInThrottle.key, key));
    }
  });
}
