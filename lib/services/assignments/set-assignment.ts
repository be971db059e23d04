import "server-only";
import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { assignments } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError, type FieldError } from "@/lib/errors";
import { longMonth } from "@/lib/indicators/chart-format";
import { authorize, requireAction } from "@/lib/policy";
import type { AssignmentReply, SetAssignment } from "@/lib/schemas/assignment";
import { writeAudit } from "@/lib/services/audit";
import { getIndicatorByCode } from "@/lib/services/indicators";
import { reevaluateSeries } from "@/lib/services/series";
import { lockWard, refuseHidingSent, sentMonthsOutside, type Ward } from "@/lib/services/wards";
import type { Assignment } from "./queries";

type Input = SetAssignment & { ward: string; indicator: string };

/** Says from which month to which a ward reports an indicator. Saying the same again changes nothing. */
export async function setAssignment({ ctx, input }: { ctx: Ctx; input: Input }): Promise<AssignmentReply> {
  requireAction(ctx.actor, "assignment.set");
  return withTransaction(ctx, async (tx) => {
    const ward = await lockWard(tx, input.ward);
    const indicator = await getIndicatorByCode({ ctx: tx, code: input.indicator });
    authorize(tx.actor, "assignment.set", { wardId: ward.id });

    const codes = { ward: ward.code, indicator: indicator.code };
    const pair = { wardId: ward.id, indicatorId: indicator.id };
    const before = await lockAssignment(tx, pair);
    refuseStale(input.version, before, codes);
    refuseClosedMonths(ward, input);
    if (before) {
      refuseHidingSent(await sentMonthsOutside(tx.db, pair, input), input.from);
      if (before.fromMonth === input.from && before.toMonth === input.to)
        return assignmentReply(before, codes);
    }

    const after = await write(tx, before, pair, input);
    // The end decides how far a chart is drawn where months are missing.
    if (before) await reevaluateSeries(tx, { pairs: [pair], why: "definition" });
    writeAudit(tx, {
      action: "assignment.set",
      subject: { type: "assignment", id: after.id },
      before: before && assignmentReply(before, codes),
      after: assignmentReply(after, codes),
    });
    return assignmentReply(after, codes);
  });
}

interface Pair {
  wardId: string;
  indicatorId: string;
}

interface Codes {
  ward: string;
  indicator: string;
}

/** The ward is locked, so that two first assignments of one pair come one after the other. */
async function lockAssignment(tx: TxCtx, { wardId, indicatorId }: Pair): Promise<Assignment | undefined> {
  const [row] = await tx.db
    .select()
    .from(assignments)
    .where(and(eq(assignments.wardId, wardId), eq(assignments.indicatorId, indicatorId)))
    .for("update");
  return row;
}

async function write(
  tx: TxCtx,
  before: Assignment | undefined,
  pair: Pair,
  { from, to }: SetAssignment,
): Promise<Assignment> {
  const [row] = before
    ? await tx.db
        .update(assignments)
        .set({ fromMonth: from, toMonth: to, version: before.version + 1 })
        .where(eq(assignments.id, before.id))
        .returning()
    : await tx.db
        .insert(assignments)
        .values({ id: uuidv7(), ...pair, fromMonth: from, toMonth: to })
        .returning();
  if (!row) throw new Error("No assignment was written.");
  return row;
}

/** Version 0 says that there was none yet. Whoever sends no version takes the present one as it is. */
function refuseStale(version: number | undefined, before: Assignment | undefined, codes: Codes): void {
  if (version === undefined || version === (before?.version ?? 0)) return;
  const current = before ? assignmentReply(before, codes) : null;
  throw new DomainError("stale", "Somebody changed this assignment meanwhile.", { current });
}

function refuseClosedMonths(ward: Ward, { from, to }: SetAssignment): void {
  const errors: FieldError[] = [];
  if (from < ward.openFrom)
    errors.push({ path: "from", message: `${ward.name} opens in ${longMonth(ward.openFrom)}.` });
  if (ward.openTo !== null && from > ward.openTo) {
    errors.push({ path: "from", message: `${ward.name} closes in ${longMonth(ward.openTo)}.` });
  } else if (ward.openTo !== null && to !== null && to > ward.openTo) {
    errors.push({ path: "to", message: `${ward.name} closes in ${longMonth(ward.openTo)}.` });
  }
  const [first] = errors;
  if (first) throw new DomainError("invalid", first.message, { errors });
}

export function assignmentReply(row: Assignment, codes: Codes): AssignmentReply {
  return { ...codes, from: row.fromMonth, to: row.toMonth, version: row.version };
}
