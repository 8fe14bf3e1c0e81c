import 'server-only';
import { z } from 'zod';
import { signInForm } from '@/lib/domain/account/forms';
import { env } from '../env';
import { AppError } from '../errors';
import { clientAddress } from '../request/client-address';
import { forgetTries, throttle } from '../throttle';
import { callNextAuth, setCookies, type AuthAnswer } from './call-next-auth';
import { readClaims } from './session-cookie';
import { revokeSession } from './sessions';

/** Sent back with every sign-in and sign-out, against the cookie that came with it. */
const csrfToken = z.string().regex(/^[0-9a-f]{64}$/);
export const signInRequest = signInForm.extend({ csrfToken });
export const signOutRequest = z.strictObject({ csrfToken });

/**
 * Signs in, with the tries counted by account and by network address.
 *
 * @returns the answer that sets the cookie
 * @throws AppError `sign-in-failed`, the same for every reason, or `too-many`
 */
export async function signIn(request: Request, body: z.output<typeof signInRequest>): Promise<Response> {
  const address = clientAddress(request);
  const accountFromAddress = `${body.email} ${address}`;
  await throttle('sign-in:address', address);
  await throttle('sign-in:account-from-address', accountFromAddress);
  await throttle('sign-in:account', body.email);
  const answer = await callNextAuth(request, ['callback', 'credentials'], body);
  if (isStale(answer)) {
    throw new AppError(
      'sign-in-failed',
      'This page was open too long, or cookies are blocked. Reload it and try again.',
    );
  }
  if (answer.status !== 200) {
    const reason = errorOf(answer);
    if (reason !== 'CredentialsSignin') throw new Error(`The sign-in library could not sign in: ${reason}`);
    throw new AppError(
      'sign-in-failed',
      'That address and password do not open an account. If you have just signed up, use the link in the letter first.',
    );
  }
  await forgetTries('sign-in:account-from-address', accountFromAddress);
  return new Response(null, { status: 204, headers: setCookies(answer.headers) });
}

/** Signs out: the sign-in's row ends and the cookie goes. */
export async function signOut(request: Request, body: z.output<typeof signOutRequest>): Promise<Response> {
  const answer = await callNextAuth(request, ['signout'], body);
  if (isStale(answer)) {
    throw new AppError('sign-in-failed', 'This page was open too long. Reload it and sign out again.');
  }
  const claims = await readClaims(request.headers.get('cookie'));
  if (claims) await revokeSession(claims.sub, claims.sid);
  return new Response(null, { status: 204, headers: setCookies(answer.headers) });
}

/** The library answers a csrf token that does not fit by naming a page that says so. */
function isStale(answer: AuthAnswer): boolean {
  return redirectOf(answer).searchParams.get('csrf') === 'true';
}

/** Why the library refused: its word for a wrong address or password, or the message of what went wrong. */
function errorOf(answer: AuthAnswer): string {
  return redirectOf(answer).searchParams.get('error') ?? `status ${answer.status}`;
}

function redirectOf({ body }: AuthAnswer): URL {
  const { url } = (body ?? {}) as { url?: string };
  return new URL(url ?? '/', env().NEXTAUTH_URL);
}
