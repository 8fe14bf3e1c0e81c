import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { transform } from 'esbuild';
import { describe, expect, it } from 'vitest';
import { nodeProblem } from '@/scripts/setup/check-node.mjs';
import { freePort } from '@/scripts/setup/ports.mjs';
import { runNode } from '../support/run-node';
import { useShims } from '../support/shims';

/** What is said when a start fails: a sentence first, then what to do, and no trace. */
function expectSentence({ code, firstLine, output }: Awaited<ReturnType<typeof runNode>>, first: RegExp, mend: RegExp) {
  expect(firstLine).toMatch(first);
  expect(output).toMatch(mend);
  expect(output).not.toMatch(/^\s+at .+:\d+:\d+/m);
  expect(code).toBe(1);
}

describe('a start that cannot be', () => {
  it('because the port is taken, says which and how to choose another', async () => {
    const server = createServer();
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    try {
      const run = await runNode(['scripts/start.mjs'], { ...process.env, PORT: String(port) });
      expectSentence(run, new RegExp(`^Port ${port} is taken\\.`), new RegExp(`PORT=${port + 1} npm start`));
    } finally {
      await new Promise((resolve) => server.close(resolve));
    }
  });

  it('because PORT is none, says so', async () => {
    const run = await runNode(['scripts/start.mjs'], { ...process.env, PORT: 'eighty' });
    expectSentence(run, /^PORT is "eighty", which is no port\./, /from 1 to 65535/);
  });

  it('because the database of DATABASE_URL does not answer, says so and starts nothing', async () => {
    // Otherwise the start would install packages under the feet of the tests that are running.
    const installed = readFileSync('node_modules/.holdfast-lock', 'utf8');
    expect(installed, 'run npm test, which installs first').toBe(
      createHash('sha256').update(readFileSync('package-lock.json')).digest('hex'),
    );
    const [port, closed] = [await freePort(), await freePort()];
    const run = await runNode(['scripts/start.mjs'], {
      ...process.env,
      PORT: String(port),
      DATABASE_URL: `postgres://nobody@127.0.0.1:${closed}/nothing`,
      SMTP_URL: `smtp://127.0.0.1:${closed}`,
    });
    expectSentence(run, /^The database of DATABASE_URL cannot be used \(ECONNREFUSED\)/, /leave DATABASE_URL out/);
  });

  it.each(['18.20.4', '20.8.1', '25.0.0'])('because Node is %s, says what is wanted', (version) => {
    expect(nodeProblem(version)).toMatch(/^This is Node .*Holdfast runs on Node 20 .*Install Node 20/);
  });

  it.each(['20.9.0', '20.20.2', '22.1.0', '24.11.0'])('is none on Node %s', (version) => {
    expect(nodeProblem(version)).toBeNull();
  });

  it.each(['start', 'test'])(
    'because Node is too old, loads nothing more of npm %s than what says so',
    async (name) => {
      const old = `Object.defineProperty(process, 'versions', { value: { ...process.versions, node: '12.22.12' } });`;
      const run = await runNode(['--import', `data:text/javascript,${encodeURIComponent(old)}`, `scripts/${name}.mjs`]);
      expectSentence(run, /^This is Node 12\.22\.12, and Holdfast runs on Node 20/, /Install Node 20/);
      for (const file of [`scripts/${name}.mjs`, 'scripts/setup/check-node.mjs']) {
        const source = readFileSync(file, 'utf8');
        const written = async (target: string) => (await transform(source, { target, format: 'esm' })).code;
        // The way it is written is one that a Node of 2019 reads: there is nothing to translate.
        expect(await written('node12.22')).toBe(await written('esnext'));
      }
    },
  );

  it('because a second one runs already, says so before it touches what the first one started', async () => {
    const empty = mkdtempSync(path.join(tmpdir(), 'holdfast-empty-'));
    const servers = [2525, 8025].map((port) => createServer().listen(port, '127.0.0.1'));
    try {
      // A port that is taken already, by the program itself, is as good.
      await Promise.allSettled(servers.map((server) => once(server, 'listening')));
      const env = { ...process.env, PORT: String(await freePort()), SMTP_URL: '', DATABASE_URL: '' };
      // In a folder without a lock file and a database: nothing of either is asked for before.
      const run = await runNode([path.resolve('scripts/start.mjs')], env, empty);
      expectSentence(
        run,
        /^Port 2525, where the local mail fake listens, is taken, perhaps by another start/,
        /SMTP_URL/,
      );
    } finally {
      await Promise.all(servers.map((server) => new Promise((resolve) => server.close(resolve))));
      expect(readdirSync(empty)).toEqual([]);
      rmSync(empty, { recursive: true });
    }
  });

  it('because the disk is full, says so and where to look', async () => {
    const run = await runNode([
      '--input-type=module',
      '-e',
      `import { runMain } from './scripts/setup/say.mjs';
       runMain(async () => { throw Object.assign(new Error('ENOSPC: no space left on device, write'), { code: 'ENOSPC' }); });`,
    ]);
    expectSentence(run, /^The disk is full\. Free some space/, /df -h/);
  });

  it.each([
    [
      'a folder is not this account’s',
      { code: 'EACCES', syscall: 'mkdir', path: '.data' },
      /^This account may not read or write \.data\./,
      /chown/,
    ],
    [
      'a disk is read-only',
      { code: 'EROFS', syscall: 'open', path: '.data/x' },
      /may not read or write \.data\/x/,
      /move/,
    ],
    [
      'a program is missing',
      { code: 'ENOENT', syscall: 'spawn npm', path: 'npm' },
      /^The program "npm" is missing\./,
      /Install it/,
    ],
  ])('because %s, says so', async (_, error, first, mend) => {
    const run = await runNode([
      '--input-type=module',
      '-e',
      `import { runMain } from './scripts/setup/say.mjs';
       runMain(async () => { throw Object.assign(new Error('refused'), ${JSON.stringify(error)}); });`,
    ]);
    expectSentence(run, first, mend);
  });

  it('for a reason nobody thought of, says it in words before its trace', async () => {
    const run = await runNode([
      '--input-type=module',
      '-e',
      `import { runMain } from './scripts/setup/say.mjs'; runMain(async () => null.length);`,
    ]);
    expect(run.firstLine).toMatch(/^Something that Holdfast did not expect went wrong: Cannot read/);
    expect(run.output).toMatch(/^\s+at /m);
    expect(run.code).toBe(1);
  });
});

