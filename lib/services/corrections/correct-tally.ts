import "server-only";
import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { corrections, tallyRevisions } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { Month } from "@/lib/indicators/month";
import type { TallyContent } from "@/lib/indicators/tally-change";
import { actorName, authorize, can, requireAction, typesNumerator } from "@/lib/policy";
import type { CorrectionResult, CorrectTally } from "@/lib/schemas/correction";
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
import { correctionWords, figureWords } from "@/lib/strings/returns";
import { applyCorrection, correctedContent } from "./apply-correction";
import { correctionReply, type Correction } from "./queries";

type Input = CorrectTally & { ward: string; month: Month };

/**
 * Corrects a line of a return that was sent, with a reason. Of whoever may decide corrections it holds at once;
 * anybody else's waits for one of them.
 */
export async function correctTally({ ctx, input }: { ctx: Ctx; input: Input }): Promise<CorrectionResult> {
  requireAction(ctx.actor, "tally.correct");
  return withTransaction(ctx, async (tx) => {
    const { ward, day } = await wardWithReturn(tx, input);
    const wardReturn = await lockReturn(tx, ward, input.month, day);
    const lines = await loadLines(tx.db, { wardId: ward.id, month: input.month });
    const line = findLine(lines, input.indicator);
    authorize(tx.actor, "tally.correct", { wardId: ward.id });
    if (wardReturn.status === "open") throw new DomainError("conflict", correctionWords.returnOpen);
    refuseStale(line, input, day.today);

    const next = correctedContent(line, figuresOf(input), siblingsOf(line, lines));
    refuseTeamsNumerator(tx, line, next);
    const holdsAtOnce = can(tx.actor, "correction.decide", { wardId: ward.id });
    const { corrected, row } = holdsAtOnce
      ? await correctAtOnce(tx, { ward, line, lines, next, reason: input.reason })
      : await askForCorrection(tx, { ward, line, next, reason: input.reason });
    return { ...correctionReply(row, ward, line.indicator), tally: tallyReply(corrected, day.today) };
  });
}

/** The figures alone: a correction leaves the note and what is awaited as they are. */
function figuresOf(input: Input) {
  const { numerator, denominator, notCollected } = input;
  return { numerator, denominator, notCollected };
}

function refuseStale(line: Line, input: Input, today: string): void {
  const sawTally = input.version === (line.tally?.version ?? 0);
  const sawShared =
    input.denominatorVersion === undefined || input.denominatorVersion === (line.shared?.value?.version ?? 0);
  if (sawTally && sawShared) return;
  throw new DomainError("stale", figureWords.changedMeanwhile, { current: tallyReply(line, today) });
}

function refuseTeamsNumerator(tx: TxCtx, line: Line, next: TallyContent): void {
  const { team, numeratorBy, name } = line.indicator;
  if (contentOf(line).numerator === next.numerator || typesNumerator(tx.actor, { team, numeratorBy })) return;
  throw new DomainError("forbidden", figureWords.countedByTeam(name, team));
}

interface Change {
  ward: Ward;
  line: Line;
  next: TallyContent;
  reason: string;
}

async function correctAtOnce(tx: TxCtx, change: Change & { lines: readonly Line[] }) {
  const decided = { state: "agreed", decidedBy: actorName(tx.actor), decidedAt: tx.now } as const;
  const row = await insertCorrection(tx, change, decided);
  return { row, corrected: await applyCorrection(tx, change) };
}

async function askForCorrection(tx: TxCtx, change: Change) {
  const { ward, line, next, reason } = change;
  if (next.notCollected !== null) throw needsLead();
  await refuseSecond(tx, change);
  const row = await insertCorrection(tx, change, { state: "waiting" });
  await tx.db.insert(tallyRevisions).values({
    id: uuidv7(),
    wardId: ward.id,
    indicatorId: line.indicator.id,
    month: line.month,
    event: "correction-asked",
    charted: null,
    numerator: next.numerator,
    denominator: next.denominator,
    tallyVersion: line.tally?.version ?? 0,
    source: "form",
    reason,
    actorId: actorIdOf(tx),
    actorName: actorName(tx.actor),
    at: tx.now,
  });
  writeAudit(tx, {
    action: "tally.ask-correction",
    subject: { type: "correction", id: row.id },
    before: contentOf(line),
    after: { ward: ward.code, indicator: line.indicator.code, month: line.month, ...next, reason },
  });
  return { row, corrected: line };
}

function needsLead(): DomainError {
  const message = correctionWords.notCollectedByLead;
  return new DomainError("invalid", message, { errors: [{ path: "notCollected", message }] });
}

/** One correction of a line waits at a time, so that a decision always speaks of the figures that stand. */
async function refuseSecond(tx: TxCtx, { ward, line }: Change): Promise<void> {
  const [waiting] = await tx.db
    .select({ id: corrections.id })
    .from(corrections)
    .where(
      and(
        eq(corrections.wardId, ward.id),
        eq(corrections.indicatorId, line.indicator.id),
        eq(corrections.month, line.month),
        eq(corrections.state, "waiting"),
      ),
    )
    .limit(1);
  if (waiting) throw new DomainError("conflict", correctionWords.waitsAlready);
}

async function insertCorrection(
  tx: TxCtx,
  { ward, line, next, reason }: Change,
  state: Pick<Correction, "state"> & Partial<Pick<Correction, "decidedBy" | "decidedAt">>,
): Promise<Correction> {
  const [row] = await tx.db
    .insert(corrections)
    .values({
      id: uuidv7(),
      wardId: ward.id,
      indicatorId: line.indicator.id,
      month: line.month,
      numerator: next.numerator,
      denominator: next.denominator,
      reason,
      tallyVersion: line.tally?.version ?? 0,
      askedById: actorIdOf(tx),
      askedBy: actorName(tx.actor),
      askedAt: tx.now,
      ...state,
    })
    .returning();
  if (!row) throw new Error("The correction was not written.");
  return row;
}
