import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isCommonPassword, newPassword, normalisePassword, typedPassword } from '@/lib/domain/account/password';

const messageFor = (password: string) => newPassword.safeParse(password).error?.issues.map(({ message }) => message);

describe('a password that someone chooses', () => {
  it.each(['three clamps and a caul', 'Stemmeisen-19!', 'ключ под ковриком', '夜中に木を削る音が好き', 'kx8#Lm2!qP'])(
    'may be %s',
    (password) => {
      expect(newPassword.safeParse(password).success).toBe(true);
    },
  );

  it('has 10 to 200 characters, counted as people count them', () => {
    expect(messageFor('ninechars')).toEqual([expect.stringContaining('at least 10')]);
    expect(messageFor('🪚🪵🔨🪛🪓')).toEqual([expect.stringContaining('at least 10')]);
    expect(messageFor('ab '.repeat(67))).toEqual([expect.stringContaining('at most 200')]);
    expect(newPassword.safeParse(`${'plane iron '.repeat(18)}xy`).success).toBe(true);
  });

  it.each([
    'password123',
    'PASSWORD123',
    'Password!!2026',
    'Welcome#2026',
    '1234567890',
    '0987654321',
    'qwertyuiop',
    'poiuytrewq',
    'abcdefghijk',
    'aaaaaaaaaaaa',
    'abababababab',
    'abcabcabcabc',
    'x1y2x1y2x1y2',
    'iloveyou2026',
    'holdfast 2026',
    'ｐａｓｓｗｏｒｄ１２３',
  ])('is not %s', (password) => {
    expect(messageFor(password)).toEqual([expect.stringContaining('first passwords anyone would try')]);
  });

  it('is judged alike however its characters were put together', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', minLength: 1, maxLength: 40 }), (text) => {
        for (const form of ['NFC', 'NFD'] as const) {
          expect(normalisePassword(text.normalize(form))).toBe(normalisePassword(text));
          expect(isCommonPassword(text.normalize(form))).toBe(isCommonPassword(text));
        }
      }),
    );
  });
});

it('a password as typed needs only be there', () => {
  expect(typedPassword.safeParse('short').success).toBe(true);
  expect(typedPassword.safeParse('').success).toBe(false);
});
