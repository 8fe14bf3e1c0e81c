import Dexie from 'dexie';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { foldEntries } from '@/lib/domain/build/fold';
import { notesOf, photosOf, stepMark, timersOf } from '@/lib/domain/build/views';
import { databaseName, openAccountDatabase, closeAccountDatabase } from '@/lib/store/database';
import {
  deviceDatabase,
  enterAccount,
  getCurrentAccount,
  getDeviceId,
  getKnownAccounts,
  getSettings,
  saveSettings,
} from '@/lib/store/device-database';
import { exportHeld } from '@/lib/store/export-held';
import { addPhoto } from '@/lib/store/mutations/add-photo';
import { markStep } from '@/lib/store/mutations/mark-step';
import { startTimer } from '@/lib/store/mutations/mark-timer';
import { saveDraft } from '@/lib/store/mutations/save-draft';
import { writeNote } from '@/lib/store/mutations/write-note';
import { getEntries } from '@/lib/store/queries/builds';
import { getDraft, getHeldCounts } from '@/lib/store/queries/held';
import { discardAccount, keepHere } from '@/lib/store/sign-out';
import { FakeSyncServer } from '../fakes/sync-server';
import { BUILD, uuidOf } from '../support/log';
import { openPhone, type Phone } from '../support/phone';

let phone: Phone;
beforeEach(async () => {
  phone = await openPhone(1, new FakeSyncServer());
});
afterEach(async () => {
  vi.restoreAllMocks();
  await phone.close();
});

const state = async () => (await phone.db.builds.get(BUILD))!.state;
const photo = {
  buildId: BUILD,
  stepId: null,
  wantedId: null,
  bytes: new ArrayBuffer(8),
  mediaType: 'image/jpeg' as const,
  sha256: 'a'.repeat(64),
  width: 1,
  height: 1,
};

describe('an act at the bench', () => {
  it('S1: is entry and state together, and the state is the fold of the entries', async () => {
    await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' });
    await startTimer(phone.db, { buildId: BUILD, stepId: 'glue-outer', at: 5 });
    await writeNote(phone.db, { buildId: BUILD, text: 'knot at the foot', stepId: 'cut-legs' });
    const entries = await getEntries(phone.db, BUILD);
    expect(entries).toHaveLength(3);
    expect(JSON.parse(JSON.stringify(await state()))).toEqual(JSON.parse(JSON.stringify(foldEntries(entries))));
    expect(timersOf(await state())).toMatchObject([{ stepId: 'glue-outer', times: { 'first-glue': 5 } }]);
  });

  it('S1: on a full phone it is not saved, says what to do, and leaves nothing half', async () => {
    vi.spyOn(phone.db.builds, 'update').mockRejectedValue(new DOMException('full', 'QuotaExceededError'));
    const result = await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' });
    expect(result).toMatchObject({ ok: false, code: 'full' });
    expect(result.ok ? '' : result.message).toContain('Free some space');
    expect(await getEntries(phone.db, BUILD)).toHaveLength(0);
    expect(stepMark(await state(), 'cut-legs')).toBe('open');
  });

  it('S1: a full phone that only aborts the transaction is told apart from others', async () => {
    const abort = new Dexie.AbortError('aborted', new DOMException('full', 'QuotaExceededError') as unknown as Error);
    vi.spyOn(phone.db, 'transaction').mockRejectedValue(abort);
    expect(await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' })).toMatchObject({
      ok: false,
      code: 'full',
    });
  });

  it('is repeated after a lost connection to the storage, once', async () => {
    const transaction = phone.db.transaction.bind(phone.db) as (...args: unknown[]) => Promise<unknown>;
    const spy = vi.spyOn(phone.db, 'transaction');
    spy.mockImplementationOnce((() => Promise.reject(new Dexie.DatabaseClosedError('lost'))) as never);
    spy.mockImplementation(transaction as never);
    expect(await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' })).toMatchObject({ ok: true });
    expect(await getEntries(phone.db, BUILD)).toHaveLength(1);
  });

  it('a note over its length is refused with the limit, and its draft stays', async () => {
    await saveDraft(phone.db, 'note/1', 'x'.repeat(1_000_000));
    const result = await writeNote(phone.db, {
      buildId: BUILD,
      text: 'x'.repeat(1_000_000),
      stepId: null,
      draftKey: 'note/1',
    });
    expect(result).toMatchObject({ ok: false, code: 'invalid' });
    expect(result.ok ? '' : result.message).toContain('20000');
    expect(await getDraft(phone.db, 'note/1')).toHaveLength(1_000_000);
  });

  it('a note takes its draft with it', async () => {
    await saveDraft(phone.db, 'note/1', 'knot');
    await writeNote(phone.db, { buildId: BUILD, text: 'knot', stepId: null, draftKey: 'note/1' });
    expect(await getDraft(phone.db, 'note/1')).toBe('');
    expect(notesOf(await state())).toHaveLength(1);
  });

  it('a photo keeps bytes and entry together', async () => {
    await addPhoto(phone.db, photo);
    expect(await phone.db.photos.get([BUILD, photo.sha256])).toMatchObject({ length: 8, sync: 'held' });
    expect(photosOf(await state())).toHaveLength(1);
    vi.spyOn(phone.db.photos, 'add').mockRejectedValue(new DOMException('full', 'QuotaExceededError'));
    expect(await addPhoto(phone.db, { ...photo, sha256: 'b'.repeat(64) })).toMatchObject({ ok: false, code: 'full' });
    expect(photosOf(await state())).toHaveLength(1);
  });

  it('is refused for one who only looks on, and for a build that is not here', async () => {
    await phone.db.builds.update(BUILD, { role: 'onlooker' });
    expect(await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' })).toMatchObject({
      ok: false,
      code: 'not-yours',
    });
    expect(await markStep(phone.db, { buildId: uuidOf(9), stepId: 'cut-legs', mark: 'done' })).toMatchObject({
      ok: false,
      code: 'no-build',
    });
  });
});

