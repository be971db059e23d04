/** Names longer than this are compared by their beginning. */
const COMPARED_CHARACTERS = 40;
/** Share of a name's letters that may differ for a suggestion to be worth making. */
const TOLERANCE = 0.35;

export interface Named {
  code: string;
  name: string;
}

/**
 * The entry whose code or name is nearest to a text that matched none, or null where nothing comes close. A text that
 * is somebody's name in full always finds it. Ties go to the first.
 */
export function nearestNamed<Entry extends Named>(text: string, entries: Iterable<Entry>): Entry | null {
  const wanted = plain(text);
  if (wanted === "") return null;
  let best: Entry | null = null;
  let bestShare = TOLERANCE;
  for (const entry of entries) {
    const share = Math.min(difference(wanted, plain(entry.code)), difference(wanted, plain(entry.name)));
    if (share < bestShare || (share === bestShare && best === null)) {
      best = entry;
      bestShare = share;
    }
  }
  return best;
}

function plain(text: string): string {
  return text
    .trim()
    .toLowerCase()
    .replace(/[\s_-]+/g, " ")
    .slice(0, COMPARED_CHARACTERS);
}

/** Edits between two texts as a share of the longer one's length. */
function difference(left: string, right: string): number {
  const longer = Math.max(left.length, right.length);
  if (longer === 0) return 1;
  if (Math.abs(left.length - right.length) / longer > TOLERANCE) return 1;
  return editDistance(left, right) / longer;
}

/** Insertions, deletions, replacements and swaps of neighbours that lead from one text to the other. */
export function editDistance(left: string, right: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: right.length + 1 }, (_, index) => index);
  for (let row = 1; row <= left.length; row += 1) {
    const next = [row];
    for (let column = 1; column <= right.length; column += 1) {
      const isSame = left[row - 1] === right[column - 1];
      let cost = Math.min(
        (last[column] ?? 0) + 1,
        (next[column - 1] ?? 0) + 1,
        (last[column - 1] ?? 0) + (isSame ? 0 : 1),
      );
      const isSwap =
        row > 1 && column > 1 && left[row - 1] === right[column - 2] && left[row - 2] === right[column - 1];
      if (isSwap) cost = Math.min(cost, (beforeLast[column - 2] ?? 0) + 1);
      next.push(cost);
    }
    beforeLast = last;
    last = next;
  }
  return last[right.length] ?? 0;
}
