import { useOrderedLetters } from '../../support/ordered-letters';
import { beforeEach, describe, expect, it } from 'vitest';
import { POST as forgotten } from '@/app/api/accounts/forgotten/route';
import { PUT as changePassword } from '@/app/api/accounts/password/route';
import { POST as reset } from '@/app/api/accounts/reset/route';
import { GET as listSessions } from '@/app/api/accounts/sessions/route';
import { linkLifeMs } from '@/lib/server/auth/link-token';
import { limits } from '@/lib/server/throttle';
import { call, signInAs } from '../../support/account-calls';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { secretIn } from '../../support/letter-box';
import { ownRequest } from '../../support/request';

const letters = useOrderedLetters();
const database = useDatabase();
const NEW = 'four clamps are better';

const post = (handle: typeof reset, body: unknown) => call(handle, ownRequest('/api/x', { method: 'POST', body }));
const change = (cookie: string, body: unknown) =>
  call(changePassword, ownRequest('/api/accounts/password', { method: 'PUT', body, cookie }));
const stands = async (cookie: string) =>
  (await call(listSessions, ownRequest('/api/accounts/sessions', { cookie }))).status === 200;
const linkFor = async (email: string) => {
  await post(forgotten, { email });
  const [letter] = await letters.write();
  return secretIn(letter?.letter.text ?? '');
};

beforeEach(async () => {
  await database().models.Throttle.destroy({ where: {} });
});

describe('a forgotten password', () => {
  it('is answered alike for a known and an unknown address, before anything is looked up', async () => {
    const known = await makeAccount();
    const answers = [];
    for (const email of [known.email, 'unknown@example.org']) {
      const { status, body } = await post(forgotten, { email });
      answers.push({ status, body, ordered: letters.orders.length, tokens: await database().models.Token.count() });
    }
    expect(answers).toEqual([
      { status: 200, body: { sent: true }, ordered: 1, tokens: 0 },
      { status: 200, body: { sent: true }, ordered: 2, tokens: 0 },
    ]);
    const written = await letters.write();
    expect(written.map(({ to }) => to)).toEqual([known.email]);
  });

  it('is set anew by the link, once; every sign-in ends and a notice goes out', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const token = await linkFor(account.email);
    expect(await post(reset, { token, password: NEW })).toMatchObject({ status: 200, body: { email: account.email } });
    expect(await stands(cookie)).toBe(false);
    expect((await signInAs({ ...account, password: account.password })).status).toBe(401);
    expect((await signInAs({ ...account, password: NEW })).status).toBe(204);
    expect((await letters.write()).map(({ to, letter }) => [to, letter.subject])).toEqual([
      [account.email, 'Your password at Holdfast was changed'],
    ]);
    expect(await post(reset, { token, password: NEW })).toMatchObject({ status: 410, body: { code: 'link-spent' } });
  });

  it('lets one of two through that use the link at the same moment', async () => {
    const token = await linkFor((await makeAccount()).email);
    const answers = await Promise.all([1, 2].map((n) => post(reset, { token, password: `${NEW} ${n}` })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('ends the other links of the account with it', async () => {
    const account = await makeAccount();
    const first = await linkFor(account.email);
    const second = await linkFor(account.email);
    expect((await post(reset, { token: second, password: NEW })).status).toBe(200);
    expect((await post(reset, { token: first, password: NEW })).status).toBe(410);
  });

  it('is not set by a link that has run out after an hour, or by one for another purpose', async () => {
    expect(linkLifeMs['reset-password']).toBe(60 * 60 * 1_000);
    const account = await makeAccount();
    const token = await linkFor(account.email);
    await database().models.Token.update({ expiresAt: new Date(Date.now() - 1) }, { where: { accountId: account.id } });
    expect((await post(reset, { token, password: NEW })).status).toBe(410);
    const other = await linkFor(account.email);
    await database().models.Token.update({ purpose: 'confirm-email' }, { where: { accountId: account.id } });
    expect((await post(reset, { token: other, password: NEW })).status).toBe(410);
  });

  it('confirms an address that was not yet confirmed, since the letter was read', async () => {
    const account = await makeAccount({ confirmed: false });
    await post(reset, { token: await linkFor(account.email), password: NEW });
    expect((await signInAs({ ...account, password: NEW })).status).toBe(204);
  });
});

describe('a change of password', () => {
  it('needs the present one, ends the other sign-ins, keeps this one, and sends a notice', async () => {
    const account = await makeAccount();
    const here = await signedIn(account.id);
    const elsewhere = await signedIn(account.id);
    const wrong = await change(here.cookie, { present: 'not the password', password: NEW });
    expect(wrong).toMatchObject({ status: 403, body: { code: 'wrong-password', fields: [{ path: 'present' }] } });
    expect(await stands(elsewhere.cookie)).toBe(true);

    expect((await change(here.cookie, { present: account.password, password: NEW })).status).toBe(200);
    expect(await stands(here.cookie)).toBe(true);
    expect(await stands(elsewhere.cookie)).toBe(false);
    expect((await signInAs({ ...account, password: NEW })).status).toBe(204);
    expect((await letters.write()).map(({ to }) => to)).toEqual([account.email]);
  });

  it('voids a link for a new password that is still out', async () => {
    const account = await makeAccount();
    const token = await linkFor(account.email);
    await change((await signedIn(account.id)).cookie, { present: account.password, password: NEW });
    expect((await post(reset, { token, password: 'yet another password' })).status).toBe(410);
  });

  it('counts wrong tries by account', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const { limit } = limits['password:account'];
    for (let index = 0; index < limit; index += 1) {
      expect((await change(cookie, { present: 'not the password', password: NEW })).status).toBe(403);
    }
    expect((await change(cookie, { present: account.password, password: NEW })).status).toBe(429);
  });

  it('needs a sign-in', async () => {
    expect((await change('', { present: 'x', password: NEW })).status).toBe(401);
  });
});
