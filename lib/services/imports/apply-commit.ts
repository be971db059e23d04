import "server-only";
import { setImmediate as nextTurn } from "node:timers/promises";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import { monthKey } from "@/lib/indicators/import-facts";
import { asMonth, monthInZone } from "@/lib/indicators/month";
import { acceptReturns, sendReturns, type Sending } from "@/lib/services/returns";
import { reevaluateSeries } from "@/lib/services/series";
import {
  addRevisions,
  chartTallies,
  hospitalDay,
  keysOfReturns,
  type ReturnRow,
  type TallyKey,
} from "@/lib/services/tallies";
import type { CommitPlan, PlannedDenominator, PlannedRow } from "./commit-plan";
import { writeDenominators, writeTallies } from "./write-rows";
import { inTurns } from "./yielding";

/** What a commit did, as the audit says it. */
export interface Applied {
  rows: number;
  corrected: number;
  returnsAccepted: number;
}

type Returns = ReadonlyMap<string, ReturnRow>;

/** Writes figures, revisions and charts of a planned commit by a few statements per chunk of rows. */
export async function applyCommit(tx: TxCtx, plan: CommitPlan, returns: Returns): Promise<Applied> {
  const facts = { source: "import", reason: plan.reason, importRunId: plan.run.id } as const;
  const returnOf = (key: Pick<TallyKey, "wardId" | "month">) => returns.get(monthKey(key.wardId, key.month));
  const accepting = plan.accept ? await acceptable(tx, plan, returns) : [];
  const acceptingIds = new Set(accepting.map((row) => row.id));
  const isSent = (key: TallyKey) => returnOf(key)?.status !== "open";
  const isAccepting = (key: TallyKey) => acceptingIds.has(returnOf(key)?.id ?? "");
  const isSaved = (key: TallyKey) => !isSent(key) && !isAccepting(key);

  await writeDenominators(tx, plan.denominators);
  await writeTallies(
    tx,
    plan.run.id,
    plan.rows.map((row) => ({ ...row, charted: !isSaved(row) })),
  );
  const siblings = await siblingsOutside(tx, plan.rows, plan.denominators);
  await nextTurn();

  const saved = [...plan.rows, ...siblings].filter(isSaved);
  await addRevisions(
    tx,
    saved.map((key) => ({ ...key, charted: null })),
    { ...facts, event: "saved" },
  );
  const corrected = plan.rows.filter(isSent);
  await addRevisions(
    tx,
    corrected.map((key) => ({ ...key, charted: true })),
    { ...facts, event: "corrected" },
  );
  const reached = await chartTallies(tx, { keys: siblings.filter(isSent), ...facts, event: "corrected" });
  const sent = plan.rows.filter((key) => !isSent(key) && isAccepting(key));
  await addRevisions(
    tx,
    sent.map((key) => ({ ...key, charted: true })),
    { ...facts, event: "sent" },
  );
  await nextTurn();

  const others = await acceptAll(tx, accepting, { ...facts, isCharted: isAmong(plan.rows) });
  await nextTurn();
  await reevaluateSeries(tx, { pairs: [...corrected, ...reached, ...sent, ...others], why: "correction" });
  return {
    rows: plan.rows.length,
    corrected: corrected.length + reached.length,
    returnsAccepted: accepting.length,
  };
}

/** Sends and accepts the returns; answers the lines that it charted or that have to be judged anew. */
async function acceptAll(
  tx: TxCtx,
  accepting: readonly ReturnRow[],
  facts: Omit<Sending, "returnIds">,
): Promise<TallyKey[]> {
  if (accepting.length === 0) return [];
  const returnIds = accepting.map((row) => row.id);
  const submitted = accepting.filter((row) => row.status === "submitted").map((row) => row.id);
  const charted = await sendReturns(tx, { returnIds, ...facts });
  await acceptReturns(tx, returnIds);
  return submitted.length > 0 ? [...charted, ...(await keysOfReturns(tx, submitted))] : charted;
}

/** Returns that a lead accepts with the import: those that the rows speak of, once their month is over. */
async function acceptable(tx: TxCtx, plan: CommitPlan, returns: Returns): Promise<ReturnRow[]> {
  const { timeZone } = await hospitalDay(tx);
  const thisMonth = monthInZone(tx.now, timeZone);
  return plan.months.flatMap(({ wardId, month }) => {
    const row = returns.get(monthKey(wardId, month));
    return row && month < thisMonth && row.status !== "accepted" ? [row] : [];
  });
}

/** Lines that the sheet doesn't change itself but whose shared denominator it does. */
async function siblingsOutside(
  tx: TxCtx,
  planned: readonly PlannedRow[],
  denominators: readonly PlannedDenominator[],
): Promise<TallyKey[]> {
  const isListed = isAmong(planned);
  const siblings: TallyKey[] = [];
  await inTurns(denominators, async (some) => {
    const json = JSON.stringify(
      some.map((each) => ({ ward_id: each.wardId, shared_id: each.sharedDenominatorId, month: each.month })),
    );
    const rows = await selectRows<{ ward_id: string; indicator_id: string; month: string }>(
      tx.db,
      sql`select t.ward_id, t.indicator_id, t.month
          from json_to_recordset(${json}::json) as n(ward_id uuid, shared_id uuid, month text)
          join tallies t on t.ward_id = n.ward_id and t.month = n.month
          join indicators i on i.id = t.indicator_id and i.shared_denominator_id = n.shared_id
          join ward_returns wr on wr.ward_id = t.ward_id and wr.month = t.month
          where t.charted or wr.status = 'open'
          order by t.ward_id, t.month, t.indicator_id`,
    );
    for (const row of rows) {
      const key = { wardId: row.ward_id, indicatorId: row.indicator_id, month: asMonth(row.month) };
      if (!isListed(key)) siblings.push(key);
    }
  });
  return siblings;
}

function isAmong(keys: readonly TallyKey[]): (key: TallyKey) => boolean {
  const texts = new Set(keys.map(keyText));
  return (key) => texts.has(keyText(key));
}

const keyText = ({ wardId, indicatorId, month }: TallyKey) => `${wardId} ${indicatorId} ${month}`;
