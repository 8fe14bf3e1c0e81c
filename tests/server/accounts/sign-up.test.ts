import { useOrderedLetters } from '../../support/ordered-letters';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { POST as confirm } from '@/app/api/accounts/confirm/route';
import { POST as letterAgain } from '@/app/api/accounts/letter/route';
import { POST as signUp } from '@/app/api/accounts/sign-up/route';
import * as hashing from '@/lib/server/auth/password-hash';
import { call, signInAs } from '../../support/account-calls';
import { makeAccount, PASSWORD } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { secretIn } from '../../support/letter-box';
import { ownRequest } from '../../support/request';

const letters = useOrderedLetters();
const database = useDatabase();
const post = (handle: typeof signUp, body: unknown) => call(handle, ownRequest('/api/x', { method: 'POST', body }));
const form = (email: string, password = PASSWORD) => ({ name: 'Ada', email, password });

beforeEach(async () => {
  await database().models.Throttle.destroy({ where: {} });
});

describe('sign-up', () => {
  it('opens an account that can be signed in to only after its address is confirmed with the password', async () => {
    expect(await post(signUp, form('New@Example.org'))).toMatchObject({ status: 200, body: { sent: true } });
    expect((await signInAs({ email: 'new@example.org', password: PASSWORD })).status).toBe(401);

    const [letter] = await letters.write();
    expect(letter?.to).toBe('new@example.org');
    const token = secretIn(letter?.letter.text ?? '');
    const wrong = await post(confirm, { token, password: 'not the one chosen' });
    expect(wrong).toMatchObject({ status: 403, body: { code: 'wrong-password' } });
    expect(await post(confirm, { token, password: PASSWORD })).toMatchObject({
      status: 200,
      body: { email: 'new@example.org' },
    });
    expect((await signInAs({ email: 'new@example.org', password: PASSWORD })).status).toBe(204);
    expect(await post(confirm, { token, password: PASSWORD })).toMatchObject({
      status: 410,
      body: { code: 'link-spent' },
    });
  });

  it('stores the password as Argon2id with the stated cost, and the link only as its hash', async () => {
    await post(signUp, form('stored@example.org'));
    const [letter] = await letters.write();
    const account = await database().models.Account.findOne({ where: { email: 'stored@example.org' } });
    expect(account?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    const tokens = await database().models.Token.findAll({ where: { accountId: account?.id } });
    expect(JSON.stringify(tokens)).not.toContain(secretIn(letter?.letter.text ?? ''));
  });

  it('gives the same answer with the same work for an address that has an account, and leaves that account alone', async () => {
    const known = await makeAccount({ name: 'Known' });
    const hash = vi.spyOn(hashing, 'hashPassword');
    const unknown = await post(signUp, form('nobody-yet@example.org'));
    const forUnknown = hash.mock.calls.length;
    expect(forUnknown).toBe(1);
    const again = await post(signUp, form(known.email, 'a stranger chose this'));
    expect(hash.mock.calls.length - forUnknown).toBe(forUnknown);
    hash.mockRestore();
    expect({ status: again.status, body: again.body }).toEqual({ status: unknown.status, body: unknown.body });
    expect(letters.orders.map(({ letter }) => letter)).toEqual(['confirm-address', 'confirm-address']);

    const written = await letters.write();
    expect(written.map(({ letter }) => letter.subject)).toEqual([
      'Confirm your address for Holdfast',
      'You already have an account at Holdfast',
    ]);
    const account = await database().models.Account.findByPk(known.id);
    expect(account?.name).toBe('Known');
    expect((await signInAs({ email: known.email, password: known.password })).status).toBe(204);
  });

  it('does not let a stranger prepare an account with a password of theirs for someone else to confirm', async () => {
    const email = 'theirs@example.org';
    await post(signUp, form(email, 'the owner chose this'));
    await post(signUp, form(email, 'a stranger chose this'));
    for (const { letter } of await letters.write()) {
      const token = secretIn(letter.text);
      expect((await post(confirm, { token, password: 'the owner chose this' })).status).toBe(403);
    }
    const account = await database().models.Account.findOne({ where: { email } });
    expect(account?.emailConfirmedAt).toBeNull();
  });

  it('takes the latest name and password while nobody has confirmed', async () => {
    const email = 'twice@example.org';
    await post(signUp, form(email, 'the first that I chose'));
    await post(signUp, form(email, 'the second that I chose'));
    const [first] = await letters.write();
    const token = secretIn(first?.letter.text ?? '');
    expect((await post(confirm, { token, password: 'the second that I chose' })).status).toBe(200);
  });

  it('comes out with one account when the same form arrives five times at once', async () => {
    const answers = await Promise.all(Array.from({ length: 5 }, () => post(signUp, form('at-once@example.org'))));
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200, 200]);
    expect(await database().models.Account.count({ where: { email: 'at-once@example.org' } })).toBe(1);
  });

  it.each([
    [{ name: '', email: 'a@example.org', password: PASSWORD }, 'name'],
    [{ name: 'A\u202eb', email: 'a@example.org', password: PASSWORD }, 'name'],
    [{ name: 'A', email: 'a at example.org', password: PASSWORD }, 'email'],
    [{ name: 'A', email: 'a@example.org', password: 'too short' }, 'password'],
    [{ name: 'A', email: 'a@example.org', password: 'password123' }, 'password'],
    [{ name: 'A', email: 'a@example.org', password: 'x'.repeat(201) }, 'password'],
  ])('refuses %j at %s', async (body, path) => {
    const { status, body: problem } = await post(signUp, body);
    expect(status).toBe(422);
    expect((problem?.fields as { path: string }[]).map((field) => field.path)).toEqual([path]);
    expect(letters.orders).toEqual([]);
  });

  it('sends no more than the limit of letters to one address, known or not', async () => {
    const known = await makeAccount();
    for (const email of [known.email, 'flooded@example.org']) {
      const statuses = [];
      for (let index = 0; index < 6; index += 1) statuses.push((await post(letterAgain, { email })).status);
      expect(statuses).toEqual([200, 200, 200, 200, 200, 429]);
    }
  });
});

describe('the letter again', () => {
  it('goes to an unconfirmed address, tells a confirmed one, and goes nowhere for an unknown one; the answer is one', async () => {
    const waiting = await makeAccount({ confirmed: false });
    const known = await makeAccount();
    const answers = [];
    for (const email of [waiting.email, known.email, 'unknown@example.org']) {
      const { status, body } = await post(letterAgain, { email });
      answers.push({ status, body });
    }
    expect(answers).toEqual(Array.from({ length: 3 }, () => ({ status: 200, body: { sent: true } })));
    expect((await letters.write()).map(({ to, letter }) => [to, letter.subject])).toEqual([
      [waiting.email, 'Confirm your address for Holdfast'],
      [known.email, 'You already have an account at Holdfast'],
    ]);
  });
});
