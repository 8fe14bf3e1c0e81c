import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ensureDatabase, startCluster } from '@/scripts/setup/cluster.mjs';

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
  for (const stop of stops.splice(0)) await stop();
  vi.restoreAllMocks();
  rmSync(folder, { recursive: true, force: true });
});

async function start({ durable = false } = {}) {
  const cluster = await startCluster({ folder: path.join(folder, 'postgres'), forTests: !durable });
  stops.push(cluster.stop);
  return cluster;
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

  it('that is still running from an earlier start is used again', async () => {
    const first = await start();
    const second = await startCluster({ folder: path.join(folder, 'postgres'), forTests: true });
    expect(second.port).toBe(first.port);
    expect(said).toMatch(/still running from an earlier start/);
  });

  it('left by a crash, comes up again with what was in it', async () => {
    const home = path.join(folder, 'postgres');
    const first = await start({ durable: true });
    await ensureDatabase(first, 'holdfast');
    await ask(first.url('holdfast'), 'create table kept as select 42 as answer');
    const pid = Number(lockOf(home)[0]);
    process.kill(pid, 'SIGKILL');
    await untilGone(pid);
    stops.length = 0;
    // The number of the dead process has gone to one that is no database.
    const lock = lockOf(home);
    writeFileSync(path.join(home, 'cluster/postmaster.pid'), [String(process.pid), ...lock.slice(1)].join('\n'));
    const again = await start({ durable: true });
    expect(await ask(again.url('holdfast'), 'select answer from kept')).toEqual([{ answer: 42 }]);
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
