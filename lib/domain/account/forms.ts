import { z } from 'zod';
import { emailAddress } from './email-address';
import { newPassword, typedPassword } from './password';

/** What people fill in about their account. The page and the server check by the same schema. */

/** The secret of a link in a letter: 32 random bytes in base64url. */
const linkToken = z.string().regex(/^[A-Za-z0-9_-]{43}$/, 'This link is not whole. Open it again from the letter.');

const personName = z
  .string()
  .trim()
  .min(1, 'Put in the name that your crew sees.')
  .max(80, 'At most 80 characters.')
  // Control and direction characters could make a name look like another, or turn a page's text round.
  .regex(/^[^\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]*$/u, 'Letters, digits and punctuation only.');

export const signUpForm = z.strictObject({ name: personName, email: emailAddress, password: newPassword });
export const signInForm = z.strictObject({ email: emailAddress, password: typedPassword });
export const confirmForm = z.strictObject({ token: linkToken, password: typedPassword });
export const emailForm = z.strictObject({ email: emailAddress });
export const resetForm = z.strictObject({ token: linkToken, password: newPassword });
export const nameForm = z.strictObject({ name: personName });
export const changePasswordForm = z.strictObject({ present: typedPassword, password: newPassword });
export const changeEmailForm = z.strictObject({ email: emailAddress, present: typedPassword });
export const confirmEmailForm = z.strictObject({ token: linkToken });
