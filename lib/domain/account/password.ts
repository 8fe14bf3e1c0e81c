import { z } from 'zod';
import { commonPasswords } from './common-passwords';

/** Shortest and longest password, in characters as people count them. */
export const MIN_PASSWORD = 10;
export const MAX_PASSWORD = 200;

const runs = [
  'abcdefghijklmnopqrstuvwxyz',
  '01234567890',
  'qwertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  'azertyuiop',
  'qwertzuiop',
];
const commonWords = [
  'password',
  'passwort',
  'motdepasse',
  'qwerty',
  'welcome',
  'letmein',
  'iloveyou',
  'admin',
  'holdfast',
];

/**
 * The form in which a password is judged, hashed and compared: NFKC, so that one typed on a phone and on a keyboard is
 * the same (NIST SP 800-63B, 5.1.1.2).
 */
export function normalisePassword(password: string): string {
  return password.normalize('NFKC');
}

/**
 * Whether a password is among the first that anyone would try: on the list, one or two characters over and over, a run
 * along the alphabet or the keyboard, or a worn word with nothing but digits and marks about it.
 */
export function isCommonPassword(password: string): boolean {
  const plain = normalisePassword(password).toLowerCase();
  const letters = plain.replace(/[^\p{L}]/gu, '');
  return (
    commonPasswords.has(plain) ||
    new Set(plain).size <= 2 ||
    isRun(plain) ||
    repeats(plain) ||
    commonWords.some((word) => letters === word || letters === word + word)
  );
}

function isRun(plain: string): boolean {
  return runs.some((run) => {
    const there = run + run + run;
    const back = [...there].reverse().join('');
    return there.includes(plain) || back.includes(plain);
  });
}

/** Up to four characters again and again: `abcabcabcabc`. */
function repeats(plain: string): boolean {
  return [3, 4].some((period) => [...plain].every((character, index) => character === plain[index % period]));
}

/** A password that someone chooses. What is typed to prove who one is needs only {@link typedPassword}. */
export const newPassword = z
  .string()
  .refine((value) => [...normalisePassword(value)].length >= MIN_PASSWORD, {
    error: `Too short: at least ${MIN_PASSWORD} characters.`,
    abort: true,
  })
  .refine((value) => [...normalisePassword(value)].length <= MAX_PASSWORD, {
    error: `Too long: at most ${MAX_PASSWORD} characters.`,
    abort: true,
  })
  .refine((value) => !isCommonPassword(value), {
    error: 'That is one of the first passwords anyone would try. Choose another.',
  });

/** A password as typed at sign-in: judged by the hash alone. */
export const typedPassword = z
  .string()
  .min(1, 'Put in your password.')
  .max(4 * MAX_PASSWORD, 'That is longer than any password here.');
