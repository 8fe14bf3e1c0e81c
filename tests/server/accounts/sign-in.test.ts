import { beforeEach, describe, expect, it, vi } from 'vitest';
import { GET as authGet, POST as authPost } from '@/app/api/auth/[...nextauth]/route';
import { GET as listSessions } from '@/app/api/accounts/sessions/route';
import * as hashing from '@/lib/server/auth/password-hash';
import { limits } from '@/lib/server/throttle';
import { call, signInAs, signOutWith } from '../../support/account-calls';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { ownRequest } from '../../support/request';

const database = useDatabase();
const sessionsOf = (accountId: string) => database().models.Session.findAll({ where: { accountId } });

beforeEach(async () => {
  await database().models.Throttle.destroy({ where: {} });
});

describe('signing in', () => {
  it('opens a session and sets one cookie that scripts and other sites cannot use', async () => {
    const account = await makeAccount();
    const { status, headers, body, cookie } = await signInAs(account);
    expect(status).toBe(204);
    expect(body).toBeUndefined();
    const set = headers.getSetCookie().find((line) => line.startsWith('holdfast.sign-in='));
    expect(set).toMatch(/; HttpOnly/i);
    expect(set).toMatch(/; SameSite=Lax/i);
    expect(set).toMatch(/; Path=\//i);
    expect(set).not.toMatch(/; Secure/i);
    expect(await sessionsOf(account.id)).toHaveLength(1);
    const { body: listed } = await call(listSessions, ownRequest('/api/accounts/sessions', { cookie }));
    expect(listed?.sessions).toMatchObject([{ device: 'Firefox on an Android phone', current: true }]);
  });

  it('reads the address in any case and the password in any normal form', async () => {
    const account = await makeAccount({ email: 'case@example.org', password: 'caf\u00e9 au lait, twice' });
    const { status } = await signInAs({ email: ' Case@Example.ORG', password: 'cafe\u0301 au lait, twice' });
    expect([status, account.email]).toEqual([204, 'case@example.org']);
  });

  it('answers alike, with one Argon2 verification each, for a wrong password, an unknown address and an unconfirmed one', async () => {
    const known = await makeAccount();
    const unconfirmed = await makeAccount({ confirmed: false });
    const verify = vi.spyOn(hashing, 'verifyPassword');
    const answers = [];
    for (const credentials of [
      { email: known.email, password: 'not the password' },
      { email: 'unknown@example.org', password: 'not the password' },
      { email: unconfirmed.email, password: unconfirmed.password },
    ]) {
      verify.mockClear();
      const { status, body, headers } = await signInAs(credentials);
      answers.push({ status, body, cookies: headers.getSetCookie(), verifications: verify.mock.calls.length });
    }
    verify.mockRestore();
    expect(answers[0]).toMatchObject({ status: 401, body: { code: 'sign-in-failed' }, cookies: [], verifications: 1 });
    expect(answers[1]).toEqual(answers[0]);
    expect(answers[2]).toEqual(answers[0]);
  });

  it('does the whole work of a verification where there is no hash', async () => {
    await hashing.verifyPassword(null, 'warms up the hash that fits nobody');
    const started = performance.now();
    expect(await hashing.verifyPassword(null, 'not the password')).toBe(false);
    // 19 MiB filled twice: no machine does that in a millisecond, and a shortcut would.
    expect(performance.now() - started).toBeGreaterThan(1);
  });

  it('counts tries by account and network address, says how long to wait, and forgets them once it succeeds', async () => {
    const account = await makeAccount();
    const { limit } = limits['sign-in:account-from-address'];
    const wrong = { email: account.email, password: 'not the password' };
    for (let index = 0; index < limit - 1; index += 1) expect((await signInAs(wrong)).status).toBe(401);
    expect((await signInAs(account)).status).toBe(204);
    for (let index = 0; index < limit; index += 1) expect((await signInAs(wrong)).status).toBe(401);
    const { status, body, headers } = await signInAs(account);
    expect([status, body?.code]).toEqual([429, 'too-many']);
    expect(Number(headers.get('retry-after'))).toBeGreaterThan(60);
  });

  it('counts tries at an unknown address just so', async () => {
    const { limit } = limits['sign-in:account-from-address'];
    const wrong = { email: 'unknown@example.org', password: 'not the password' };
    for (let index = 0; index < limit; index += 1) await signInAs(wrong);
    expect((await signInAs(wrong)).status).toBe(429);
  });

  it('refuses a csrf token that is not the one in the cookie', async () => {
    const account = await makeAccount();
    const body = { email: account.email, password: account.password, csrfToken: 'a'.repeat(64) };
    const request = ownRequest('/api/auth/callback/credentials', { method: 'POST', body });
    const answer = await call(authPost, request, { nextauth: ['callback', 'credentials'] });
    expect([answer.status, answer.body?.code]).toEqual([401, 'sign-in-failed']);
    expect(await sessionsOf(account.id)).toHaveLength(0);
  });

  it('ends the sign-in that it takes the place of in the same browser', async () => {
    const account = await makeAccount();
    const first = await signInAs(account);
    await signInAs({ ...account, cookie: first.cookie });
    const rows = await sessionsOf(account.id);
    expect(rows.filter((row) => row.revokedAt === null)).toHaveLength(1);
    expect(rows).toHaveLength(2);
  });

  it('does nothing else that the sign-in library could do by POST', async () => {
    for (const nextauth of [['signin', 'credentials'], ['session'], ['_log'], ['callback', 'other']]) {
      const request = ownRequest(`/api/auth/${nextauth.join('/')}`, { method: 'POST', body: {} });
      expect((await call(authPost, request, { nextauth })).status).toBe(404);
    }
  });
});

describe('the session', () => {
  const session = (cookie: string) =>
    call(authGet, ownRequest('/api/auth/session', { cookie }), { nextauth: ['session'] });

  it('is told to the page while its row stands, and no longer', async () => {
    const account = await makeAccount({ name: 'Ada' });
    const { cookie, sessionId } = await signedIn(account.id);
    expect((await session(cookie)).body).toMatchObject({ user: { name: 'Ada', email: account.email } });
    await database().models.Session.update({ revokedAt: new Date() }, { where: { id: sessionId } });
    expect((await session(cookie)).body).toEqual({});
  });

  it('is kept from running out by being used, but not for ever', async () => {
    const { findStanding } = await import('@/lib/server/auth/read-session');
    const account = await makeAccount();
    const { sessionId: sid } = await signedIn(account.id);
    const claims = { sub: account.id, sid };
    const day = 24 * 60 * 60 * 1_000;
    const start = Date.now();
    let last: Date | undefined;
    for (let days = 0; days < 500; days += 50) {
      const standing = await findStanding(claims, new Date(start + days * day));
      if (!standing) break;
      last = new Date(start + days * day);
    }
    const used = ((last?.getTime() ?? 0) - start) / day;
    expect(used).toBeGreaterThanOrEqual(300);
    expect(used).toBeLessThanOrEqual(365);
  });

  it('runs out when unused for longer than its idle time', async () => {
    const { findStanding } = await import('@/lib/server/auth/read-session');
    const account = await makeAccount();
    const { sessionId: sid } = await signedIn(account.id);
    const later = new Date(Date.now() + 61 * 24 * 60 * 60 * 1_000);
    expect(await findStanding({ sub: account.id, sid }, later)).toBeNull();
  });
});

describe('signing out', () => {
  it('ends the session and takes the cookie away', async () => {
    const account = await makeAccount();
    const { cookie } = await signInAs(account);
    const out = await signOutWith(cookie);
    expect(out.status).toBe(204);
    expect(out.cookie).not.toContain('holdfast.sign-in');
    expect((await call(listSessions, ownRequest('/api/accounts/sessions', { cookie }))).status).toBe(401);
    const [row] = await sessionsOf(account.id);
    expect(row?.revokedAt).not.toBeNull();
  });
});
