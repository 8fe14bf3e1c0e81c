import { createServer } from 'node:http';
import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

/**
 * A mail server of the loopback that takes letters instead of sending them, as a real one does: it wants the credentials,
 * refuses what is too large, and keeps every letter. Its inbox can be read in a browser.
 *
 * @param {{ smtpPort: number, pagePort: number, folder: string, user: string, password: string }} options
 */
export async function startFakeMail({ smtpPort, pagePort, folder, user, password }) {
  mkdirSync(folder, { recursive: true });
  // Not how many there are: one that was taken away would let a later letter take another's place.
  let count = Math.max(0, ...readdirSync(folder).map((name) => Number.parseInt(name, 10) || 0));
  const smtp = new SMTPServer({
    secure: false,
    disabledCommands: ['STARTTLS'],
    allowInsecureAuth: true,
    authMethods: ['PLAIN', 'LOGIN'],
    size: 2_000_000,
    onAuth(auth, _session, callback) {
      if (auth.username === user && auth.password === password) callback(null, { user });
      else callback(new Error('535 The user or password is wrong'));
    },
    onData(stream, _session, callback) {
      /** @type {Buffer[]} */
      const chunks = [];
      stream.on('data', (chunk) => chunks.push(chunk));
      stream.on('end', () => {
        if (stream.sizeExceeded)
          return callback(Object.assign(new Error('The letter is too large'), { responseCode: 552 }));
        try {
          const name = `${String(count + 1).padStart(6, '0')}.eml`;
          writeFileSync(path.join(folder, name), Buffer.concat(chunks));
          count += 1;
          callback();
        } catch (error) {
          // A full disk, say: as a real server, it refuses the letter and goes on.
          callback(Object.assign(new Error(`The letter could not be kept: ${error}`), { responseCode: 452 }));
        }
      });
    },
  });
  await new Promise((resolve, reject) => {
    smtp.on('error', reject);
    smtp.listen(smtpPort, '127.0.0.1', () => resolve(undefined));
  });

  const page = createServer((request, response) => {
    answer(folder, request).then(
      ({ status = 200, type, body }) =>
        response
          .writeHead(status, {
            'content-type': type,
            'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'",
          })
          .end(body),
      (error) => response.writeHead(500, { 'content-type': 'text/plain' }).end(String(error)),
    );
  });
  await new Promise((resolve, reject) => {
    page.on('error', reject);
    page.listen(pagePort, '127.0.0.1', () => resolve(undefined));
  });
  return {
    stop: async () => {
      await Promise.all([
        new Promise((resolve) => smtp.close(() => resolve(undefined))),
        new Promise((resolve) => page.close(resolve)),
      ]);
    },
  };
}

/** @param {string} folder @param {import('node:http').IncomingMessage} request */
async function answer(folder, request) {
  // A page of elsewhere whose name was made to point here must not read the letters: they hold links that sign in.
  const { host = '' } = request.headers;
  if (!/^(127\.0\.0\.1|localhost)(:\d+)?$/.test(host))
    return { status: 403, type: 'text/plain', body: 'Open this page as http://127.0.0.1.' };
  const names = readdirSync(folder)
    .filter((name) => name.endsWith('.eml'))
    .sort()
    .reverse();
  const letters = await Promise.all(
    names.slice(0, 200).map(async (name) => {
      const mail = await simpleParser(readFileSync(path.join(folder, name)));
      const to = Array.isArray(mail.to) ? mail.to.map(({ text }) => text).join(', ') : (mail.to?.text ?? '');
      return {
        id: name.replace('.eml', ''),
        to,
        subject: mail.subject ?? '',
        date: mail.date?.toISOString() ?? '',
        text: mail.text ?? '',
      };
    }),
  );
  if (request.url === '/letters.json') return { type: 'application/json', body: JSON.stringify({ letters }) };
  if (request.url !== '/') return { status: 404, type: 'text/plain', body: 'There is no such page.' };
  return { type: 'text/html; charset=utf-8', body: inbox(letters) };
}

/** @param {{ to: string, subject: string, date: string, text: string }[]} letters */
function inbox(letters) {
  const rows = letters
    .map(
      ({ to, subject, date, text }) =>
        `<article><h2>${safe(subject)}</h2><p>to ${safe(to)} · ${safe(date)}</p><pre>${links(safe(text))}</pre></article>`,
    )
    .join('');
  return `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>Letters · Holdfast</title>
<style>body{font:18px/1.5 Verdana,sans-serif;max-width:44rem;margin:2rem auto;padding:0 1rem;background:#f7f4ec;color:#191c1e}article{border-top:2px solid}pre{white-space:pre-wrap;font:inherit}a{color:#1a4b9c}</style>
<h1>Letters that were not sent</h1><p>This page exists only where no mail server is configured.</p>${rows || '<p>No letter yet.</p>'}</html>`;
}

/** @param {string} text */
const safe = (text) => text.replace(/[&<>"]/g, (c) => `&#${c.charCodeAt(0)};`);
/** @param {string} text */
const links = (text) => text.replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`);
