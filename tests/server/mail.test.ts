import { afterAll, describe, expect, it } from 'vitest';
import { orderLetter, startJobs, stopJobs } from '@/lib/server/jobs/queue';
import { deliverLetter } from '@/lib/server/mail/deliver-letter';
import { writeLetter } from '@/lib/server/mail/letter';
import { makeAccount } from '../support/accounts';
import { useDatabase } from '../support/database';
import { secretIn, useLetterBox } from '../support/letter-box';

useDatabase();
const box = useLetterBox();

describe('a letter', () => {
  it('says the same in text and in HTML, with everything escaped', () => {
    const { text, html } = writeLetter({
      subject: 'A <b>seat</b>',
      before: ['Tom & "Ada" <script>'],
      link: { label: 'Open', url: 'http://127.0.0.1:3000/x#token=a&b' },
    });
    expect(text).toContain('Tom & "Ada" <script>');
    expect(text).toContain('http://127.0.0.1:3000/x#token=a&b');
    expect(html).not.toContain('<script>');
    expect(html).toContain('http://127.0.0.1:3000/x#token=a&#38;b');
  });
});

describe('the mail queue', () => {
  afterAll(stopJobs);

  it('hands an ordered letter to the mail server, as plain text and HTML, marked as automatic', async () => {
    const account = await makeAccount();
    await orderLetter({ letter: 'reset-password', email: account.email });
    const [letter] = await box.waitFor(1);
    expect(letter?.to).toMatchObject({ text: account.email });
    expect(letter?.from?.text).toContain('Holdfast');
    expect(letter?.subject).toBe('Set a new password for Holdfast');
    expect(letter?.headers.get('auto-submitted')).toBe('auto-generated');
    expect(letter?.html).toContain(secretIn(letter?.text ?? ''));
  });

  it('keeps a letter that the mail server does not take for now, with its next try ahead', async () => {
    const { boss, mailWorker } = await startJobs();
    const account = await makeAccount();
    box.refuseWith = 451;
    const id = await boss.send(
      'mail',
      { letter: 'reset-password', email: account.email },
      { retryLimit: 3, retryDelay: 60 },
    );
    boss.notifyWorker(mailWorker);
    await expect
      .poll(async () => (await boss.getJobById('mail', id ?? ''))?.state, { timeout: 20_000, interval: 200 })
      .toBe('retry');
    expect(box.letters).toHaveLength(0);
  });
});

describe('delivering', () => {
  it('tries again after a 4xx answer or none, and gives up after a 5xx', async () => {
    const { email } = await makeAccount();
    box.refuseWith = 451;
    await expect(deliverLetter({ letter: 'reset-password', email })).rejects.toThrow('did not take the letter');
    box.refuseWith = 550;
    await expect(deliverLetter({ letter: 'reset-password', email })).resolves.toBeUndefined();
    expect(box.letters).toHaveLength(0);
  });

  it('tries again when the mail server does not take our password, which is nothing about the letter', async () => {
    const { email } = await makeAccount();
    box.locked = true;
    await expect(deliverLetter({ letter: 'reset-password', email })).rejects.toThrow('did not take the letter');
  });

  it('writes to nobody about an account that is not there', async () => {
    await deliverLetter({ letter: 'reset-password', email: 'unknown@example.org' });
    await deliverLetter({ letter: 'password-changed', accountId: '0198f0a0-0000-7000-8000-000000000001' });
    expect(box.letters).toHaveLength(0);
  });

  it('refuses an order that is none', async () => {
    await expect(deliverLetter({ letter: 'love', email: 'a@example.org' })).rejects.toThrow();
  });
});
