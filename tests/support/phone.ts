import Dexie from 'dexie';
import type { PackManifest } from '@/lib/domain/build/wire';
import { AccountDatabase } from '@/lib/store/database';
import { savePack } from '@/lib/store/mutations/save-pack';
import { createSyncRunner, type SyncRunner } from '@/lib/sync/runner';
import type { FakeSyncServer } from '../fakes/sync-server';
import { ACCOUNT, BUILD, uuidOf } from './log';
import { demoPlan } from './plans';

export interface Phone {
  db: AccountDatabase;
  runner: SyncRunner;
  /** A new page on the same storage, as after a reload or a dead battery. */
  reopen: () => Promise<Phone>;
  close: () => Promise<void>;
}

/** A phone with the folding trestles on it. Each has storage of its own: fake storage is one for the whole process. */
export async function openPhone(
  number: number,
  server: FakeSyncServer,
  { fresh = true, skewMs = 0 } = {},
): Promise<Phone> {
  const db = new AccountDatabase(ACCOUNT, uuidOf(0xd00 + number));
  // The class names its database for the account; two phones in one process need two.
  Object.defineProperty(db, 'name', { value: `${db.name}-${number}` });
  if (fresh) await Dexie.delete(db.name);
  db.clock = () => server.now + skewMs;
  await db.open();
  server.buildId = BUILD;
  if (fresh) await savePack(db, manifest(server.epoch), demoPlan('folding-trestles'));
  const runner = createSyncRunner({
    db,
    fetch: server.fetch,
    now: db.clock,
    random: () => 0.5,
    setTimer: () => () => undefined,
  });
  return {
    db,
    runner,
    reopen: async () => {
      db.close();
      return openPhone(number, server, { fresh: false, skewMs });
    },
    close: async () => {
      runner.stop();
      db.close();
      await Dexie.delete(db.name);
    },
  };
}

function manifest(epoch: string): PackManifest {
  return {
    format: 'holdfast-pack',
    version: 1,
    buildId: BUILD,
    buildName: 'Trestles',
    accountId: ACCOUNT,
    role: 'owner',
    planRevisionId: uuidOf(0xf),
    contentHash: 'c'.repeat(64),
    builtAt: 0,
    epoch,
    files: [],
    bytes: 0,
    crew: [],
  };
}
