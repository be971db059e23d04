import type { CountModel, SegmentInput, SeriesInput } from "@/lib/limits";

/** A short way to write a series down: null is a month without a point. */
export function seriesOf(
  numerators: (number | null)[],
  denominators: (number | null)[] | number,
  changes: Partial<Omit<SeriesInput, "segments">> & {
    method?: SegmentInput["method"];
    baseline?: number[];
    segments?: Partial<SegmentInput>[];
  } = {},
): SeriesInput {
  const length = numerators.length;
  const sizes = typeof denominators === "number" ? Array<number>(length).fill(denominators) : denominators;
  const { method = "three-sigma", baseline, segments = [{}], ...rest } = changes;
  const model: CountModel = "binomial";
  return {
    model,
    counts: { numerators: column(numerators), denominators: column(sizes) },
    segments: segments.map((segment) => ({
      start: 0,
      end: length,
      inBaseline: maskOf(length, baseline),
      method,
      ...segment,
    })),
    rules: [{ name: "beyond-action" }, { name: "two-of-three" }, { name: "one-side" }],
    betterWhen: "lower",
    ...rest,
  };
}

export function column(values: (number | null)[]): Float64Array {
  return Float64Array.from(values, (value) => value ?? NaN);
}

/** 1 at the given slots, or everywhere. */
export function maskOf(length: number, slots?: number[]): Uint8Array {
  const mask = new Uint8Array(length);
  if (slots === undefined) return mask.fill(1);
  for (const slot of slots) mask[slot] = 1;
  return mask;
}
