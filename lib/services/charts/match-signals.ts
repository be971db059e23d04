import "server-only";
import { isSameSignal, towardsOf, type FoundSignal } from "@/lib/indicators/signal-life";
import type { Direction } from "@/lib/indicators/vocabulary";
import type { ChartSignalReply } from "@/lib/schemas/chart";
import { signalReply, type Signal } from "@/lib/services/signals";

interface Codes {
  ward: string;
  indicator: string;
}

/**
 * Signals of a chart as drawn, each with its record where it has one. A record that is withdrawn today was as new
 * on a day when its evidence stood.
 */
export function matchSignals(
  found: readonly FoundSignal[],
  stored: readonly Signal[],
  betterWhen: Direction,
  codes: Codes,
): ChartSignalReply[] {
  const taken = new Set<string>();
  const inOrder = [...found].sort((left, right) => (left.to < right.to ? 1 : left.to > right.to ? -1 : 0));
  return inOrder.map((each) => {
    const record = recordOf(
      each,
      stored.filter((row) => !taken.has(row.id)),
    );
    if (record) taken.add(record.id);
    return replyOf(each, record, betterWhen, codes);
  });
}

/** An active record before a withdrawn one, then the elder. */
function recordOf(found: FoundSignal, stored: readonly Signal[]): Signal | undefined {
  return stored
    .filter((row) => isSameSignal({ ...row, from: row.fromMonth, to: row.toMonth }, found))
    .sort((left, right) => {
      const activeFirst = Number(left.status === "withdrawn") - Number(right.status === "withdrawn");
      return activeFirst || left.bornAt.getTime() - right.bornAt.getTime();
    })[0];
}

function replyOf(
  found: FoundSignal,
  record: Signal | undefined,
  betterWhen: Direction,
  codes: Codes,
): ChartSignalReply {
  const drawn = {
    ...codes,
    rule: found.rule,
    from: found.from,
    to: found.to,
    side: found.side,
    towards: towardsOf(found.side, betterWhen),
    spansGap: found.spansGap,
    withdrawnWhy: null,
  };
  if (!record) {
    return { ...drawn, id: null, status: "new", version: 0, onNewest: false, bornAt: null, changedAt: null };
  }
  const reply = signalReply(record, codes.ward, codes.indicator);
  return { ...reply, ...drawn, status: reply.status === "withdrawn" ? "new" : reply.status };
}
