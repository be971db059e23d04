import { uuidv7 } from "uuidv7";
import type { Db } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { addMonths, monthInZone, type Month } from "@/lib/indicators/month";
import type { Actor } from "@/lib/policy";
import { timeZone } from "./hospital";

/** Where and when the story plays: months counted back from the last one, and instants that are never to come. */
export interface Stage {
  /** The month that lies so far back; 0 is the last full month. */
  month: (back: number) => Month;
  /** An instant in the month after the given one: its day (from 1) and hour, at the latest now. */
  after: (back: number, day: number, hour: number) => Date;
  /** A ctx for somebody at an instant. */
  ctx: (actor: Actor, at: Date) => Ctx;
}

export function makeStage(db: Db, now: Date): Stage {
  const last = addMonths(monthInZone(now, timeZone), -1);
  const month = (back: number) => addMonths(last, -back);
  return {
    month,
    after: (back, day, hour) => {
      const [year = 0, number = 1] = month(back - 1)
        .split("-")
        .map(Number);
      const wished = new Date(Date.UTC(year, number - 1, day, hour));
      return wished < now ? wished : squeezed(wished, new Date(Date.UTC(year, number - 1, 1)), now);
    },
    ctx: (actor, at) => ({ actor, db, now: at, requestId: uuidv7() }),
  };
}

const WEEK = 7 * 24 * 3_600_000;

/** Early in a month, what would happen in its first week is squeezed in between its start and now, in its order. */
function squeezed(wished: Date, start: Date, now: Date): Date {
  const share = Math.min(1, (wished.getTime() - start.getTime()) / (2 * WEEK));
  const room = Math.max(0, now.getTime() - start.getTime());
  return new Date(Math.min(now.getTime(), start.getTime() + share * room));
}
