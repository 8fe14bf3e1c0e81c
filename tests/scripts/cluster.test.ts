import { execFileSync } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { ensureDatabase, startCluster } from '@/scripts/setup/cluster.mjs';
import { runNode } from '../support/run-node';

const isRoot = process.getuid?.() === 0;
const room = vi.hoisted(() => ({ freeMb: null as number | null }));
vi.mock('node:fs', async (importOriginal) => {
  const fs = await importOriginal<typeof import('node:fs')>();
  const statfsSync = (folder: string) =>
    room.freeMb === null ? fs.statfsSync(folder) : { bavail: room.freeMb, bsize: 1_000_000 };
  return { ...fs, default: { ...fs, statfsSync }, statfsSync };
});

let folder: string;
let said: string;
/** A cluster that was made once and ended: making each anew would take most of the time. */
let made: string;
beforeAll(async () => {
  made = mkdtempSync('/var/tmp/holdfast-made-');
  chmodSync(made, 0o755);
  await (await startCluster({ folder: path.join(made, 'postgres'), forTests: true })).stop();
});
afterAll(() => rmSync(made, { recursive: true }));
const stops: (() => Promise<void>)[] = [];
beforeEach(() => {
  // Not in the system's folder for temporary files, which a machine may have mounted so that nothing in it runs.
  folder = mkdtempSync('/var/tmp/holdfast-cluster-');
  chmodSync(folder, 0o755);
  said = '';
  room.freeMb = null;
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    said += String(text);
    return true;
  });
});
afterEach(async () => {
  for (const stop of stops.splice(0).reverse()) await stop();
  vi.restoreAllMocks();
  rmSync(folder, { recursive: true, force: true });
});

async function start({ durable = false } = {}) {
  const cluster = await startCluster({ folder: path.join(folder, 'postgres'), forTests: !durable });
  stops.push(cluster.stop);
  return cluster;
}

/** A cluster made earlier lies in the folder, and nothing runs. */
function lay(name = 'postgres'): string {
  execFileSync('cp', ['-a', path.join(made, 'postgres'), path.join(folder, name)]);
  return path.join(folder, name);
}

async function ask(url: string, sql: string): Promise<unknown[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query(sql)).rows as unknown[];
  } finally {
    await client.end();
  }
}

/** Process and files of a cluster, as its lock names them. */
const lockOf = (home: string) => readFileSync(path.join(home, 'cluster/postmaster.pid'), 'utf8').split('\n');

async function untilGone(pid: number): Promise<void> {
  await expect.poll(() => existsSync(`/proc/${pid}`), { timeout: 20_000 }).toBe(false);
}

