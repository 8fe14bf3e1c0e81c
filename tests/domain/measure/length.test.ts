import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatLength,
  MAX_LENGTH,
  parseLength,
  UNITS_PER_INCH,
  UNITS_PER_MM,
  type LengthStyle,
} from '@/lib/domain/measure';

const inches = (text: string) => parseLength(text, { defaultUnit: 'in' });
const mm = (text: string) => parseLength(text, { defaultUnit: 'mm' });
const inch = (n: number) => n * UNITS_PER_INCH;

describe('parseLength', () => {
  it.each([
    ['3 1/4', inch(3.25)],
    ['3-1/4"', inch(3.25)],
    ['3 - 1/4', inch(3.25)],
    ['3.25', inch(3.25)],
    ['3,25', inch(3.25)],
    ['0,125', inch(0.125)],
    ['1250,5 mm', 1250.5 * UNITS_PER_MM],
    ['5/4', inch(1.25)],
    ['64/256', inch(0.25)],
    ['3/5 mm', 384],
    ['.5', inch(0.5)],
    ['3.', inch(3)],
    ['8\' 2 1/2"', inch(98.5)],
    ['8′ 2 ½″', inch(98.5)],
    ["8'", inch(96)],
    ["8' 6", inch(102)],
    ['8 ft 6 in', inch(102)],
    ['8\'-6"', inch(102)],
    ['8 feet', inch(96)],
    ['¾', inch(0.75)],
    ['1¾', inch(1.75)],
    ['1 ¾ in', inch(1.75)],
    ['3 1\u20444', inch(3.25)],
    ['23/32', inch(23 / 32)],
    ['1/128', 127],
    ['0', 0],
    ['82.5 mm', 82.5 * UNITS_PER_MM],
    ['82,5mm', 82.5 * UNITS_PER_MM],
    ['8.25 cm', 82.5 * UNITS_PER_MM],
    ['2 m', 2000 * UNITS_PER_MM],
    ['1 m 20 cm', 1200 * UNITS_PER_MM],
    ['2 metres', 2000 * UNITS_PER_MM],
    ["3''", inch(3)],
  ])('reads %s', (text, length) => {
    expect(inches(text)).toEqual({ ok: true, length, rounded: false });
  });

  it('takes a bare number in the unit of the person', () => {
    expect(mm('18')).toEqual({ ok: true, length: 18 * UNITS_PER_MM, rounded: false });
    expect(inches('18')).toEqual({ ok: true, length: inch(18), rounded: false });
  });

  it('rounds to 1/640 mm and says so', () => {
    expect(inches('1/3')).toEqual({ ok: true, length: Math.round(UNITS_PER_INCH / 3), rounded: true });
    expect(mm('0.0001')).toEqual({ ok: true, length: 0, rounded: true });
  });

  it.each([
    ['', 'empty'],
    ['   ', 'empty'],
    ['3 1/0', 'zero-denominator'],
    ['board', 'not-a-length'],
    ['3 1/', 'not-a-length'],
    ['1.2.3', 'not-a-length'],
    ['3/4/5', 'not-a-length'],
    ['3 4', 'not-a-length'],
    ['1 cm 1 m', 'not-a-length'],
    ['2" 3"', 'not-a-length'],
    ['8\' 12"', 'inches-past-a-foot'],
    ['3 in 4 mm', 'mixed-units'],
    ['-3', 'negative'],
    ['101 m', 'too-long'],
    ['9'.repeat(60), 'too-long'],
    ['1e3', 'not-a-length'],
    ['3 parsecs', 'not-a-length'],
    ['3 5/4', 'improper-fraction'],
    ['3 4/4', 'improper-fraction'],
    ['1,250 mm', 'ambiguous-comma'],
    ['12,500', 'ambiguous-comma'],
    [`1 in${' '.repeat(200)}and more`, 'not-a-length'],
    ['8 in 2 ft', 'not-a-length'],
    ['3 //4', 'not-a-length'],
    ['in', 'not-a-length'],
  ])('refuses %j as %s, in a sentence', (text, code) => {
    const result = inches(text);
    expect(result).toMatchObject({ ok: false, code });
    expect(result.ok ? '' : result.message).toMatch(/\.$/);
  });

  it('says "3 1/0 is not a length"', () => {
    const result = inches('3 1/0');
    expect(result.ok ? '' : result.message).toContain('3 1/0 is not a length');
  });

  it('takes an offset below zero only where one is allowed', () => {
    expect(parseLength('-1 1/2', { defaultUnit: 'in', allowNegative: true })).toMatchObject({ length: -inch(1.5) });
    expect(parseLength('−1 1/2', { defaultUnit: 'in', allowNegative: true })).toMatchObject({ length: -inch(1.5) });
  });

  it('answers on any text whatever', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (text) => {
        const result = inches(text);
        if (result.ok) expect(Math.abs(result.length)).toBeLessThanOrEqual(MAX_LENGTH);
        else expect(result.message.length).toBeGreaterThan(10);
      }),
    );
  });
});

