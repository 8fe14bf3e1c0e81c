import { mkdtempSync, rmSync } from 'node:fs';
import { networkInterfaces, tmpdir } from 'node:os';
import path from 'node:path';
import nodemailer from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startFakeMail } from '@/scripts/fakes/mail.mjs';
import { freePort } from '@/scripts/setup/ports.mjs';

let folder: string;
let smtpPort: number;
let pagePort: number;
let fake: { stop: () => Promise<void> };
beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'holdfast-letters-'));
  [smtpPort, pagePort] = [await freePort(), await freePort()];
  fake = await startFakeMail({ smtpPort, pagePort, folder, user: 'holdfast', password: 'letters' });
});
afterAll(async () => {
  await fake.stop();
  rmSync(folder, { recursive: true });
});

const send = (letter: { subject: string; text: string }, pass = 'letters') =>
  nodemailer
    .createTransport({ host: '127.0.0.1', port: smtpPort, auth: { user: 'holdfast', pass } })
    .sendMail({ from: 'bench@holdfast.example', to: 'toni@holdfast.example', ...letter });
const page = async (address = '/') => (await fetch(`http://127.0.0.1:${pagePort}${address}`)).text();

describe('the local mail fake', () => {
  it('takes a letter and shows it, with its link, and with nothing of it run', async () => {
    await send({ subject: 'A <script>alert(1)</script>', text: 'Open http://127.0.0.1:3000/confirm#token=abc now' });
    const { letters } = JSON.parse(await page('/letters.json')) as { letters: { to: string; text: string }[] };
    expect(letters[0]).toMatchObject({ to: 'toni@holdfast.example' });
    expect(letters[0]!.text).toContain('#token=abc');
    const html = await page();
    expect(html).not.toContain('<script>');
    expect(html).toContain('<a href="http://127.0.0.1:3000/confirm#token=abc">');
  });

  it('refuses wrong credentials, as a real server does', async () => {
    await expect(send({ subject: 'x', text: 'y' }, 'guess')).rejects.toMatchObject({
      code: 'EAUTH',
      responseCode: 535,
    });
  });

  it('refuses a letter that is too large', async () => {
    await expect(send({ subject: 'x', text: 'y'.repeat(3_000_000) })).rejects.toMatchObject({ responseCode: 552 });
  });

  it('is on the loopback alone', async () => {
    const outside = Object.values(networkInterfaces())
      .flatMap((each) => each ?? [])
      .find(({ family, internal }) => family === 'IPv4' && !internal);
    if (!outside) return;
    await expect(fetch(`http://${outside.address}:${pagePort}/`)).rejects.toThrow();
  });
});
