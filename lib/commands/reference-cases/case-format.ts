/**
 * The format of a reference file: one topic, many cases, each with inputs and expected figures. Indices in it count
 * from 1; null is "missing" in an input and "doesn't exist" in an expectation.
 */
export type Fields = Record<string, unknown>;

export interface Tolerance {
  rel: number;
  abs: number;
  /** `exact`: whole numbers on both sides must be equal. */
  counts?: string;
  /** Absolute tolerance of fields whose name begins with mid_p. */
  mid_p_abs?: number;
}

export interface ReferenceCase {
  id: string;
  source: string;
  input: Fields;
  expected: Fields;
  tolerance: Tolerance;
  /** Printed figures of the source, by field. */
  sourcePrints: Fields;
}

export interface ReferenceFile {
  /** Letter that the topic's title begins with. */
  letter: string;
  topic: string;
  cases: ReferenceCase[];
}

export function isFields(value: unknown): value is Fields {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

/** Reads parsed JSON as a reference file. Errors: RangeError that names what is wrong. */
export function parseReferenceFile(json: unknown): ReferenceFile {
  if (!isFields(json) || typeof json.topic !== "string" || !Array.isArray(json.cases)) {
    throw new RangeError("not a reference file: topic or cases are missing");
  }
  const letter = /^([a-z])\b/i.exec(json.topic)?.[1]?.toLowerCase();
  if (!letter) throw new RangeError(`the topic "${json.topic}" doesn't begin with a letter of its own`);
  return { letter, topic: json.topic, cases: json.cases.map(parseCase) };
}

function parseCase(json: unknown, index: number): ReferenceCase {
  const name = isFields(json) && typeof json.id === "string" ? json.id : `case ${index + 1}`;
  if (!isFields(json) || !isFields(json.input) || !isFields(json.expected)) {
    throw new RangeError(`${name}: input or expected is missing`);
  }
  return {
    id: name,
    source: typeof json.source === "string" ? json.source : "",
    input: json.input,
    expected: json.expected,
    tolerance: parseTolerance(json.tolerance),
    sourcePrints: isFields(json.source_prints) ? json.source_prints : {},
  };
}

/** A case without a tolerance of its own gets the usual one of the format. */
function parseTolerance(json: unknown): Tolerance {
  const fields = isFields(json) ? json : {};
  return {
    rel: typeof fields.rel === "number" ? fields.rel : 1e-9,
    abs: typeof fields.abs === "number" ? fields.abs : 1e-12,
    counts: typeof fields.counts === "string" ? fields.counts : undefined,
    mid_p_abs: typeof fields.mid_p_abs === "number" ? fields.mid_p_abs : undefined,
  };
}