describe('accounts on one phone', () => {
  afterEach(async () => {
    await deviceDatabase().accounts.clear();
    await deviceDatabase().facts.clear();
  });

  it('have a database each, under one id of the phone', async () => {
    const [a, b] = [uuidOf(0xaa), uuidOf(0xbb)];
    const [first, second] = [await openAccountDatabase(a), await openAccountDatabase(b)];
    expect(first.deviceId).toBe(second.deviceId);
    expect(await getDeviceId()).toBe(first.deviceId);
    await saveDraft(first, 'note/1', 'mine');
    expect(await getDraft(second, 'note/1')).toBe('');
    await Promise.all([a, b].map(closeAccountDatabase));
    await Promise.all([a, b].map((id) => Dexie.delete(databaseName(id))));
  });

  it('leaving keeps what is held; throwing it away takes the typed word', async () => {
    const account = { accountId: phone.db.accountId, name: 'Robin', email: 'robin@holdfast.example' };
    await enterAccount(account, 1);
    await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' });
    await keepHere(phone.db);
    expect(await getCurrentAccount()).toBeNull();
    expect(await getKnownAccounts()).toHaveLength(1);
    expect(await getHeldCounts(phone.db)).toMatchObject({ entries: 1 });
    expect(await discardAccount(phone.db, 1, 'yes')).toBe(false);
    expect(await getHeldCounts(phone.db)).toMatchObject({ entries: 1 });
    expect(await discardAccount(phone.db, 1, ' Discard ')).toBe(true);
    expect(await getKnownAccounts()).toHaveLength(0);
  });

  it('what is held can be taken out as a file, photos too', async () => {
    await addPhoto(phone.db, photo);
    const file = JSON.parse(await exportHeld(phone.db)) as { entries: unknown[]; photos: { base64: string }[] };
    expect(file.entries).toHaveLength(1);
    expect(atob(file.photos[0]!.base64)).toHaveLength(8);
  });

  it('settings are those of the phone', async () => {
    await saveSettings({ system: 'metric' });
    expect(await getSettings()).toMatchObject({ system: 'metric', denominator: 16 });
  });
});
