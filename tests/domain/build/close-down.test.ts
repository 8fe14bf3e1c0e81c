import { describe, expect, it } from 'vitest';
import { closeDown } from '@/lib/domain/build/close-down';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import { progressOf } from '@/lib/domain/build/progress';
import { done, entry, gluing, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const close = (entries: StandingEntry[], now: number) => closeDown(plan, foldEntries(entries), now);
const opened = (sessionId: string, at: number, beside = {}) => entry('session-opened', { sessionId }, { at }, beside);
const closed = (sessionId: string, at: number, minutes: number) =>
  entry('session-closed', { sessionId }, { at, minutes, firstNext: 'Glue the lid' });

describe('closing down', () => {
  it('insists on oily rags after a coat of oil, and names what is in clamps and until when', () => {
    const entries = [
      opened(uuidOf(0x80), 0),
      ...done('finish-1'),
      ...gluing('glue-lid', { 'first-glue': 0, 'clamps-on': MINUTE }),
    ];
    const { items, curing, minutes } = close(entries, 30 * MINUTE);
    expect(items.find(({ kind }) => kind === 'rags')).toMatchObject({ level: 'danger' });
    expect(items.find(({ kind }) => kind === 'in-clamps')!.words).toContain('Lid');
    expect(curing).toMatchObject([{ earliest: 31 * MINUTE, latest: 61 * MINUTE }]);
    expect(minutes).toBe(30);
  });

  it('does not speak of rags when nothing was oiled, or it was in a session before', () => {
    const rags = (entries: StandingEntry[], now: number) =>
      close(entries, now).items.some(({ kind }) => kind === 'rags');
    expect(rags(done('choose-boards'), MINUTE)).toBe(false);
    const oiled = entry('step-marked', { stepId: 'finish-1' }, { mark: 'done' }, { madeAt: HOUR });
    expect(rags([oiled], 2 * HOUR)).toBe(true);
    expect(rags([oiled, opened(uuidOf(0x81), 3 * HOUR)], 4 * HOUR)).toBe(false);
    const undo = entry('entry-undone', { entryId: oiled.id }, { undone: true });
    expect(rags([oiled, undo], 2 * HOUR)).toBe(false);
  });

  it('speaks of rags whichever clock was behind, and of those of a second open session', () => {
    const behind = entry('step-marked', { stepId: 'finish-1' }, { mark: 'done' }, { madeAt: 1, stamp: 2 * HOUR });
    const session = opened(uuidOf(0x82), HOUR);
    expect(close([session, behind], 3 * HOUR).items.some(({ kind }) => kind === 'rags')).toBe(true);
    const early = entry('step-marked', { stepId: 'finish-1' }, { mark: 'done' }, { madeAt: 90 * MINUTE });
    const other = opened(uuidOf(0x83), 2 * HOUR);
    expect(close([session, early, other], 3 * HOUR).items.some(({ kind }) => kind === 'rags')).toBe(true);
  });

  it('asks for photos that done steps want and do not have', () => {
    const wanted = (entries: StandingEntry[]) =>
      close(entries, MINUTE).items.flatMap(({ kind, id }) => (kind === 'photo' ? [id] : []));
    const photo = entry(
      'photo-taken',
      { photoId: uuidOf(0x84) },
      {
        stepId: 'choose-boards',
        wantedId: 'boards-order',
        sha256: 'a'.repeat(64),
        bytes: 1,
        mediaType: 'image/jpeg',
        width: 1,
        height: 1,
      },
    );
    const removed = entry('item-removed', { collection: 'photos', itemId: uuidOf(0x84) }, { removed: true });
    expect(wanted([])).toEqual([]);
    expect(wanted(done('choose-boards'))).toEqual(['photo-boards-order']);
    expect(wanted([...done('choose-boards'), photo])).toEqual([]);
    expect(wanted([...done('choose-boards'), photo, removed])).toEqual(['photo-boards-order']);
  });

  it('does not leave open glue unsaid, and always asks for plugs and edges', () => {
    const { items } = close(gluing('glue-lid', { 'first-glue': 0 }), MINUTE);
    expect(items.find(({ kind }) => kind === 'open-glue')!.words).toContain('no clamps are');
    expect(items.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['unplug', 'sharp', 'sweep']));
    expect(new Set(items.map(({ id }) => id)).size).toBe(items.length);
  });

  it('says what comes first next time, and has no minutes where no session is open', () => {
    const entries = [opened(uuidOf(0x85), 0), closed(uuidOf(0x85), HOUR, 60), ...done('choose-boards')];
    expect(close(entries, 2 * HOUR)).toMatchObject({ session: null, minutes: 0 });
    expect(close(entries, 2 * HOUR).firstNext).not.toBe('');
  });
});

describe('hours', () => {
  const worked = (entries: StandingEntry[], now: number) => progressOf(plan, foldEntries(entries), now).minutesWorked;
  const session = uuidOf(0x86);

  it('are the minutes of closed sessions and the open one up to now', () => {
    const entries = [opened(uuidOf(0x87), 0), closed(uuidOf(0x87), HOUR, 45), opened(session, 2 * HOUR)];
    expect(worked(entries, 3 * HOUR)).toBe(45 + 60);
  });

  it('of a session that was never closed end with the last act in it, and are a day at most', () => {
    const open = opened(session, 0, { madeAt: 0 });
    const last = entry('step-marked', { stepId: 'choose-boards' }, { mark: 'done' }, { madeAt: 90 * MINUTE });
    expect(worked([open, last], 5 * HOUR)).toBe(300);
    expect(worked([open, last], 100 * HOUR)).toBe(90);
    expect(close([open, last], 100 * HOUR).minutes).toBe(90);
    const late = entry('step-marked', { stepId: 'measure-sheets' }, { mark: 'done' }, { madeAt: 99 * HOUR });
    expect(worked([open, late], 100 * HOUR)).toBe(1_440);
  });
});

describe('progress', () => {
  it('counts steps by stage, pieces, and the range of hands-on minutes left', () => {
    const skipped = entry('step-marked', { stepId: 'measure-sheets' }, { mark: 'skipped', reason: 'known' });
    const cut = entry('piece-marked', { partId: 'side', piece: 1 }, { mark: 'cut' });
    const entries = [...done('choose-boards'), skipped, cut];
    const before = progressOf(plan, foldEntries([]), 0);
    const after = progressOf(plan, foldEntries(entries), 0);
    expect(after).toMatchObject({ stepsDone: 1, stepsSkipped: 1, piecesCut: 1, stepsInAll: plan.steps.length });
    expect(after.byStage[0]).toMatchObject({ stageId: 'prepare', done: 1, skipped: 1, inAll: 3 });
    const [a, b] = plan.steps;
    expect(before.minutesLeft.max - after.minutesLeft.max).toBe(a!.minutes.max + b!.minutes.max);
    // The lid is glued up from its boards: it is not a piece to cut.
    const quantities = plan.parts.filter(({ id }) => id !== 'lid').map(({ quantity }) => quantity);
    expect(after.piecesInAll).toBe(quantities.reduce((sum, quantity) => sum + quantity, 0));
  });
});
