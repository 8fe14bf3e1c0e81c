import { UNITS_PER_FOOT, UNITS_PER_INCH, UNITS_PER_MM, type Length } from './length';

export type FractionDenominator = 2 | 4 | 8 | 16 | 32 | 64 | 128;

export type LengthStyle =
  | { system: 'imperial'; denominator: FractionDenominator; feet?: boolean }
  | { system: 'metric'; unit: 'mm' | 'cm' | 'm'; decimals: number };

/** The pieces of a formatted length, so that a screen can set a true fraction. */
export interface LengthParts {
  sign: 1 | -1;
  feet?: number;
  whole: number;
  numerator?: number;
  denominator?: number;
  decimals?: string;
  unit: '″' | 'mm' | 'cm' | 'm';
}

export interface FormattedLength {
  /** Plain text, readable by {@link parseLength}. */
  text: string;
  /** True when what is shown is not the length exactly. */
  rounded: boolean;
  /** Shown minus true, in 1/640 mm; at most half a division. */
  error: number;
  parts: LengthParts;
}

/** A tenth of a millimetre, the finest division that is whole in 1/640 mm. */
const FINEST_DECIMALS = { mm: 1, cm: 2, m: 4 } as const;

const METRIC = { mm: UNITS_PER_MM, cm: UNITS_PER_MM * 10, m: UNITS_PER_MM * 1000 } as const;

/**
 * Formats a length to a person's system and precision, to the nearest division (halves away from zero), and says by how
 * much what is shown differs from the truth.
 *
 * @throws RangeError naming the argument, for decimals finer than a tenth of a millimetre
 */
export function formatLength(length: Length, style: LengthStyle): FormattedLength {
  return style.system === 'imperial'
    ? formatImperial(length, style.denominator, style.feet ?? false)
    : formatMetric(length, style.unit, style.decimals);
}

function formatImperial(length: Length, denominator: FractionDenominator, feet: boolean): FormattedLength {
  const division = UNITS_PER_INCH / denominator;
  const size = Math.abs(length);
  const divisions = Math.round(size / division);
  const shown = divisions * division;
  const sign = length < 0 && divisions > 0 ? -1 : 1;
  const footCount = feet ? Math.floor(shown / UNITS_PER_FOOT) : 0;
  const inDivisions = divisions - footCount * 12 * denominator;
  const whole = Math.floor(inDivisions / denominator);
  const { numerator, denominator: lowest } = reduce(inDivisions - whole * denominator, denominator);

  const fraction = numerator > 0 ? `${numerator}/${lowest}` : '';
  const inches = [whole > 0 || !fraction ? String(whole) : '', fraction].filter(Boolean).join(' ');
  const text = `${sign < 0 ? '−' : ''}${footCount > 0 ? `${footCount}′ ` : ''}${inches}″`;
  const error = shown * sign - length;
  const parts: LengthParts = { sign, whole, unit: '″' };
  if (footCount > 0) parts.feet = footCount;
  if (numerator > 0) Object.assign(parts, { numerator, denominator: lowest });
  return { text, rounded: error !== 0, error: error === 0 ? 0 : error, parts };
}

function formatMetric(length: Length, unit: 'mm' | 'cm' | 'm', decimals: number): FormattedLength {
  const most = FINEST_DECIMALS[unit];
  if (!Number.isInteger(decimals) || decimals < 0 || decimals > most) {
    throw new RangeError(`decimals: a whole number from 0 to ${most} for ${unit}, not ${decimals}`);
  }
  const division = METRIC[unit] / 10 ** decimals;
  const size = Math.abs(length);
  const divisions = Math.round(size / division);
  const sign = length < 0 && divisions > 0 ? -1 : 1;
  const digits = String(divisions).padStart(decimals + 1, '0');
  const whole = digits.slice(0, digits.length - decimals);
  const after = decimals > 0 ? digits.slice(-decimals) : '';
  const text = `${sign < 0 ? '−' : ''}${whole}${after ? `.${after}` : ''} ${unit}`;
  const error = divisions * division * sign - length;
  const parts: LengthParts = { sign, whole: Number(whole), unit };
  if (after) parts.decimals = after;
  return { text, rounded: error !== 0, error: error === 0 ? 0 : error, parts };
}

function reduce(numerator: number, denominator: number): { numerator: number; denominator: number } {
  let [top, bottom] = [numerator, denominator];
  while (top > 0 && top % 2 === 0) [top, bottom] = [top / 2, bottom / 2];
  return { numerator: top, denominator: bottom };
}
