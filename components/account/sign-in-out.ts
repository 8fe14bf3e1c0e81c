import { z } from 'zod';
import { enterAccount, isSignOutOwed, saveSignOutOwed } from '@/lib/store/device-database';
import { nothing, send, type Answer } from './send';

const meAnswer = z.object({ accountId: z.string(), name: z.string(), email: z.string() });
const csrfAnswer = z.object({ csrfToken: z.string() });

/** Signs in on this browser, whose bench is that account's from now on; the cookie is set by the answer. */
export async function signIn(credentials: { email: string; password: string }): Promise<Answer<undefined>> {
  const csrf = await send('GET', '/api/auth/csrf', csrfAnswer);
  if (!csrf.ok) return csrf;
  const answer = await send('POST', '/api/auth/callback/credentials', nothing, {
    ...credentials,
    csrfToken: csrf.value.csrfToken,
  });
  if (!answer.ok) return answer;
  // The sign-in that was to be ended is gone: this one took its place and stays.
  if (await isSignOutOwed()) await saveSignOutOwed(false);
  // The bench of whoever was here before must not open once more; with no answer the bench asks again itself.
  const me = await send('GET', '/api/me', meAnswer);
  if (me.ok) await enterAccount(me.value, Date.now());
  return answer;
}

/**
 * Ends this browser's sign-in. It touches nothing that is held on this device: ask first what is to become of that.
 */
export async function signOut(): Promise<Answer<undefined>> {
  const csrf = await send('GET', '/api/auth/csrf', csrfAnswer);
  if (!csrf.ok) return csrf;
  return send('POST', '/api/auth/signout', nothing, { csrfToken: csrf.value.csrfToken });
}

/**
 * Ends, now that there is a signal, a sign-in that was left with none.
 *
 * @returns `none` when nothing was to be ended, `owed` when the server still gave no answer
 */
export async function endOwedSignOut(): Promise<'none' | 'ended' | 'owed'> {
  if (!(await isSignOutOwed())) return 'none';
  const answer = await signOut();
  if (!answer.ok && answer.code !== 'signed-out') return 'owed';
  await saveSignOutOwed(false);
  return 'ended';
}
