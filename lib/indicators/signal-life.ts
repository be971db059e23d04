import type { DetectedSignal } from "@/lib/limits/types";
import type { Month } from "./month";
import type { Direction, SignalStatus, Towards } from "./vocabulary";

/** A detected signal, in months. */
export interface FoundSignal {
  rule: string;
  side: "upper" | "lower";
  segmentFrom: Month;
  from: Month;
  to: Month;
  spansGap: boolean;
}

export interface StoredSignal extends FoundSignal {
  id: string;
  status: SignalStatus;
  towards: Towards;
  bornAt: Date;
}

export interface SignalPlan {
  born: FoundSignal[];
  /** Same signal, other months. */
  moved: { signal: StoredSignal; found: FoundSignal }[];
  cameBack: { signal: StoredSignal; found: FoundSignal }[];
  withdrawn: StoredSignal[];
}

/** Adverse or favourable by the side of the centre line and the direction that is better. */
export function towardsOf(side: "upper" | "lower", betterWhen: Direction): Towards {
  if (betterWhen === "neither") return "neither";
  return (side === "upper") === (betterWhen === "higher") ? "favourable" : "adverse";
}

/**
 * What becomes of the stored signals of one series, given what is detected now. Two are the same signal when rule,
 * side and segment agree and their months overlap. Where two stored ones have merged into one detected, the elder
 * stays; where one has split, the earlier part keeps its identity. A signal whose evidence returns comes back.
 */
export function planSignals(stored: readonly StoredSignal[], found: readonly FoundSignal[]): SignalPlan {
  const plan: SignalPlan = { born: [], moved: [], cameBack: [], withdrawn: [] };
  const taken = new Set<string>();
  const inOrder = [...found].sort((left, right) =>
    left.from < right.from ? -1 : left.from > right.from ? 1 : 0,
  );
  for (const each of inOrder) {
    const keeper = elderOf(stored.filter((old) => !taken.has(old.id) && isSameSignal(old, each)));
    if (!keeper) {
      plan.born.push(each);
      continue;
    }
    taken.add(keeper.id);
    if (keeper.status === "withdrawn") plan.cameBack.push({ signal: keeper, found: each });
    else if (keeper.from !== each.from || keeper.to !== each.to || keeper.spansGap !== each.spansGap) {
      plan.moved.push({ signal: keeper, found: each });
    }
  }
  plan.withdrawn = stored.filter((old) => old.status !== "withdrawn" && !taken.has(old.id));
  return plan;
}

/** Rule, side and segment agree, and the months overlap. */
export function isSameSignal(stored: FoundSignal, found: FoundSignal): boolean {
  const sameKind =
    stored.rule === found.rule && stored.side === found.side && stored.segmentFrom === found.segmentFrom;
  return sameKind && stored.from <= found.to && found.from <= stored.to;
}

/** An active signal before a withdrawn one, then the elder. */
function elderOf(candidates: readonly StoredSignal[]): StoredSignal | undefined {
  return [...candidates].sort((left, right) => {
    const activeFirst = Number(left.status === "withdrawn") - Number(right.status === "withdrawn");
    return activeFirst || left.bornAt.getTime() - right.bornAt.getTime() || (left.id < right.id ? -1 : 1);
  })[0];
}

/** Puts a detection's slots into months. */
export function inMonths(
  detected: DetectedSignal,
  months: readonly Month[],
  segmentFrom: Month,
): FoundSignal {
  const from = months[detected.first];
  const to = months[detected.last];
  if (from === undefined || to === undefined) throw new RangeError("A signal lies outside its series.");
  return { rule: detected.rule, side: detected.side, segmentFrom, from, to, spansGap: detected.spansGap };
}
