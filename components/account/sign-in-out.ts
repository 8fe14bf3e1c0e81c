import { z } from 'zod';
import { nothing, send, type Answer } from './send';

const csrfAnswer = z.object({ csrfToken: z.string() });

/** Signs in on this browser; the cookie is set by the answer. */
export async function signIn(credentials: { email: string; password: string }): Promise<Answer<undefined>> {
  const csrf = await send('GET', '/api/auth/csrf', csrfAnswer);
  if (!csrf.ok) return csrf;
  return send('POST', '/api/auth/callback/credentials', nothing, { ...credentials, csrfToken: csrf.value.csrfToken });
}

/**
 * Ends this browser's sign-in. It touches nothing that is held on this device: ask first what is to become of that.
 */
export async function signOut(): Promise<Answer<undefined>> {
  const csrf = await send('GET', '/api/auth/csrf', csrfAnswer);
  if (!csrf.ok) return csrf;
  return send('POST', '/api/auth/signout', nothing, { csrfToken: csrf.value.csrfToken });
}
