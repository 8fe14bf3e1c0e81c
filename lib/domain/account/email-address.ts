import { z } from 'zod';

/** Longest address that mail can carry (RFC 5321, 4.5.3.1.3, less the angle brackets). */
const MAX_EMAIL = 254;

/** An e-mail address, in lower case: two that differ only in case are one account. */
export const emailAddress = z
  .string()
  .trim()
  .toLowerCase()
  .min(1, 'Put in your e-mail address.')
  .max(MAX_EMAIL, `An e-mail address has at most ${MAX_EMAIL} characters.`)
  .pipe(z.email('This is not an e-mail address. It looks like name@example.org.'));

/** An address that tells its owner which one is meant, and others little: `a…@example.org`. */
export function maskEmail(email: string): string {
  const at = email.lastIndexOf('@');
  return `${email.slice(0, 1)}…${email.slice(at)}`;
}
