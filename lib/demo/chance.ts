/** Repeatable chance for invented figures: the same seed gives the same hospital on every computer. */
export interface Chance {
  /** Uniform in [0, 1). */
  next: () => number;
  /** Whole number from `low` to `high`, both included. */
  between: (low: number, high: number) => number;
  /** Events among `trials`, each with the same probability. */
  binomial: (trials: number, probability: number) => number;
  /** Events of a process with this mean. */
  poisson: (mean: number) => number;
}

/** FNV-1a, 32 bits: a number out of a text. */
function hashOf(text: string): number {
  let hash = 0x811c9dc5;
  for (let index = 0; index < text.length; index += 1) {
    hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193);
  }
  return hash >>> 0;
}

/** A stream of its own for each text, so that inventing one more series leaves all others as they were. */
export function chanceFor(text: string): Chance {
  let state = hashOf(text) | 1;
  // xorshift with 32 bits (Marsaglia 2003): short, and good enough for invented figures.
  const next = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 0x1_0000_0000;
  };
  for (let warm = 0; warm < 8; warm += 1) next();
  const between = (low: number, high: number) => low + Math.floor(next() * (high - low + 1));
  const poisson = (mean: number): number => {
    // Large means are the sum of smaller ones, so that exp(-mean) never underflows.
    if (mean > 30) return poisson(mean / 2) + poisson(mean / 2);
    let events = 0;
    for (let product = next(); product > Math.exp(-mean); product *= next()) events += 1;
    return events;
  };
  const binomial = (trials: number, probability: number) => {
    let events = 0;
    for (let trial = 0; trial < trials; trial += 1) if (next() < probability) events += 1;
    return events;
  };
  return { next, between, binomial, poisson };
}
