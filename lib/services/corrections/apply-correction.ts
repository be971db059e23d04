import "server-only";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { answerOf } from "@/lib/indicators/tally-answer";
import {
  applyTallyChange,
  differingFields,
  type TallyChange,
  type TallyContent,
} from "@/lib/indicators/tally-change";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import {
  chartTallies,
  contentOf,
  refuseImpossible,
  siblingsOf,
  writeLine,
  type Line,
} from "@/lib/services/tallies";
import type { Ward } from "@/lib/services/wards";
import { correctionWords } from "@/lib/strings/returns";

/** The line after a correction; refuses one that changes nothing, leaves a blank, or can't be. */
export function correctedContent(line: Line, change: TallyChange, siblings: readonly Line[]): TallyContent {
  const before = contentOf(line);
  const next = applyTallyChange(before, change, line.shared !== null);
  if (differingFields(before, next).length === 0)
    throw needsFixing("numerator", correctionWords.nothingChanges);
  const answer = answerOf(next);
  if (answer === "blank" || answer === "partial") {
    refuseImpossible(line, next, []);
    throw needsFixing(next.numerator === null ? "numerator" : "denominator", correctionWords.incomplete);
  }
  refuseImpossible(line, next, siblings);
  return next;
}

function needsFixing(path: string, message: string): DomainError {
  return new DomainError("invalid", message, { errors: [{ path, message }] });
}

interface Applied {
  ward: Ward;
  line: Line;
  lines: readonly Line[];
  next: TallyContent;
  reason: string;
}

/**
 * Writes corrected figures and puts them on the charts, with a revision for every line that they reach: a shared
 * denominator is corrected once for all of its lines. The return is locked by the caller.
 */
export async function applyCorrection(
  tx: TxCtx,
  { ward, line, lines, next, reason }: Applied,
): Promise<Line> {
  const before = contentOf(line);
  const written = await writeLine(tx, ward.id, line, next);
  const reached = written.denominatorMoved ? siblingsOf(line, lines).filter(hasChartedFigures) : [];
  const keys = [line, ...reached].map(({ indicator, month }) => ({
    wardId: ward.id,
    indicatorId: indicator.id,
    month,
  }));
  const touched = await chartTallies(tx, { keys, event: "corrected", source: "correction", reason });
  await reevaluateSeries(tx, { pairs: touched, why: "correction" });
  writeAudit(tx, {
    action: "tally.correct",
    subject: { type: "tally", id: `${ward.code}/${line.indicator.code}/${line.month}` },
    before,
    after: { ...contentOf(written.line), reason, alsoReached: reached.map((each) => each.indicator.code) },
  });
  return { ...written.line, tally: written.line.tally && { ...written.line.tally, corrected: true } };
}

/** A sibling that was sent with a figure; one that was not collected has none to correct. */
function hasChartedFigures(sibling: Line): boolean {
  return sibling.tally !== null && sibling.tally.charted && sibling.tally.chartedNotCollected === null;
}
