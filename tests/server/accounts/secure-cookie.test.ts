import { beforeAll, expect, it } from 'vitest';
import { GET as listSessions } from '@/app/api/accounts/sessions/route';
import { call, signInAs } from '../../support/account-calls';
import { makeAccount } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { ownRequest } from '../../support/request';

beforeAll(() => {
  process.env.NEXTAUTH_URL = 'https://holdfast.example';
});
useDatabase();

it('where the site is reached by https, the sign-in cookie travels by https alone and is bound to the host', async () => {
  const account = await makeAccount();
  const { status, headers, cookie } = await signInAs(account);
  expect(status).toBe(204);
  const set = headers.getSetCookie().find((line) => line.startsWith('__Host-holdfast.sign-in='));
  expect(set).toMatch(/; Secure/i);
  expect(set).toMatch(/; HttpOnly/i);
  expect(set).toMatch(/; Path=\/(;|$)/i);
  expect(set).not.toMatch(/; Domain/i);
  expect((await call(listSessions, ownRequest('/api/accounts/sessions', { cookie }))).status).toBe(200);
});
