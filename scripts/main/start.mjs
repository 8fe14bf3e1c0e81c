import { spawn } from 'node:child_process';
import { installPackages } from '../setup/install-packages.mjs';
import { ensureDatabase, startCluster } from '../setup/cluster.mjs';
import { isTaken } from '../setup/ports.mjs';
import { buildWhenChanged } from '../setup/build.mjs';
import { keptSecret, TSX } from '../setup/settings.mjs';
import { Mendable, runMain, say, throwWhenDiskFull } from '../setup/say.mjs';
import { run } from '../setup/run.mjs';

const DEV = process.argv.includes('--dev');
/** First start after the database was played back from a backup: npm start -- --restored */
const RESTORED = process.argv.includes('--restored');
const HOST = '127.0.0.1';
const MAIL = { smtpPort: 2525, pagePort: 8025, user: 'holdfast', password: 'holdfast' };

runMain(async () => {
  const port = readPort(process.env.PORT);
  if (await isTaken(port)) {
    throw new Mendable(
      `Port ${port} is taken.`,
      `Stop what listens there (ss -ltnp 'sport = :${port}' names it), or choose another: PORT=${port + 1} npm start`,
    );
  }
  // Before anything is started: a second start that fails must not end what the first one runs.
  if (!process.env.SMTP_URL) await needMailPorts();
  await installPackages();

  /** What was started, to be ended in the opposite order. @type {(() => Promise<void>)[]} */
  const ends = [];
  let ending = false;
  const end = async () => {
    if (ending) return;
    ending = true;
    for (const stop of ends.reverse()) await stop().catch((error) => process.stderr.write(`${error.message}\n`));
  };
  const ended = new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => resolve(0));
  });
  // Told at the next wait, so that what was started is ended all the same.
  const broken = new Promise((_, reject) => process.on('uncaughtException', reject));

  try {
    const origin = process.env.NEXTAUTH_URL ?? `http://${HOST}:${port}`;
    const env = { ...process.env, PORT: String(port), NEXTAUTH_URL: origin, NEXT_TELEMETRY_DISABLED: '1' };
    env.NEXTAUTH_SECRET ??= keptSecret('session-secret');
    if (!env.DATABASE_URL) {
      const cluster = await startCluster({ folder: '.data/postgres' });
      ends.push(cluster.stop);
      await ensureDatabase(cluster, 'holdfast');
      env.DATABASE_URL = cluster.url('holdfast');
    }
    const pages = [];
    if (!env.SMTP_URL) {
      const { startFakeMail } = await import('../fakes/mail.mjs');
      ends.push((await startFakeMail({ ...MAIL, folder: '.data/mail' })).stop);
      env.SMTP_URL = `smtp://${MAIL.user}:${MAIL.password}@${HOST}:${MAIL.smtpPort}`;
      pages.push(`Letters    http://${HOST}:${MAIL.pagePort}  (nothing is really sent)`);
    }
    const prepare = [...TSX, 'scripts/migrate-and-seed.ts', '--seed', ...(RESTORED ? ['--restored'] : [])];
    const prepared = await run(process.execPath, prepare, { env });
    if (prepared.code !== 0) throw databaseProblem(prepared.output);
    if (prepared.output.trim()) say(prepared.output.trim());
    if (!DEV) await buildWhenChanged();

    const web = startWeb(env, port);
    ends.push(web.stop);
    await Promise.race([waitForAnswer(`http://${HOST}:${port}/api/health`, web), ended, broken]);
    const { demoPassword, demoSignIns } = await import('../demo.mjs');
    say(
      [
        '',
        'Holdfast is up.',
        `Address    ${origin}`,
        ...demoSignIns.map(({ email, what }, i) => `${i === 0 ? 'Sign in    ' : '           '}${email}  (${what})`),
        `           password: ${demoPassword}`,
        ...pages,
        'Ctrl-C ends it all.',
        '',
      ].join('\n'),
    );
    const code = await Promise.race([ended, web.died, broken]);
    if (code !== 0 && !ending) throw new Mendable('The web server ended by itself.', `Its last lines:\n${web.tail()}`);
  } finally {
    await end();
  }
  return 0;
});

/** @param {string | undefined} text */
function readPort(text) {
  const port = Number(text ?? 3000);
  if (!Number.isInteger(port) || port < 1 || port > 65_535)
    throw new Mendable(`PORT is "${text}", which is no port.`, 'Use a number from 1 to 65535.');
  return port;
}

async function needMailPorts() {
  for (const port of [MAIL.smtpPort, MAIL.pagePort]) {
    if (await isTaken(port))
      throw new Mendable(
        `Port ${port}, where the local mail fake listens, is taken, perhaps by another start of Holdfast.`,
        'Stop what listens there, or set SMTP_URL to a mail server.',
      );
  }
}

/** @param {NodeJS.ProcessEnv} env @param {number} port */
function startWeb(env, port) {
  const args = ['node_modules/next/dist/bin/next', DEV ? 'dev' : 'start', '-H', HOST, '-p', String(port)];
  // A group of its own, so that everything it starts ends with it.
  const child = spawn(process.execPath, args, {
    env: { ...env, NODE_ENV: DEV ? 'development' : 'production' },
    stdio: ['ignore', 'pipe', 'pipe'],
    detached: true,
  });
  let last = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk) => {
      last = `${last}${chunk}`.slice(-4_000);
      if (DEV || stream === child.stderr) process.stdout.write(chunk);
    });
  }
  const died = new Promise((resolve) => child.on('exit', (code) => resolve(code ?? 1)));
  return {
    died,
    tail: () => last.trim().split('\n').slice(-8).join('\n'),
    stop: async () => {
      if (child.exitCode !== null || child.pid === undefined) return;
      process.kill(-child.pid, 'SIGTERM');
      const late = setTimeout(() => child.exitCode === null && process.kill(-(child.pid ?? 0), 'SIGKILL'), 5_000);
      await died;
      clearTimeout(late);
    },
  };
}

/** @param {string} url @param {{ died: Promise<unknown>, tail: () => string }} web */
async function waitForAnswer(url, web) {
  let dead = false;
  void web.died.then(() => (dead = true));
  for (const until = Date.now() + 60_000; Date.now() < until;) {
    if (dead) throw new Mendable('The web server did not start.', `Its last lines:\n${web.tail()}`);
    const answer = await fetch(url).catch(() => null);
    if (answer?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 150));
  }
  throw new Mendable('The web server did not answer within a minute.', `Its last lines:\n${web.tail()}`);
}

/** @param {string} output */
function databaseProblem(output) {
  throwWhenDiskFull(output);
  const refused = /ECONNREFUSED|ENOTFOUND|password authentication failed|does not exist/i.exec(output)?.[0];
  if (refused)
    return new Mendable(
      `The database of DATABASE_URL cannot be used (${refused}).`,
      'Look at its address, user, password and name, or leave DATABASE_URL out to use the embedded one.',
    );
  return new Mendable(
    'The database could not be brought up to date.',
    `What was said:\n${output.trim().split('\n').slice(-15).join('\n')}`,
  );
}
