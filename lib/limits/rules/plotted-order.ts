import { at, indexAt } from "../columns";
import { LONGEST_GAP_MONTHS } from "../constants";

/** The plotted slots of a stretch in order. "Consecutive" in every rule means consecutive positions in here. */
export interface PlottedOrder {
  /** Slot of each position. */
  slots: Int32Array;
  /** 1 where nothing before the position may count with it: the first one, and one after a long gap. */
  restarts: Uint8Array;
}

/**
 * Lists the plotted slots of [start, end).
 *
 * @param values column with NaN where nothing is plotted.
 * @param longestGap calendar months without a point that a run survives; one more, and it ends.
 */
export function plottedOrder(
  values: Float64Array,
  start = 0,
  end = values.length,
  longestGap: number = LONGEST_GAP_MONTHS,
): PlottedOrder {
  const slots = new Int32Array(end - start);
  const restarts = new Uint8Array(end - start);
  let used = 0;
  for (let slot = start; slot < end; slot += 1) {
    if (Number.isNaN(at(values, slot))) continue;
    const isCutOff = used === 0 || slot - indexAt(slots, used - 1) - 1 > longestGap;
    slots[used] = slot;
    restarts[used] = isCutOff ? 1 : 0;
    used += 1;
  }
  return { slots: slots.subarray(0, used), restarts: restarts.subarray(0, used) };
}
