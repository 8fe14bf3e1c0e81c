import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { runNode, type NodeRun } from '../support/run-node';
import { useShims } from '../support/shims';

const isRoot = process.getuid?.() === 0;
const root = process.cwd();
const { folder: bin, shim } = useShims();

/** A project with nothing in it yet. */
let project: string;
beforeEach(() => {
  project = mkdtempSync('/var/tmp/holdfast-project-');
  writeFileSync(path.join(project, 'package-lock.json'), '{}');
});
afterEach(() => rmSync(project, { recursive: true }));

/** Runs a part of the set-up in that project, with our programs before those of the system. */
function setUp(file: string, call: string, uid: number | null = null): Promise<NodeRun> {
  const program = `
    import { runMain } from '${root}/scripts/setup/say.mjs';
    import * as part from '${root}/scripts/setup/${file}.mjs';
    ${uid === null ? '' : `process.getuid = () => ${uid};`}
    runMain(async () => { await part.${call}; });`;
  return runNode(
    ['--input-type=module', '-e', program],
    { ...process.env, PATH: `${bin()}:${process.env.PATH}` },
    project,
  );
}

const FULL = 'npm error code ENOSPC\nnpm error nospc ENOSPC: no space left on device, write';
const trace = /^\s+at .+:\d+:\d+/m;

function expectSaid({ code, output }: NodeRun, words: RegExp) {
  expect(output).toMatch(words);
  expect(output).not.toMatch(trace);
  expect(code).toBe(1);
}

describe('the packages of the lock file', () => {
  it('that could not be had, are told with what npm said, and tried again at the next start', async () => {
    mkdirSync(path.join(project, 'node_modules'));
    shim('npm', 'echo "npm error network request to the registry failed"; exit 1');
    expectSaid(
      await setUp('install-packages', 'installPackages()'),
      /The packages could not be installed\. .*again.*npm error network request/s,
    );
    expect(existsSync(path.join(project, 'node_modules/.holdfast-lock'))).toBe(false);
    shim('npm', 'exit 0');
    expect(await setUp('install-packages', 'installPackages()')).toMatchObject({ code: 0 });
    // Then they are there, and npm is not asked again.
    shim('npm', 'exit 1');
    expect(await setUp('install-packages', 'installPackages()')).toMatchObject({ code: 0, output: '' });
    writeFileSync(path.join(project, 'package-lock.json'), '{ "changed": true }');
    expect(await setUp('install-packages', 'installPackages()')).toMatchObject({ code: 1 });
  });

  it('that do not fit on the disk, say that it is full', async () => {
    shim('npm', `echo "${FULL}"; exit 1`);
    expectSaid(await setUp('install-packages', 'installPackages()'), /The disk is full\. Free some space \(df -h/);
  });

  it('without npm, say what is missing', async () => {
    const run = await runNode(
      [
        '--input-type=module',
        '-e',
        `import { runMain } from '${root}/scripts/setup/say.mjs';
         import { installPackages } from '${root}/scripts/setup/install-packages.mjs';
         runMain(installPackages);`,
      ],
      { ...process.env, PATH: bin() },
      project,
    );
    expectSaid(run, /The program "npm" is missing\. Install it/);
  });
});

describe('a build', () => {
  it('that fails shows its last lines, and is tried again at the next start', async () => {
    shim('npm', 'echo "Type error: a is not b"; exit 1');
    expectSaid(await setUp('build', 'buildWhenChanged()'), /The build failed\. Its last lines:\nType error/);
    expect(existsSync(path.join(project, '.next/holdfast-sources'))).toBe(false);
  });

  it('that does not fit on the disk, says that it is full', async () => {
    shim('npm', `echo "${FULL}"; exit 1`);
    expectSaid(await setUp('build', 'buildWhenChanged()'), /The disk is full\./);
  });
});

describe('PostgreSQL', () => {
  const noPostgres = `needPostgres({ root: '${root}/no-such-folder' })`;

  it('missing, with no right to install it, prints the one command to run', async () => {
    shim('apt-get', 'exit 0');
    shim('sudo', 'exit 1');
    const run = await setUp('debian', noPostgres, 1000);
    expectSaid(
      run,
      /^PostgreSQL is missing, and this account may not install it\. Run once: sudo sh -c "apt-get update && apt-get install -y postgresql"/m,
    );
  });

  it('missing, is installed where that is allowed, and said to be missing still when it is nowhere', async () => {
    shim('apt-get', 'exit 0');
    shim('sudo', 'exit 0');
    const run = await setUp('debian', noPostgres, 1000);
    expect(run.firstLine).toMatch(/^Installing Debian's postgresql: PostgreSQL is missing/);
    expectSaid(run, /was installed, and its programs are not in .*Install the Debian package "postgresql" by hand/);
  });

  it.runIf(isRoot).each([
    ['a full disk', 'No space left on device', /The disk is full\./],
    ['a folder it may not enter', 'Permission denied', /may not read or write all of .*chown -R postgres:.*chmod o\+x/],
    [
      'anything else',
      'invalid locale name',
      /could not be made\. Mend what PostgreSQL says here.*invalid locale name/s,
    ],
  ])('that cannot make its cluster for %s, says so and leaves nothing half', async (_, reason, words) => {
    shim(
      'runuser',
      `case "$*" in
         *initdb*) mkdir -p '${project}/data/cluster.half'; echo "initdb: error: could not create directory: ${reason}"; exit 1;;
         *) exit 0;;
       esac`,
    );
    expectSaid(await setUp('cluster', `startCluster({ folder: '${project}/data' })`), words);
    expect(existsSync(path.join(project, 'data/cluster.half'))).toBe(false);
    expect(existsSync(path.join(project, 'data/cluster'))).toBe(false);
  });
});
