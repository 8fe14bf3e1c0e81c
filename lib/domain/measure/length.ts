/**
 * A length in whole units of 1/640 mm.
 *
 * 1 in = 16 256 units, 1/128 in = 127, 0.1 mm = 64: inch fractions and tenths of a millimetre are both
 * exact, so sums never drift and JSON and PostgreSQL can store them as integers.
 */
export type Length = number;

export const UNITS_PER_MM = 640;
export const UNITS_PER_INCH = 16_256;
export const UNITS_PER_FOOT = UNITS_PER_INCH * 12;

/** Largest length accepted anywhere: 100 m, far past any board and well inside 32 bits. */
export const MAX_LENGTH: Length = 100_000 * UNITS_PER_MM;

/** True for a whole number of units within ±{@link MAX_LENGTH}. */
export function isLength(value: unknown): value is Length {
  return typeof value === 'number' && Number.isInteger(value) && Math.abs(value) <= MAX_LENGTH;
}
