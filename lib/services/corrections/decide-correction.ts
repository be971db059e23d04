import "server-only";
import { and, desc, eq, lt, notInArray } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { corrections, tallyRevisions } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { actorName, authorize, requireAction, scopeOf } from "@/lib/policy";
import type { CorrectionReply, CorrectionResult, DecideCorrection } from "@/lib/schemas/correction";
import { writeAudit } from "@/lib/services/audit";
import {
  actorIdOf,
  contentOf,
  findLine,
  loadLines,
  lockReturn,
  siblingsOf,
  tallyReply,
  wardWithReturn,
  type Line,
} from "@/lib/services/tallies";
import type { Ward } from "@/lib/services/wards";
import { correctionWords } from "@/lib/strings/returns";
import { applyCorrection, correctedContent } from "./apply-correction";
import { correctionById, correctionReply, type Correction } from "./queries";

type Input = DecideCorrection & { id: string };

interface Waiting {
  ward: Ward;
  correction: Correction;
  line: Line;
  lines: readonly Line[];
}

/** Agrees to or declines a correction that somebody asked for. */
export async function decideCorrection({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: Input;
}): Promise<CorrectionResult> {
  requireAction(ctx.actor, "correction.decide");
  return withTransaction(ctx, async (tx) => {
    const asked = await correctionById(tx.db, scopeOf(tx.actor), input.id);
    if (!asked) throw notFound();
    // The return is locked before the correction, in the order in which asking for one locks them.
    const { ward, day } = await wardWithReturn(tx, asked);
    const wardReturn = await lockReturn(tx, ward, asked.month, day);
    const correction = await lockCorrection(tx, input.id);
    authorize(tx.actor, "correction.decide", { wardId: ward.id, authorId: correction.askedById });
    refuseUnlessWaiting(correction, asked, input);
    const lines = await loadLines(tx.db, { wardId: ward.id, month: asked.month });
    const waiting = { ward, correction, lines, line: findLine(lines, asked.indicator) };

    if (input.agree && wardReturn.status === "open") {
      throw new DomainError("conflict", correctionWords.returnOpen);
    }
    const line = input.agree
      ? await agree(tx, waiting, day.today)
      : await decline(tx, waiting, input.reason ?? null);
    const [decided] = await tx.db
      .update(corrections)
      .set({
        state: input.agree ? "agreed" : "declined",
        decidedBy: actorName(tx.actor),
        decidedAt: tx.now,
        decisionReason: input.reason ?? null,
        version: correction.version + 1,
      })
      .where(eq(corrections.id, correction.id))
      .returning();
    if (!decided) throw new Error("The locked correction has gone.");
    const after = correctionReply(decided, ward, line.indicator);
    writeAudit(tx, {
      action: "correction.decide",
      subject: { type: "correction", id: correction.id },
      before: correctionReply(correction, ward, line.indicator),
      after,
    });
    return { ...after, tally: tallyReply(line, day.today) };
  });
}

const notFound = () => new DomainError("not-found", "There is no such correction.");

async function lockCorrection(tx: TxCtx, id: string): Promise<Correction> {
  const [row] = await tx.db.select().from(corrections).where(eq(corrections.id, id)).for("update");
  if (!row) throw notFound();
  return row;
}

function refuseUnlessWaiting(correction: Correction, current: CorrectionReply, input: Input): void {
  if (correction.state !== "waiting") throw new DomainError("conflict", correctionWords.decidedAlready);
  if (input.version === undefined || input.version === correction.version) return;
  throw new DomainError("stale", correctionWords.changedMeanwhile, { current });
}

async function agree(tx: TxCtx, { ward, correction, line, lines }: Waiting, today: string): Promise<Line> {
  if (await hasChangedSince(tx, correction, line)) {
    throw new DomainError("stale", correctionWords.lineChanged, { current: tallyReply(line, today) });
  }
  const { numerator, denominator, reason } = correction;
  const next = correctedContent(line, { numerator, denominator }, siblingsOf(line, lines));
  return applyCorrection(tx, { ward, line, lines, next, reason });
}

/**
 * True where the line no longer says what it said when the correction was asked for. Its version doesn't tell of a
 * shared denominator, so the last revision before the asking is compared as well; ids are in order of time.
 */
async function hasChangedSince(tx: TxCtx, correction: Correction, line: Line): Promise<boolean> {
  if ((line.tally?.version ?? 0) !== correction.tallyVersion) return true;
  const [then] = await tx.db
    .select({ numerator: tallyRevisions.numerator, denominator: tallyRevisions.denominator })
    .from(tallyRevisions)
    .where(
      and(
        eq(tallyRevisions.wardId, correction.wardId),
        eq(tallyRevisions.indicatorId, correction.indicatorId),
        eq(tallyRevisions.month, correction.month),
        notInArray(tallyRevisions.event, ["correction-asked", "correction-declined"]),
        lt(tallyRevisions.id, correction.id),
      ),
    )
    .orderBy(desc(tallyRevisions.id))
    .limit(1);
  const now = contentOf(line);
  const denominator = now.notCollected === null ? now.denominator : null;
  return then !== undefined && (then.numerator !== now.numerator || then.denominator !== denominator);
}

async function decline(tx: TxCtx, { ward, correction, line }: Waiting, reason: string | null): Promise<Line> {
  await tx.db.insert(tallyRevisions).values({
    id: uuidv7(),
    wardId: ward.id,
    indicatorId: line.indicator.id,
    month: line.month,
    event: "correction-declined",
    charted: null,
    numerator: correction.numerator,
    denominator: correction.denominator,
    tallyVersion: line.tally?.version ?? 0,
    source: "form",
    reason,
    actorId: actorIdOf(tx),
    actorName: actorName(tx.actor),
    at: tx.now,
  });
  return line;
}
