import type { AssignedMonths, OpenMonths } from "./assigned-months";
import type { ReturnBefore } from "./import-row";
import type { Month } from "./month";
import type { Kind, Team } from "./vocabulary";

export interface ImportWard extends OpenMonths {
  id: string;
  code: string;
  name: string;
}

export interface ImportIndicator {
  id: string;
  code: string;
  name: string;
  kind: Kind;
  team: Team;
  sharedDenominatorId: string | null;
  /** Whether whoever brings the sheet in may type this line's numerator. */
  mayType: boolean;
}

export interface ImportTally {
  indicatorId: string;
  numerator: number | null;
  /** The line's own; null where the denominator is shared. */
  denominator: number | null;
  notCollected: string | null;
  awaited: string | null;
  note: string | null;
  corrected: boolean;
  version: number;
}

export interface ImportDenominator {
  value: number | null;
  awaited: string | null;
  version: number;
}

/** All that is stored for one ward and month. */
export interface ImportMonth {
  return: ReturnBefore | null;
  /** By id of the indicator. */
  tallies: ReadonlyMap<string, ImportTally>;
  /** By id of the shared denominator. */
  denominators: ReadonlyMap<string, ImportDenominator>;
}

/** What the rows of a sheet are judged by. Wards outside the person's scope are not in it, as if they didn't exist. */
export interface ImportFacts {
  thisMonth: Month;
  /** By code. */
  wards: ReadonlyMap<string, ImportWard>;
  indicators: ReadonlyMap<string, ImportIndicator>;
  /** By `pairKey`. */
  assignments: ReadonlyMap<string, AssignedMonths>;
  /** By `monthKey`. */
  months: ReadonlyMap<string, ImportMonth>;
  /** Whether the person may change what was sent, with a reason. */
  mayCorrect: boolean;
}

export const pairKey = (wardId: string, indicatorId: string): string => `${wardId} ${indicatorId}`;
export const monthKey = (wardId: string, month: Month): string => `${wardId} ${month}`;

const NOTHING_STORED: ImportMonth = { return: null, tallies: new Map(), denominators: new Map() };

export function storedFor(facts: ImportFacts, wardId: string, month: Month): ImportMonth {
  return facts.months.get(monthKey(wardId, month)) ?? NOTHING_STORED;
}
