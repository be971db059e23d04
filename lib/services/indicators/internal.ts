import "server-only";
import { asc, eq, inArray, type SQL } from "drizzle-orm";
import type { Db } from "@/db/client";
import { indicatorDefinitions, indicators, sharedDenominators, tallies } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";

export type Indicator = typeof indicators.$inferSelect;
export type IndicatorDefinition = typeof indicatorDefinitions.$inferSelect;
export type SharedDenominator = typeof sharedDenominators.$inferSelect;

/** An indicator with all versions of its definition, oldest first, and what it shares its denominator by. */
export interface IndicatorDetail extends Indicator {
  definitions: IndicatorDefinition[];
  sharedDenominator: SharedDenominator | null;
}

export const indicatorNotFound = () => new DomainError("not-found", "There is no such indicator.");

/** The indicators that meet a condition, by name: two statements, however many there are. */
export async function loadDetails(db: Db, where?: SQL): Promise<IndicatorDetail[]> {
  const rows = await db
    .select({ indicator: indicators, sharedDenominator: sharedDenominators })
    .from(indicators)
    .leftJoin(sharedDenominators, eq(sharedDenominators.id, indicators.sharedDenominatorId))
    .where(where)
    .orderBy(asc(indicators.name), asc(indicators.code));
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.indicator.id);
  const versions = await db
    .select()
    .from(indicatorDefinitions)
    .where(inArray(indicatorDefinitions.indicatorId, ids))
    .orderBy(asc(indicatorDefinitions.indicatorId), asc(indicatorDefinitions.number));
  const byIndicator = new Map<string, IndicatorDefinition[]>(ids.map((id) => [id, []]));
  for (const version of versions) byIndicator.get(version.indicatorId)?.push(version);
  return rows.map(({ indicator, sharedDenominator }) => ({
    ...indicator,
    sharedDenominator,
    definitions: byIndicator.get(indicator.id) ?? [],
  }));
}

/** Holds an indicator until the transaction ends; not-found where there is none. */
export async function lockIndicator(tx: TxCtx, code: string): Promise<IndicatorDetail> {
  const byCode = eq(indicators.code, code.toUpperCase());
  const [row] = await tx.db.select({ id: indicators.id }).from(indicators).where(byCode).for("update");
  if (!row) throw indicatorNotFound();
  const [detail] = await loadDetails(tx.db, eq(indicators.id, row.id));
  if (!detail) throw indicatorNotFound();
  return detail;
}

export async function hasTallies(db: Db, indicatorId: string): Promise<boolean> {
  const rows = await db
    .select({ id: tallies.id })
    .from(tallies)
    .where(eq(tallies.indicatorId, indicatorId))
    .limit(1);
  return rows.length > 0;
}
