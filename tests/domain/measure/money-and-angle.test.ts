import { describe, expect, it } from 'vitest';
import { addMoney, formatAngle, formatMoney, parseAngle } from '@/lib/domain/measure';

describe('money', () => {
  it('adds whole minor units', () => {
    expect(
      addMoney(
        [
          { minor: 1999, currency: 'USD' },
          { minor: 1, currency: 'USD' },
        ],
        'USD',
      ),
    ).toEqual({ minor: 2000, currency: 'USD' });
  });

  it('refuses to add two currencies, naming both', () => {
    expect(() => addMoney([{ minor: 1, currency: 'EUR' }], 'USD')).toThrow(/EUR cannot be added to USD/);
  });

  it('is shown with the decimals of its currency', () => {
    expect(formatMoney({ minor: 123_450, currency: 'USD' }, 'en-US')).toBe('$1,234.50');
    expect(formatMoney({ minor: 1234, currency: 'JPY' }, 'en-US')).toBe('¥1,234');
  });
});

describe('angles', () => {
  it.each([
    ['22.5', 2250],
    ['22 1/2°', 2250],
    ['22° 30′', 2250],
    ['-10', -1000],
    ['360°', 36_000],
  ])('reads %s', (text, centiDeg) => expect(parseAngle(text)).toEqual({ ok: true, centiDeg }));

  it.each(['', 'square', '361', '22° 60′', '1/0'])('refuses %j', (text) =>
    expect(parseAngle(text)).toMatchObject({ ok: false, code: 'not-an-angle' }),
  );

  it('shows no more decimals than there are', () => {
    expect([formatAngle(2250), formatAngle(-9000), formatAngle(1)]).toEqual(['22.5°', '−90°', '0.01°']);
  });
});
