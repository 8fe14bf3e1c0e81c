import 'server-only';
import { createHash } from 'node:crypto';
import { clientAddress } from '../request/client-address';
import { throttle } from '../throttle';

/**
 * Counts a letter to an address, whether or not it will be written, so that nobody's letter box is filled from here and
 * the count tells nothing about who has an account.
 *
 * @throws AppError `too-many`
 */
export async function throttleLetter(request: Request, email: string): Promise<void> {
  await throttle('letter:address', clientAddress(request));
  await throttle('letter:account', email);
}

/**
 * Counts the use of a link: by link, since some ask for a password, and by network address.
 *
 * @throws AppError `too-many`
 */
export async function throttleLink(request: Request, secret: string): Promise<void> {
  await throttle('link:address', clientAddress(request));
  await throttle('link:token', createHash('sha256').update(secret).digest('hex'));
}
