import { afterEach, beforeEach, expect, it } from 'vitest';
import { emptyState } from '@/lib/domain/build/fold';
import { stepMark } from '@/lib/domain/build/views';
import { markStep } from '@/lib/store/mutations/mark-step';
import { getEntries } from '@/lib/store/queries/builds';
import { refoldAfterUpdate } from '@/lib/store/refold-after-update';
import { FakeSyncServer } from '../fakes/sync-server';
import { BUILD } from '../support/log';
import { openPhone, type Phone } from '../support/phone';

let phone: Phone;
beforeEach(async () => {
  phone = await openPhone(1, new FakeSyncServer());
});
afterEach(() => phone.close());

const state = async () => (await phone.db.builds.get(BUILD))!.state;

it('S6: what an older program parked counts after the update, and is folded anew only once', async () => {
  await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' });
  const [entry] = await getEntries(phone.db, BUILD);
  const parked = { ...emptyState(), parked: { [entry!.id]: { entryId: entry!.id, kind: 'step-marked', v: 1 } } };
  const asOlderProgram = () => phone.db.builds.update(BUILD, { state: parked });

  await asOlderProgram();
  await phone.db.facts.put({ key: 'foldedWith', value: 'note-written 1' });
  await refoldAfterUpdate(phone.db);
  expect(stepMark(await state(), 'cut-legs')).toBe('done');
  expect((await state()).parked).toEqual({});

  await asOlderProgram();
  await refoldAfterUpdate(phone.db);
  expect(stepMark(await state(), 'cut-legs')).toBe('open');
});

it('S5: leaves what was refused out', async () => {
  await markStep(phone.db, { buildId: BUILD, stepId: 'cut-legs', mark: 'done' });
  await phone.db.entries.toCollection().modify({ sync: 'refused' });
  await refoldAfterUpdate(phone.db);
  expect(stepMark(await state(), 'cut-legs')).toBe('open');
});
