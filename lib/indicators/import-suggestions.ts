import { rowWords } from "@/lib/strings/imports";
import type { ImportFacts } from "./import-facts";
import { nearestNamed, type Named } from "./import-nearest";

/** Words for codes that are not known, with the likeliest meant. */
export interface Suggestions {
  unknownWard: (written: string) => string;
  unknownIndicator: (written: string) => string;
}

/** Further unknown codes get no suggestion: a sheet full of them is another hospital's. */
const MAX_SUGGESTIONS = 200;

/**
 * Suggests only wards that the person may know about; a ward of somebody else gets the same words as one that
 * doesn't exist. `namesWards` lists the person's own wards as well, where they don't have them all.
 */
export function suggestionsFor(facts: ImportFacts, namesWards: boolean): Suggestions {
  const mine = namesWards ? [...facts.wards.values()].map(spoken).sort() : null;
  return {
    unknownWard: remembered((written, guess) =>
      rowWords.unknownWard(written, guess ? nearest(written, facts.wards) : null, mine),
    ),
    unknownIndicator: remembered((written, guess) =>
      rowWords.unknownIndicator(written, guess ? nearest(written, facts.indicators) : null),
    ),
  };
}

function nearest(written: string, entries: ReadonlyMap<string, Named>): string | null {
  const found = nearestNamed(written, entries.values());
  return found && spoken(found);
}

function spoken({ code, name }: Named): string {
  return code.toLowerCase() === name.toLowerCase() ? code : `${code} (${name})`;
}

function remembered(work: (written: string, guess: boolean) => string): (written: string) => string {
  const known = new Map<string, string>();
  return (written) => {
    const before = known.get(written);
    if (before !== undefined) return before;
    if (known.size >= MAX_SUGGESTIONS) return work(written, false);
    const words = work(written, true);
    known.set(written, words);
    return words;
  };
}
