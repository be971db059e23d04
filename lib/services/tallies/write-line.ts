import "server-only";
import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { denominatorValues, tallies } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import type { TallyContent } from "@/lib/indicators/tally-change";
import { actorName } from "@/lib/policy";
import { contentOf, type Line } from "./lines";

/** What a change of one line wrote, and whether it reaches the lines that share its denominator. */
export interface WrittenLine {
  line: Line;
  denominatorMoved: boolean;
}

/**
 * Writes a line's new content: its own row where that changes, and the shared denominator's where that does. Each
 * has a version of its own, and only the row that is written moves. The return is locked by the caller.
 */
export async function writeLine(
  tx: TxCtx,
  wardId: string,
  line: Line,
  next: TallyContent,
): Promise<WrittenLine> {
  const before = contentOf(line);
  const denominatorMoved =
    line.shared !== null && (before.denominator !== next.denominator || before.awaited !== next.awaited);
  const written = { ...line, tally: await writeTally(tx, wardId, line, next) };
  if (line.shared && denominatorMoved) {
    written.shared = {
      ...line.shared,
      value: await writeDenominator(tx, wardId, line.shared, line.month, next),
    };
  }
  return { line: written, denominatorMoved };
}

async function writeTally(tx: TxCtx, wardId: string, line: Line, next: TallyContent) {
  const isShared = line.shared !== null;
  const values = {
    numerator: next.numerator,
    denominator: isShared ? null : next.denominator,
    notCollected: next.notCollected,
    awaited: isShared ? null : next.awaited,
    note: next.note,
  };
  const stored = line.tally ?? {
    numerator: null,
    denominator: null,
    notCollected: null,
    awaited: null,
    note: null,
  };
  const isSame = (Object.keys(values) as (keyof typeof values)[]).every(
    (field) => values[field] === stored[field],
  );
  if (isSame) return line.tally;
  const saved = { ...values, updatedAt: tx.now, updatedBy: actorName(tx.actor) };
  const [row] = line.tally
    ? await tx.db
        .update(tallies)
        .set({ ...saved, version: line.tally.version + 1 })
        .where(eq(tallies.id, line.tally.id))
        .returning()
    : await tx.db
        .insert(tallies)
        .values({ id: uuidv7(), wardId, indicatorId: line.indicator.id, month: line.month, ...saved })
        .returning();
  if (!row) throw new Error("The tally was not written.");
  return row;
}

async function writeDenominator(
  tx: TxCtx,
  wardId: string,
  shared: NonNullable<Line["shared"]>,
  month: Line["month"],
  next: TallyContent,
) {
  const saved = {
    value: next.denominator,
    awaited: next.awaited,
    updatedAt: tx.now,
    updatedBy: actorName(tx.actor),
  };
  const [row] = shared.value
    ? await tx.db
        .update(denominatorValues)
        .set({ ...saved, version: shared.value.version + 1 })
        .where(eq(denominatorValues.id, shared.value.id))
        .returning()
    : await tx.db
        .insert(denominatorValues)
        .values({ id: uuidv7(), wardId, sharedDenominatorId: shared.id, month, ...saved })
        .returning();
  if (!row) throw new Error("The shared denominator was not written.");
  return row;
}
