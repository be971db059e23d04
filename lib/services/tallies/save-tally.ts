import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { Month } from "@/lib/indicators/month";
import { applyTallyChange, differingFields } from "@/lib/indicators/tally-change";
import type { RevisionSource } from "@/lib/indicators/vocabulary";
import { authorize, requireAction, typesNumerator } from "@/lib/policy";
import type { SaveTally, TallyReply } from "@/lib/schemas/tally";
import { writeAudit } from "@/lib/services/audit";
import { figureWords } from "@/lib/strings/returns";
import { refuseImpossible } from "./figures-check";
import { contentOf, loadLines, siblingsOf, tallyReply, type Line } from "./lines";
import { isStale } from "./moved-fields";
import { lockReturn, wardWithReturn, type ReturnRow } from "./return-row";
import { addRevisions } from "./revisions";
import { writeLine } from "./write-line";

type Input = SaveTally & { ward: string; month: Month; indicator: string; source?: RevisionSource };

/** Saves fields of one line of an open return. Nothing is charted and no signal moves until the return is sent. */
export async function saveTally({ ctx, input }: { ctx: Ctx; input: Input }): Promise<TallyReply> {
  requireAction(ctx.actor, "tally.save");
  return withTransaction(ctx, async (tx) => {
    const { ward, day } = await wardWithReturn(tx, input);
    const wardReturn = await lockReturn(tx, ward, input.month, day);
    const lines = await loadLines(tx.db, { wardId: ward.id, month: input.month });
    const line = findLine(lines, input.indicator);
    const { team, numeratorBy } = line.indicator;
    authorize(tx.actor, "tally.save", { wardId: ward.id, team, numeratorBy });
    refuseUnlessOpen(wardReturn);

    const before = contentOf(line);
    const next = applyTallyChange(before, input, line.shared !== null);
    if (differingFields(before, next).length === 0) return tallyReply(line, day.today);
    if (before.numerator !== next.numerator && !typesNumerator(tx.actor, { team, numeratorBy })) {
      throw new DomainError("forbidden", figureWords.countedByTeam(line.indicator.name, team));
    }
    if (await isStale(tx.db, ward.id, line, next, input)) {
      throw new DomainError("stale", figureWords.changedMeanwhile, { current: tallyReply(line, day.today) });
    }
    const siblings = siblingsOf(line, lines);
    refuseImpossible(line, next, siblings);

    const written = await writeLine(tx, ward.id, line, next);
    const reached = written.denominatorMoved ? siblings.filter((sibling) => sibling.tally !== null) : [];
    const keys = [line, ...reached].map(({ indicator }) => ({
      wardId: ward.id,
      indicatorId: indicator.id,
      month: input.month,
      charted: null,
    }));
    await addRevisions(tx, keys, { event: "saved", source: input.source ?? "form" });
    writeAudit(tx, {
      action: "tally.save",
      subject: { type: "tally", id: `${ward.code}/${line.indicator.code}/${input.month}` },
      before,
      after: contentOf(written.line),
    });
    return tallyReply(written.line, day.today);
  });
}

/** The line of an indicator by its code; not-found where the ward doesn't report it in the month. */
export function findLine(lines: readonly Line[], indicatorCode: string): Line {
  const code = indicatorCode.toUpperCase();
  const line = lines.find((each) => each.indicator.code === code);
  if (!line) throw new DomainError("not-found", "This ward doesn't report that indicator in this month.");
  return line;
}

function refuseUnlessOpen(wardReturn: ReturnRow): void {
  if (wardReturn.status === "open") return;
  throw new DomainError("conflict", figureWords.notOpen[wardReturn.status]);
}
