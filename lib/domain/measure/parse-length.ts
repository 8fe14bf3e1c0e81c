import { isLength, MAX_LENGTH, UNITS_PER_FOOT, UNITS_PER_INCH, UNITS_PER_MM, type Length } from './length';

export type LengthProblem =
  | 'empty'
  | 'not-a-length'
  | 'zero-denominator'
  | 'improper-fraction'
  | 'ambiguous-comma'
  | 'mixed-units'
  | 'negative'
  | 'too-long'
  | 'inches-past-a-foot';

export type ParsedLength =
  { ok: true; length: Length; rounded: boolean } | { ok: false; code: LengthProblem; message: string };

export interface ParseOptions {
  /** Unit of a bare number. */
  defaultUnit: 'in' | 'mm';
  /** Offsets may lie on either side of a datum; sizes may not. */
  allowNegative?: boolean;
}

const UNIT_SIZE: Record<string, number> = {
  '"': UNITS_PER_INCH,
  in: UNITS_PER_INCH,
  "'": UNITS_PER_FOOT,
  ft: UNITS_PER_FOOT,
  mm: UNITS_PER_MM,
  cm: UNITS_PER_MM * 10,
  m: UNITS_PER_MM * 1000,
};

const WORDS: [RegExp, string][] = [
  [/\b(?:inches|inch|ins)\b/g, 'in'],
  [/\b(?:feet|foot)\b/g, 'ft'],
  [/\b(?:millimet(?:re|er)s?)\b/g, 'mm'],
  [/\b(?:centimet(?:re|er)s?)\b/g, 'cm'],
  [/\b(?:met(?:re|er)s?)\b/g, 'm'],
];

/** More characters than any length needs; what is pasted by mistake is refused whole, never read in part. */
const MAX_CHARACTERS = 120;

const VULGAR = '¼½¾⅐⅑⅒⅓⅔⅕⅖⅗⅘⅙⅚⅛⅜⅝⅞↉';

