import { expect, it } from 'vitest';
import { issueToken } from '@/lib/server/auth/link-token';
import { sweep } from '@/lib/server/jobs/sweep';
import { throttle } from '@/lib/server/throttle';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';

const database = useDatabase();
const DAY_MS = 24 * 60 * 60 * 1_000;
const counts = async () => {
  const { Account, Session, Throttle, Token } = database().models;
  const [accounts, sessions, throttles, tokens] = await Promise.all([
    Account.count(),
    Session.count(),
    Throttle.count(),
    Token.count(),
  ]);
  return { accounts, sessions, throttles, tokens };
};

it('removes only what ended long ago, and sign-ups that nobody confirmed', async () => {
  const account = await makeAccount();
  await makeAccount({ confirmed: false });
  await signedIn(account.id);
  await issueToken(account.id, 'reset-password');
  await throttle('link:token', 'x');
  const now = Date.now();

  await sweep(new Date(now));
  expect(await counts()).toEqual({ accounts: 2, sessions: 1, throttles: 1, tokens: 1 });
  await sweep(new Date(now + DAY_MS));
  expect(await counts()).toEqual({ accounts: 2, sessions: 1, throttles: 0, tokens: 1 });
  await sweep(new Date(now + 31 * DAY_MS));
  expect(await counts()).toEqual({ accounts: 1, sessions: 1, throttles: 0, tokens: 0 });
  await sweep(new Date(now + 91 * DAY_MS));
  expect(await counts()).toEqual({ accounts: 1, sessions: 0, throttles: 0, tokens: 0 });
});
