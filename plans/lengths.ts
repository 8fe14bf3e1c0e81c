import { UNITS_PER_INCH, UNITS_PER_MM } from '@/lib/domain/measure';

/**
 * Inches with a fraction, in 1/640 mm: `inch(43, 1, 2)` is 43 1/2 in.
 *
 * @throws RangeError where the fraction is not whole in 1/640 mm (denominators past 128)
 */
export function inch(whole: number, top = 0, bottom = 1): number {
  const length = whole * UNITS_PER_INCH + (top * UNITS_PER_INCH) / bottom;
  if (!Number.isInteger(length)) throw new RangeError(`${whole} ${top}/${bottom} in is not whole in 1/640 mm`);
  return length;
}

/** Millimetres, to a tenth. */
export function mm(value: number): number {
  return Math.round(value * 10) * (UNITS_PER_MM / 10);
}
