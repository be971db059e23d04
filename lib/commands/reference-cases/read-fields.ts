import { isFields, type Fields } from "./case-format";

/** Whether a field holds a plain number. */
export function hasNumber(fields: Fields, name: string): boolean {
  return typeof fields[name] === "number";
}

/** A number that the topic can't do without. Errors: RangeError where it is missing. */
export function numberIn(fields: Fields, name: string, fallback?: number): number {
  const value = fields[name] ?? fallback;
  if (typeof value !== "number") throw new RangeError(`${name} must be a number`);
  return value;
}

/** A list of numbers as a column, null as NaN. Errors: RangeError where it isn't such a list. */
export function columnIn(fields: Fields, name: string): Float64Array {
  const value = fields[name];
  if (!Array.isArray(value)) throw new RangeError(`${name} must be a list`);
  return Float64Array.from(value, (item: unknown) => {
    if (item === null) return NaN;
    if (typeof item !== "number") throw new RangeError(`${name} must hold numbers and nulls`);
    return item;
  });
}

/** The rows of a case's expectation, which carry their own inputs; none where the case has no rows. */
export function rowsIn(fields: Fields): Fields[] {
  return Array.isArray(fields.rows) ? fields.rows.filter(isFields) : [];
}

/** 1 for each listed position (counted from 1); 1 everywhere where the field is absent. */
export function maskIn(fields: Fields, name: string, length: number): Uint8Array {
  const mask = new Uint8Array(length);
  if (fields[name] === undefined) return mask.fill(1);
  for (const position of columnIn(fields, name)) mask[position - 1] = 1;
  return mask;
}

/** Positions, counted from 1, at which a column isn't 0. */
export function positionsWhere(column: Int8Array | Uint8Array): number[] {
  const positions: number[] = [];
  column.forEach((value, index) => {
    if (value !== 0) positions.push(index + 1);
  });
  return positions;
}

/** A column as a list, every entry multiplied. */
export function scaled(column: Float64Array, factor = 1): number[] {
  return Array.from(column, (value) => value * factor);
}