describe('a missing Debian package', () => {
  const { folder: bin, shim } = useShims();

  /** Installs with only the given programs to be found, as this user. */
  const install = (uid: number) =>
    runNode(
      [
        '--input-type=module',
        '-e',
        `import { runMain } from './scripts/setup/say.mjs';
         import { installDebian } from './scripts/setup/debian.mjs';
         process.getuid = () => ${uid};
         runMain(() => installDebian(['chromium'], 'A browser'));`,
      ],
      { ...process.env, PATH: bin() },
    );

  it('on another system, names the packages', async () => {
    expectSentence(await install(1000), /^A browser is missing, and this is not Debian\./, /Install chromium the way/);
  });

  it('with no right to install, prints the one command to run', async () => {
    shim('apt-get', 'exit 0');
    shim('sudo', 'exit 1');
    expectSentence(
      await install(1000),
      /^A browser is missing, and this account may not install it\./,
      /Run once: sudo sh -c "apt-get update && apt-get install -y chromium"/,
    );
  });

  it('that cannot be fetched, shows what was said', async () => {
    shim('apt-get', 'echo "E: Unable to locate package chromium"; exit 100');
    const run = await install(0);
    expect(run.firstLine).toMatch(/^Installing Debian's chromium: A browser is missing/);
    expect(run.output).toMatch(/chromium could not be installed\. Run "apt-get update/);
    expect(run.output).toMatch(/Unable to locate package/);
    expect(run.output).not.toMatch(/^\s+at /m);
  });

  it('on a full disk, says that the disk is full', async () => {
    shim('apt-get', 'echo "E: Write error - write (28: No space left on device)"; exit 100');
    expect((await install(0)).output).toMatch(/The disk is full\. Free some space/);
  });

  it('that may be had, is installed, and said to be', async () => {
    shim('apt-get', 'exit 0');
    const run = await install(0);
    expect(run).toMatchObject({ code: 0 });
    expect(run.firstLine).toMatch(/^Installing Debian's chromium/);
  });
});