/** A number written one way: whole with fraction, fraction, decimal or whole; then its unit if any. */
const TERM =
  /^\s*(?:(\d+)\s*(?:-\s*|\s)\s*(\d+)\s*\/\s*(\d+)|(\d+)\s*\/\s*(\d+)|(\d+[.,]\d*|[.,]\d+)|(\d+))\s*("|'|in\b|ft\b|mm\b|cm\b|m\b)?\s*-?/;

/**
 * Reads a length as people write it: `3 1/4`, `3-1/4"`, `3.25`, `8' 2 1/2"`, `8 ft`, `¾`, `82.5 mm`, `2 m`, `1 m 20 cm`;
 * a comma may stand for the decimal point where it cannot be read as one that parts thousands. A bare number is in `defaultUnit`; a bare number after feet is inches.
 *
 * @returns the length in 1/640 mm and whether it had to be rounded to the nearest unit (0.8 µm), or what is wrong with it
 */
export function parseLength(text: string, { defaultUnit, allowNegative = false }: ParseOptions): ParsedLength {
  const shown = text.trim().slice(0, 40);
  const no = (code: LengthProblem, why: string): ParsedLength => ({
    ok: false,
    code,
    message: `${shown} is not a length: ${why}.`,
  });
  if (text.trim() === '')
    return { ok: false, code: 'empty', message: 'Put in a length, for example 3 1/4 or 82.5 mm.' };
  if (text.trim().length > MAX_CHARACTERS) return no('not-a-length', 'it is too much text for one length');

  let rest = normalise(text);
  const negative = rest.startsWith('-');
  if (negative) rest = rest.slice(1).trim();
  if (negative && !allowNegative) return no('negative', 'it is below zero');

  let sum = new Ratio(0n, 1n);
  let system: 'imperial' | 'metric' | null = null;
  let previousUnit: number | null = null;
  for (let terms = 0; rest !== ''; terms += 1) {
    const match = TERM.exec(rest);
    if (!match || terms === 3) return no('not-a-length', 'write it like 3 1/4, 8\' 2 1/2" or 82.5 mm');
    rest = rest.slice(match[0].length).trim();
    const number = readNumber(match);
    if (number === null) return no('zero-denominator', 'a fraction cannot have 0 below the line');
    if (match[1] !== undefined && BigInt(match[2]!) >= BigInt(match[3]!))
      return no('improper-fraction', 'the fraction after a whole number stays below 1');
    // 3,250 is three thousand and more to one reader and three and a quarter to the next.
    if (match[6] !== undefined && /^[1-9]\d{0,2},\d{3}$/.test(match[6]))
      return no('ambiguous-comma', 'the comma could be a decimal point or part a thousand; use a point, or no comma');
    const unit: string | null =
      match[8] ?? (previousUnit === UNITS_PER_FOOT ? 'in' : previousUnit === null ? defaultUnit : null);
    if (unit === null) return no('not-a-length', 'say the unit of each number');
    const size: number = UNIT_SIZE[unit]!;
    const termSystem = size === UNITS_PER_INCH || size === UNITS_PER_FOOT ? 'imperial' : 'metric';
    if (system !== null && system !== termSystem)
      return no('mixed-units', 'inches and millimetres are mixed; use one of them');
    if (previousUnit !== null && size >= previousUnit)
      return no('not-a-length', 'the larger unit comes first, each once');
    if (previousUnit === UNITS_PER_FOOT && number.atLeast(12n)) {
      return no('inches-past-a-foot', 'the inches after feet stay below 12');
    }
    system = termSystem;
    previousUnit = size;
    sum = sum.plus(number.times(BigInt(size)));
  }

  const { value, exact } = sum.round();
  const length = Number(value) * (negative ? -1 : 1);
  if (!isLength(length)) return no('too-long', `the longest is ${MAX_LENGTH / UNITS_PER_MM / 1000} m`);
  return { ok: true, length: length === 0 ? 0 : length, rounded: !exact };
}

function normalise(text: string): string {
  let clean = text.trim().toLowerCase();
  for (const glyph of VULGAR) {
    if (clean.includes(glyph)) clean = clean.replaceAll(glyph, ` ${glyph.normalize('NFKC').replace('\u2044', '/')} `);
  }
  for (const [word, unit] of WORDS) clean = clean.replace(word, unit);
  return clean
    .replace(/[\u2044\u2215]/g, '/')
    .replace(/''|[″”“]/g, '"')
    .replace(/[′’‘]/g, "'")
    .replace(/[−–—\u2010\u2011]/g, '-')
    .replace(/[\u00a0\u2009\u202f]/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}

function readNumber(match: RegExpExecArray): Ratio | null {
  const [, whole, top, bottom, plainTop, plainBottom, decimal, integer] = match;
  if (whole !== undefined) return fraction(BigInt(whole), top!, bottom!);
  if (plainTop !== undefined) return fraction(0n, plainTop, plainBottom!);
  if (decimal !== undefined) {
    const [before = '', after = ''] = decimal.split(/[.,]/);
    return new Ratio(BigInt(`${before}${after}` || '0'), 10n ** BigInt(after.length));
  }
  return new Ratio(BigInt(integer!), 1n);
}

function fraction(whole: bigint, top: string, bottom: string): Ratio | null {
  const denominator = BigInt(bottom);
  return denominator === 0n ? null : new Ratio(whole * denominator + BigInt(top), denominator);
}

/** Exact ratio of two whole numbers, neither negative; decimals and odd denominators add up without error. */
class Ratio {
  constructor(
    private readonly top: bigint,
    private readonly bottom: bigint,
  ) {}

  plus(other: Ratio): Ratio {
    return new Ratio(this.top * other.bottom + other.top * this.bottom, this.bottom * other.bottom);
  }

  times(factor: bigint): Ratio {
    return new Ratio(this.top * factor, this.bottom);
  }

  atLeast(value: bigint): boolean {
    return this.top >= value * this.bottom;
  }

  /** Nearest whole number, halves up, and whether it was whole. */
  round(): { value: bigint; exact: boolean } {
    return { value: (2n * this.top + this.bottom) / (2n * this.bottom), exact: this.top % this.bottom === 0n };
  }
}
