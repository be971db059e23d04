import { at } from "../columns";
import { RELATIVE_SLACK } from "../constants";

/** Code of a standardised value against a line at k sigma: -1 or 1 strictly beyond, 0 inside or on it. */
export function zoneCode(z: number, sigmas: number): -1 | 0 | 1 {
  if (Math.abs(z) - sigmas <= RELATIVE_SLACK * sigmas) return 0;
  return z > 0 ? 1 : -1;
}

/** `zoneCode` of every position; k = 0 tells the sides of the centre line. */
export function zoneCodes(z: Float64Array, sigmas: number): Int8Array {
  const codes = new Int8Array(z.length);
  for (let position = 0; position < z.length; position += 1)
    codes[position] = zoneCode(at(z, position), sigmas);
  return codes;
}

/** 1 where a value is strictly within k sigma, on either side, else 0. */
export function withinCodes(z: Float64Array, sigmas: number): Int8Array {
  const codes = new Int8Array(z.length);
  for (let position = 0; position < z.length; position += 1) {
    codes[position] = sigmas - Math.abs(at(z, position)) > RELATIVE_SLACK * sigmas ? 1 : 0;
  }
  return codes;
}
