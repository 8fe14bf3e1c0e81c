import { createHash } from 'node:crypto';
import { chmodSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkNode } from '@/scripts/setup/check-node.mjs';
import { freePort } from '@/scripts/setup/ports.mjs';
import { runNode } from '../support/run-node';

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
    expect(() => checkNode(version)).toThrow(/This is Node .*Holdfast runs on Node 20 .*Install Node 20/);
  });

  it.each(['20.9.0', '20.20.2', '22.1.0', '24.11.0'])('is none on Node %s', (version) => {
    expect(() => checkNode(version)).not.toThrow();
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
  let bin: string;
  beforeAll(() => {
    bin = mkdtempSync(path.join(tmpdir(), 'holdfast-bin-'));
    symlinkSync('/bin/sh', path.join(bin, 'sh'));
  });
  afterAll(() => rmSync(bin, { recursive: true }));

  function shim(name: string, script: string): void {
    writeFileSync(path.join(bin, name), `#!/bin/sh\n${script}\n`);
    chmodSync(path.join(bin, name), 0o755);
  }

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
      { ...process.env, PATH: bin },
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
