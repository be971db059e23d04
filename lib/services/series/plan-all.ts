import "server-only";
import type { SeriesColumns } from "@/db/schema";
import type { Month } from "@/lib/indicators/month";
import { planSignals, towardsOf, type FoundSignal, type StoredSignal } from "@/lib/indicators/signal-life";
import type { BaselineStatus, Towards } from "@/lib/indicators/vocabulary";
import { columnsOf, evaluateFacts } from "./evaluate";
import type { LoadedSeries } from "./load-series";
import { keyOf, type SeriesKey } from "./pairs";

export interface BornSignal extends SeriesKey {
  found: FoundSignal;
  towards: Towards;
  onNewest: boolean;
}

export interface ChangedSignal extends SeriesKey {
  signal: StoredSignal;
  found: FoundSignal;
}

export interface SeriesStateDraft extends SeriesKey {
  columns: SeriesColumns;
  centre: number | null;
  baselineStatus: BaselineStatus;
  hasLimits: boolean;
  activeSignals: number;
  newestMonth: string | null;
}

export interface FullPlan {
  states: SeriesStateDraft[];
  born: BornSignal[];
  moved: ChangedSignal[];
  cameBack: ChangedSignal[];
  withdrawn: StoredSignal[];
  /** Signals whose side means something else since the indicator's better direction was changed. */
  turned: { id: string; towards: Towards }[];
}

/** Series evaluated between two looks at the event loop, so that others are answered meanwhile. */
const BETWEEN_YIELDS = 40;

/** Evaluates many series and says what becomes of their signals. */
export async function planAll(
  loaded: readonly LoadedSeries[],
  stored: ReadonlyMap<string, StoredSignal[]>,
): Promise<FullPlan> {
  const plan: FullPlan = { states: [], born: [], moved: [], cameBack: [], withdrawn: [], turned: [] };
  for (const [index, series] of loaded.entries()) {
    if (index % BETWEEN_YIELDS === BETWEEN_YIELDS - 1) await new Promise((resolve) => setImmediate(resolve));
    planOne(plan, series, stored.get(keyOf(series)) ?? []);
  }
  return plan;
}

function planOne(plan: FullPlan, series: LoadedSeries, stored: readonly StoredSignal[]): void {
  const { wardId, indicatorId, facts } = series;
  const evaluated = evaluateFacts(facts);
  const newestMonth = newestCounted(evaluated.assembled.slots);
  const signals = planSignals(stored, evaluated.signals);
  for (const found of signals.born) {
    const towards = towardsOf(found.side, facts.indicator.betterWhen);
    plan.born.push({ wardId, indicatorId, found, towards, onNewest: found.to === newestMonth });
  }
  plan.moved.push(...signals.moved.map((change) => ({ wardId, indicatorId, ...change })));
  plan.cameBack.push(...signals.cameBack.map((change) => ({ wardId, indicatorId, ...change })));
  plan.withdrawn.push(...signals.withdrawn);
  for (const { id, side, towards: before } of stored) {
    const towards = towardsOf(side, facts.indicator.betterWhen);
    if (towards !== before) plan.turned.push({ id, towards });
  }
  const lastSegment = evaluated.evaluation.segments.at(-1);
  plan.states.push({
    wardId,
    indicatorId,
    columns: columnsOf(evaluated),
    centre: lastSegment?.centre ?? null,
    baselineStatus: evaluated.baselineStatus,
    hasLimits: lastSegment?.hasLimits ?? false,
    activeSignals: evaluated.signals.length,
    newestMonth,
  });
}

function newestCounted(slots: readonly { month: Month; state: string }[]): Month | null {
  return slots.findLast((slot) => slot.state === "counted")?.month ?? null;
}
