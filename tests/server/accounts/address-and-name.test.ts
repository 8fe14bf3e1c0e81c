import { useOrderedLetters } from '../../support/ordered-letters';
import { beforeEach, describe, expect, it } from 'vitest';
import { PUT as changeEmail } from '@/app/api/accounts/email/route';
import { PUT as changeName } from '@/app/api/accounts/name/route';
import { POST as confirmNew } from '@/app/api/accounts/new-address/route';
import { PUT as changePassword } from '@/app/api/accounts/password/route';
import { call, signInAs } from '../../support/account-calls';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { secretIn } from '../../support/letter-box';
import { ownRequest } from '../../support/request';

const letters = useOrderedLetters();
const database = useDatabase();

const put = (handle: typeof changeEmail, cookie: string, body: unknown) =>
  call(handle, ownRequest('/api/x', { method: 'PUT', body, cookie }));
const confirm = (token: string) => call(confirmNew, ownRequest('/api/x', { method: 'POST', body: { token } }));

beforeEach(async () => {
  await database().models.Throttle.destroy({ where: {} });
});

describe('a change of address', () => {
  it('is confirmed at the new address and told to the old, before and after', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const asked = await put(changeEmail, cookie, { email: 'Moved@example.org', present: account.password });
    expect(asked).toMatchObject({ status: 200, body: { sent: true } });
    const written = await letters.write();
    expect(written.map(({ to }) => to)).toEqual(['moved@example.org', account.email]);
    expect(written[1]?.letter.text).toContain('m…@example.org');
    expect((await signInAs(account)).status).toBe(204);

    const token = secretIn(written[0]?.letter.text ?? '');
    expect(await confirm(token)).toMatchObject({ status: 200, body: { email: 'moved@example.org' } });
    expect((await signInAs({ ...account, email: 'moved@example.org' })).status).toBe(204);
    expect((await signInAs(account)).status).toBe(401);
    expect((await letters.write()).map(({ to, letter }) => [to, letter.subject])).toEqual([
      [account.email, 'Your address at Holdfast was changed'],
    ]);
    expect((await confirm(token)).status).toBe(410);
  });

  it('needs the password', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const answer = await put(changeEmail, cookie, { email: 'else@example.org', present: 'not the password' });
    expect(answer).toMatchObject({ status: 403, body: { code: 'wrong-password' } });
    expect(letters.orders).toEqual([]);
  });

  it('says nothing of who else has an account: the letter to that address does', async () => {
    const other = await makeAccount();
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const free = await put(changeEmail, cookie, { email: 'free@example.org', present: account.password });
    await letters.write();
    const taken = await put(changeEmail, cookie, { email: other.email, present: account.password });
    expect({ status: taken.status, body: taken.body }).toEqual({ status: free.status, body: free.body });
    const [letter] = await letters.write();
    expect([letter?.to, letter?.letter.subject]).toEqual([
      other.email,
      'This address already has an account at Holdfast',
    ]);
  });

  it('is not done where another account took the address in the meantime, and the link stays unused', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    await put(changeEmail, cookie, { email: 'contested@example.org', present: account.password });
    const [letter] = await letters.write();
    const rival = await makeAccount({ email: 'contested@example.org' });
    const token = secretIn(letter?.letter.text ?? '');
    expect(await confirm(token)).toMatchObject({ status: 409, body: { code: 'conflict' } });
    await database().models.Account.destroy({ where: { id: rival.id } });
    expect((await confirm(token)).status).toBe(200);
  });

  it('ends with a change of password, which its owner may have made because of the notice', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    await put(changeEmail, cookie, { email: 'thief@example.org', present: account.password });
    const [letter] = await letters.write();
    await put(changePassword, cookie, { present: account.password, password: 'four clamps are better' });
    expect((await confirm(secretIn(letter?.letter.text ?? ''))).status).toBe(410);
  });

  it('is refused for the address that one has', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    const answer = await put(changeEmail, cookie, { email: account.email, present: account.password });
    expect(answer).toMatchObject({ status: 422, body: { fields: [{ path: 'email' }] } });
  });
});

describe('a change of name', () => {
  it('is stored trimmed', async () => {
    const account = await makeAccount();
    const { cookie } = await signedIn(account.id);
    expect(await put(changeName, cookie, { name: '  Ada B ' })).toMatchObject({ status: 200, body: { name: 'Ada B' } });
    expect((await database().models.Account.findByPk(account.id))?.name).toBe('Ada B');
  });
});