const styles: [string, LengthStyle, number][] = [
  ...([2, 4, 8, 16, 32, 64, 128] as const).flatMap((denominator): [string, LengthStyle, number][] => [
    [`1/${denominator} in`, { system: 'imperial', denominator }, UNITS_PER_INCH / denominator],
    [`feet and 1/${denominator} in`, { system: 'imperial', denominator, feet: true }, UNITS_PER_INCH / denominator],
  ]),
  ['0.1 mm', { system: 'metric', unit: 'mm', decimals: 1 }, 64],
  ['1 mm', { system: 'metric', unit: 'mm', decimals: 0 }, 640],
  ['0.1 cm', { system: 'metric', unit: 'cm', decimals: 1 }, 640],
  ['0.01 cm', { system: 'metric', unit: 'cm', decimals: 2 }, 64],
  ['0.001 m', { system: 'metric', unit: 'm', decimals: 3 }, 640],
  ['0.0001 m', { system: 'metric', unit: 'm', decimals: 4 }, 64],
];

describe.each(styles)('in divisions of %s', (_name, style, division) => {
  it('parse(format(x)) = x on the grid', () => {
    const most = Math.floor(MAX_LENGTH / division);
    fc.assert(
      fc.property(fc.integer({ min: -most, max: most }), (count) => {
        const length = count * division;
        const shown = formatLength(length, style);
        expect(shown.rounded).toBe(false);
        expect(parseLength(shown.text, { defaultUnit: 'in', allowNegative: true })).toEqual({
          ok: true,
          length: length === 0 ? 0 : length,
          rounded: false,
        });
      }),
    );
  });

  it('elsewhere is out by at most half a division, and says by how much', () => {
    fc.assert(
      fc.property(fc.integer({ min: -MAX_LENGTH + division, max: MAX_LENGTH - division }), (length) => {
        const shown = formatLength(length, style);
        const back = parseLength(shown.text, { defaultUnit: 'in', allowNegative: true });
        if (!back.ok) throw new Error(back.message);
        expect(Math.abs(back.length - length)).toBeLessThanOrEqual(division / 2);
        expect(shown.error).toBe(back.length - length);
        expect(shown.rounded).toBe(shown.error !== 0);
      }),
    );
  });
});

describe('formatLength', () => {
  it.each([
    [inch(43.5), { system: 'imperial', denominator: 16 }, '43 1/2″'],
    [inch(0.75), { system: 'imperial', denominator: 16 }, '3/4″'],
    [0, { system: 'imperial', denominator: 16 }, '0″'],
    [inch(98.5), { system: 'imperial', denominator: 16, feet: true }, '8′ 2 1/2″'],
    [inch(96), { system: 'imperial', denominator: 16, feet: true }, '8′ 0″'],
    [inch(11.999), { system: 'imperial', denominator: 8, feet: true }, '1′ 0″'],
    [-inch(1.5), { system: 'imperial', denominator: 8 }, '−1 1/2″'],
    [-1, { system: 'imperial', denominator: 8 }, '0″'],
    [18 * UNITS_PER_MM, { system: 'metric', unit: 'mm', decimals: 1 }, '18.0 mm'],
    [32, { system: 'metric', unit: 'mm', decimals: 1 }, '0.1 mm'],
    [1200 * UNITS_PER_MM, { system: 'metric', unit: 'm', decimals: 3 }, '1.200 m'],
  ] as [number, LengthStyle, string][])('%d, %j is %s', (length, style, text) => {
    expect(formatLength(length, style).text).toBe(text);
  });

  it('refuses decimals finer than its own grid', () => {
    expect(() => formatLength(640, { system: 'metric', unit: 'mm', decimals: 2 })).toThrow(/0 to 1 for mm, not 2/);
  });

  it('sums of inches and millimetres are exact', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 128 * 40 }), { maxLength: 30 }),
        fc.array(fc.integer({ min: 0, max: 10_000 }), { maxLength: 30 }),
        (inchParts, tenths) => {
          let sum = 0;
          for (const n of inchParts) sum += expectLength(inches(`${n}/128 in`));
          for (const n of tenths) sum += expectLength(mm(`${n / 10} mm`));
          const exact = inchParts.reduce((a, b) => a + b, 0) * 127 + tenths.reduce((a, b) => a + b, 0) * 64;
          expect(sum).toBe(exact);
        },
      ),
    );
  });
});

function expectLength(result: ReturnType<typeof parseLength>): number {
  if (!result.ok) throw new Error(result.message);
  expect(result.rounded).toBe(false);
  return result.length;
}
