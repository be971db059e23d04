import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { hasEnded } from "@/lib/indicators/maturity";
import { addMonths, monthRange, type Month } from "@/lib/indicators/month";
import type { EarlierFigures, ReturnSteps, TypedParts } from "@/lib/indicators/return-entry";
import { COMPARED_MONTHS } from "@/lib/indicators/tally-usual-range";
import { authorize, can, requireAction, typesNumerator } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import {
  effectiveDenominator,
  joinDenominator,
  loadLines,
  readReturn,
  wardWithReturn,
} from "@/lib/services/tallies";
import { returnReply } from "./reply";

export interface EntryPage {
  wardReturn: WardReturnReply;
  /** Oldest first. */
  earlierMonths: Month[];
  /** By indicator code, one entry a month. */
  earlier: Record<string, EarlierFigures[]>;
  /** Steps that the actor's role allows; the state of the return decides the rest. */
  may: ReturnSteps;
  /** False while the month is running: nothing of it is sent before its last day. */
  isOver: boolean;
  /** By indicator code: what the actor types. */
  types: Record<string, TypedParts>;
}

interface Read {
  ctx: Ctx;
  input: { ward: string; month: Month };
}

/** Everything that the page of one return needs for its first paint. */
export async function getEntryPage({ ctx, input }: Read): Promise<EntryPage> {
  requireAction(ctx.actor, "return.read");
  const { ward, day } = await wardWithReturn(ctx, input);
  authorize(ctx.actor, "return.read", { wardId: ward.id });
  const row = await readReturn(ctx, ward, input.month, day);
  const lines = await loadLines(ctx.db, { wardId: ward.id, month: input.month });
  const earlierMonths = monthRange(addMonths(input.month, -COMPARED_MONTHS), addMonths(input.month, -1));
  const facts = { wardId: ward.id };
  return {
    wardReturn: returnReply(row, ward, lines, day),
    earlierMonths,
    earlier: await loadEarlier(ctx, ward.id, earlierMonths),
    may: {
      submit: can(ctx.actor, "return.submit", facts),
      recall: can(ctx.actor, "return.recall", facts),
      accept: can(ctx.actor, "return.accept", facts),
      reopen: can(ctx.actor, "return.reopen", facts),
      correct: can(ctx.actor, "tally.correct", facts),
      decide: can(ctx.actor, "correction.decide", facts),
    },
    isOver: hasEnded(input.month, day.today),
    types: Object.fromEntries(
      lines.map(({ indicator: { code, team, numeratorBy } }) => [
        code,
        {
          numerator: typesNumerator(ctx.actor, { team, numeratorBy }),
          line: can(ctx.actor, "tally.save", { ...facts, team, numeratorBy }),
        },
      ]),
    ),
  };
}

interface Row extends EarlierFigures {
  code: string;
  month: string;
}

async function loadEarlier(
  ctx: Ctx,
  wardId: string,
  months: readonly Month[],
): Promise<EntryPage["earlier"]> {
  const rows = await selectRows<Row>(
    ctx.db,
    sql`
      select i.code, t.month, t.corrected,
        (case when t.charted then t.charted_numerator else t.numerator end)::float8 as numerator,
        (case when t.charted then t.charted_denominator
          when t.not_collected is null then ${effectiveDenominator} end)::float8 as denominator
      from tallies t
      join indicators i on i.id = t.indicator_id
      ${joinDenominator}
      where t.ward_id = ${wardId}::uuid and t.month >= ${months[0] ?? ""} and t.month <= ${months.at(-1) ?? ""}`,
  );
  const blank = (): EarlierFigures => ({ numerator: null, denominator: null, corrected: false });
  const earlier: EntryPage["earlier"] = {};
  for (const { code, month, ...figures } of rows) {
    const list = (earlier[code] ??= months.map(blank));
    const index = months.indexOf(month as Month);
    if (index >= 0) list[index] = figures;
  }
  return earlier;
}
