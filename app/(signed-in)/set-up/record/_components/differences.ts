export interface Difference {
  field: string;
  before: unknown;
  after: unknown;
}

/** Fields in which two records differ, in the order of the newer one; a record that wasn't there has none. */
export function differencesOf(before: unknown, after: unknown): Difference[] {
  const old = fieldsOf(before);
  const now = fieldsOf(after);
  return [...new Set([...Object.keys(now), ...Object.keys(old)])]
    .filter((field) => JSON.stringify(old[field]) !== JSON.stringify(now[field]))
    .map((field) => ({ field, before: old[field], after: now[field] }));
}

/** A value in one line; null for nothing. */
export function valueInWords(value: unknown): string | null {
  if (value === null || value === undefined || value === "") return null;
  return typeof value === "string" ? value : JSON.stringify(value);
}

/** What a record is called by people: its name or code, its month, whatever of these it has; null for none. */
export function subjectInWords(entry: { before: unknown; after: unknown }): string | null {
  const record = { ...fieldsOf(entry.before), ...fieldsOf(entry.after) };
  const names = ["name", "code", "ward", "indicator", "month"]
    .map((field) => record[field])
    .filter((value): value is string => typeof value === "string" && value !== "");
  return names.length > 0 ? names.slice(0, 3).join(", ") : null;
}

function fieldsOf(record: unknown): Record<string, unknown> {
  if (record === null || record === undefined) return {};
  if (typeof record === "object" && !Array.isArray(record)) return { ...record };
  return { value: record };
}
