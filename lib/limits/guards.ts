/** Refuses anything but a whole number from 0 up. Errors: RangeError. */
export function requireCount(name: string, value: number): void {
  if (!Number.isSafeInteger(value) || value < 0)
    throw new RangeError(`${name} must be a whole number from 0 up`);
}

/** Refuses anything but a whole number, negative ones included. Errors: RangeError. */
export function requireInteger(name: string, value: number): void {
  if (!Number.isSafeInteger(value)) throw new RangeError(`${name} must be a whole number`);
}

/** Refuses anything outside [0, 1]. Errors: RangeError. */
export function requireProbability(name: string, value: number): void {
  if (!(value >= 0 && value <= 1)) throw new RangeError(`${name} must lie between 0 and 1`);
}

/** Refuses anything but a tail area strictly between 0 and 1. Errors: RangeError. */
export function requireTailArea(name: string, value: number): void {
  if (!(value > 0 && value < 1)) throw new RangeError(`${name} must lie between 0 and 1, both excluded`);
}

/** Refuses negative, infinite and missing values. Errors: RangeError. */
export function requireNonNegative(name: string, value: number): void {
  if (!(value >= 0 && value < Infinity)) throw new RangeError(`${name} must be a number from 0 up`);
}

/** Refuses zero, negative, infinite and missing values. Errors: RangeError. */
export function requirePositive(name: string, value: number): void {
  if (!(value > 0 && value < Infinity)) throw new RangeError(`${name} must be a number above 0`);
}