describe('the project’s own database', () => {
  it('listens on the loopback alone, wants its password, and belongs to an account that is not root', async () => {
    const cluster = await start();
    await ensureDatabase(cluster, 'holdfast');
    const [row] = await ask(
      cluster.url('holdfast'),
      `select current_setting('listen_addresses') as listens, current_setting('unix_socket_directories') as sockets`,
    );
    expect(row).toEqual({ listens: '127.0.0.1', sockets: '' });
    const wrong = cluster.url('holdfast').replace(/:[^:@]+@/, ':guess@');
    await expect(ask(wrong, 'select 1')).rejects.toThrow(/password authentication failed/);
    const status = readFileSync(`/proc/${lockOf(path.join(folder, 'postgres'))[0]}/status`, 'utf8');
    expect(/^Uid:\s+(\d+)/m.exec(status)![1]).not.toBe('0');
  });

  it('that another start runs is used with it, and not ended under its feet', async () => {
    lay();
    const first = await start();
    const second = await start();
    expect(second.port).toBe(first.port);
    expect(said).toMatch(/running under another start of Holdfast/);
    await second.stop();
    expect(await ask(first.url('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
  });

  it('that is still running after its start was killed is used again, and ended at last', async () => {
    lay();
    const first = await start();
    writeFileSync(path.join(folder, 'postgres/started-by'), `${process.pid} 1`);
    stops.length = 0;
    const second = await start();
    expect(second.port).toBe(first.port);
    expect(said).toMatch(/still running from an earlier start/);
    const pid = Number(lockOf(path.join(folder, 'postgres'))[0]);
    await second.stop();
    await untilGone(pid);
  });

  it('left by a crash, comes up again with what was in it', async () => {
    const home = lay();
    const first = await start({ durable: true });
    await ensureDatabase(first, 'holdfast');
    await ask(first.url('holdfast'), 'create table kept as select 42 as answer');
    const pid = Number(lockOf(home)[0]);
    process.kill(pid, 'SIGKILL');
    await untilGone(pid);
    stops.length = 0;
    // Its number has gone to a database, of the same account, that is another one.
    lay('other');
    const other = await startCluster({ folder: path.join(folder, 'other'), forTests: true });
    stops.push(other.stop);
    const lock = lockOf(home);
    const taken = lockOf(path.join(folder, 'other'))[0]!;
    writeFileSync(path.join(home, 'cluster/postmaster.pid'), [taken, ...lock.slice(1)].join('\n'));
    const again = await start({ durable: true });
    expect(said).toMatch(/left by a crash; its lock is taken away/);
    expect(await ask(again.url('holdfast'), 'select answer from kept')).toEqual([{ answer: 42 }]);
  });

  it('whose making was cut short is made anew', async () => {
    mkdirSync(path.join(folder, 'postgres/cluster.half'), { recursive: true });
    writeFileSync(path.join(folder, 'postgres/cluster.half/PG_VERSION'), '15\n');
    const cluster = await start();
    expect(await ask(cluster.url('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
    expect(existsSync(path.join(folder, 'postgres/cluster.half'))).toBe(false);
  });

  it.each([
    [
      'of another version',
      'PG_VERSION',
      '9\n',
      /made by another version of PostgreSQL\. Install that version, or move/,
    ],
    [
      'with settings it cannot read',
      'postgresql.conf',
      'nonsense\n',
      /did not start\. Mend what is said here.*syntax error/s,
    ],
  ])('%s says so and what to do', async (_, file, content, words) => {
    const home = lay();
    writeFileSync(path.join(home, 'cluster', file), content);
    await expect(start()).rejects.toThrow(words);
  });

  it('without its password, or in the place of something else, says so and touches nothing', async () => {
    const home = lay();
    rmSync(path.join(home, 'password'));
    await expect(start()).rejects.toThrow(/password is missing.*Put it back from a backup/);
    rmSync(path.join(home, 'cluster/PG_VERSION'));
    await expect(start()).rejects.toThrow(/is no whole database cluster\. Move it away/);
    expect(existsSync(path.join(home, 'cluster/base'))).toBe(true);
  });

  it.runIf(isRoot)('that a start as root left to another account says so to an ordinary one', async () => {
    lay();
    const run = await runNode([
      '--input-type=module',
      '-e',
      `import { runMain } from './scripts/setup/say.mjs';
       import { startCluster } from './scripts/setup/cluster.mjs';
       process.setuid(65534);
       runMain(() => startCluster({ folder: '${folder}/postgres' }));`,
    ]);
    expect(run.firstLine).toMatch(/belongs to another account, perhaps from a start as root\. Start as that account/);
    expect(run.output).not.toMatch(/^\s+at /m);
  });

  it('does not begin on a disk that is nearly full, and says how much is left', async () => {
    room.freeMb = 120;
    await expect(start()).rejects.toThrow(/has 120 MB left, and the database needs 500 MB.*Free some space/);
  });

  it.runIf(isRoot)('under a folder that its account may not enter, has one of its own elsewhere', async () => {
    chmodSync(folder, 0o700);
    const cluster = await start();
    const elsewhere = /the database is kept in (\S+)\./.exec(said)?.[1];
    try {
      expect(said).toMatch(/The account "postgres" may not enter/);
      expect(elsewhere).toMatch(/^\/var\/lib\/holdfast\//);
      expect(await ask(cluster.url('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
    } finally {
      await stops.pop()!();
      if (elsewhere?.startsWith('/var/lib/holdfast/')) rmSync(elsewhere, { recursive: true });
    }
  });
});
