import { mkdtempSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { request } from 'node:http';
import { networkInterfaces, tmpdir } from 'node:os';
import path from 'node:path';
import nodemailer from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startFakeMail } from '@/scripts/fakes/mail.mjs';
import { freePort } from '@/scripts/setup/ports.mjs';

let folder: string;
let smtpPort: number;
let pagePort: number;
let fake: { stop: () => Promise<void> } | undefined;
async function again(): Promise<void> {
  await fake?.stop();
  fake = await startFakeMail({ smtpPort, pagePort, folder, user: 'holdfast', password: 'letters' });
}

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'holdfast-letters-'));
  [smtpPort, pagePort] = [await freePort(), await freePort()];
  await again();
});
afterAll(async () => {
  await fake?.stop();
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

  it('shows the newest letter first, and no letter takes the place of another', async () => {
    await send({ subject: 'Older', text: 'x' });
    const oldest = readdirSync(folder).sort()[0]!;
    await again();
    rmSync(path.join(folder, oldest));
    await again();
    await send({ subject: 'Newer', text: 'x' });
    const { letters } = JSON.parse(await page('/letters.json')) as { letters: { subject: string }[] };
    expect(letters.slice(0, 2).map(({ subject }) => subject)).toEqual(['Newer', 'Older']);
    const html = await page();
    expect(html.indexOf('Newer')).toBeLessThan(html.indexOf('Older'));
  });

  it('refuses a letter that it cannot keep, and goes on', async () => {
    const kept = `${folder}-kept`;
    renameSync(folder, kept);
    try {
      await expect(send({ subject: 'x', text: 'y' })).rejects.toMatchObject({ responseCode: 452 });
    } finally {
      renameSync(kept, folder);
    }
    await send({ subject: 'x', text: 'y' });
  });

  it.each([
    ['an address that is none', '//', 'localhost', 404],
    ['a page it does not have', '/favicon.ico', '127.0.0.1', 404],
    ['a name of elsewhere that was made to point here', '/letters.json', 'elsewhere.example', 403],
  ])('answers %s and shows no letter', async (_, address, host, status) => {
    const got = await new Promise<{ status: number; body: string }>((resolve, reject) => {
      request(
        { host: '127.0.0.1', port: pagePort, path: address, headers: { host: `${host}:${pagePort}` } },
        (answer) => {
          let body = '';
          answer.on('data', (chunk: Buffer) => (body += chunk.toString()));
          answer.on('end', () => resolve({ status: answer.statusCode ?? 0, body }));
        },
      )
        .on('error', reject)
        .end();
    });
    expect(got.status).toBe(status);
    expect(got.body).not.toContain('toni@');
  });

  it('is on the loopback alone', async () => {
    const outside = Object.values(networkInterfaces())
      .flatMap((each) => each ?? [])
      .find(({ family, internal }) => family === 'IPv4' && !internal);
    if (!outside) return;
    await expect(fetch(`http://${outside.address}:${pagePort}/`)).rejects.toThrow();
  });
});
