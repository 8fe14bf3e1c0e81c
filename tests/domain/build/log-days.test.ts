import { describe, expect, it } from 'vitest';
import { describeEntry } from '@/lib/domain/build/describe-entry';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { entryKinds, type EntryKind } from '@/lib/domain/build/kinds';
import { logDays } from '@/lib/domain/build/log-days';
import { lastUndoable } from '@/lib/domain/build/undo';
import { ACCOUNT, done, entry, gluing, PHONE, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const DAY = 86_400_000;
const options = { formatLength: (length: number) => ({ text: `${length / 640} mm` }) };
const dayOf = (ms: number) => new Date(ms).toISOString().slice(0, 10);
const days = (entries: StandingEntry[]) => logDays(entries, plan, dayOf, options);
const say = (of: StandingEntry) => describeEntry(of, plan, options);
const id = uuidOf(0x99);

const photo = {
  stepId: 'glue-lid',
  wantedId: null,
  sha256: 'a'.repeat(64),
  bytes: 1,
  mediaType: 'image/jpeg' as const,
  width: 1,
  height: 1,
};
const spoken: [StandingEntry, string][] = [
  [done('cut-laps')[0]!, 'Step 33, Cut the twelve half laps, ticked'],
  [
    entry('step-marked', { stepId: 'cut-laps' }, { mark: 'skipped', reason: 'butt joints' }),
    'Step 33, Cut the twelve half laps, skipped: butt joints',
  ],
  [entry('step-marked', { stepId: 'cut-laps' }, { mark: 'open' }), 'Step 33, Cut the twelve half laps, opened again'],
  [
    entry(
      'step-marked',
      { stepId: 'cut-laps' },
      {
        mark: 'done',
        reason: 'offcut first',
        passedLocks: [
          { lock: 'cure', protects: 'person-or-tool', about: 'glue-frame' },
          { lock: 'order', protects: 'order', about: 'layout-laps' },
        ],
      },
    ),
    'Step 33, Cut the twelve half laps, ticked, past glue not known to be cured and the order: offcut first',
  ],
  [entry('step-marked', { stepId: 'gone' }, { mark: 'done' }), 'A step of another revision, ticked'],
  [entry('piece-marked', { partId: 'side', piece: 2 }, { mark: 'cut' }), 'A Side, piece 2 of 2, cut'],
  [entry('piece-marked', { partId: 'shelf', piece: 1 }, { mark: 'open' }), 'F Shelf, left bay, not cut after all'],
  [gluing('glue-lid', { 'clamps-on': 5 })[0]!, 'Clamps on, step 11, Glue the halves to the lid'],
  [
    entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: null }, { length: 11_520 }),
    'Thickness of the 3/4 in plywood taken as 18 mm',
  ],
  [
    entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: 'sheet A' }, { length: null }),
    'Thickness of the 3/4 in plywood of sheet A set back to the plan',
  ],
  [
    entry(
      'measurement-taken',
      { measurementId: id },
      { what: 'Widest board', length: 83_200, stepId: 'choose-boards', keySizeId: null },
    ),
    'Widest board: 130 mm at step 1',
  ],
  [
    entry('measurement-revised', { measurementId: id }, { what: 'Widest board', length: 84_480 }),
    'Measurement changed: Widest board: 132 mm',
  ],
  [
    entry(
      'check-recorded',
      { stepId: 'glue-carcass', checkId: 'wet-square' },
      { readings: [640_000, 641_280], verdict: 'accepted', reason: 'the back pulls it' },
    ),
    'Check Carcass is square in its clamps: 1000 mm and 1002 mm, accepted as it is: the back pulls it',
  ],
  [
    entry('note-written', { noteId: id }, { text: 'Knot', stepId: 'choose-boards', about: 'near-miss' }),
    'Near miss at step 1: Knot',
  ],
  [entry('note-revised', { noteId: id }, { text: 'Two knots' }), 'Note changed: Two knots'],
  [entry('photo-taken', { photoId: id }, { ...photo, caption: 'cauls' }), 'Photo at step 11: cauls'],
  [entry('photo-captioned', { photoId: id }, { caption: '' }), 'Photo’s caption taken off'],
  [
    entry(
      'departure-recorded',
      { departureId: id },
      { what: 'Dowels', why: 'no biscuits', stepId: null, touches: { steps: [], parts: [] } },
    ),
    'Departure: Dowels — no biscuits',
  ],
  [entry('departure-revised', { departureId: id }, { what: 'Splines', why: '' }), 'Departure changed: Splines'],
  [entry('item-removed', { collection: 'notes', itemId: id }, { removed: true }), 'A note was taken out'],
  [entry('entry-undone', { entryId: id }, { undone: false }), 'Took an undo back'],
  [entry('session-opened', { sessionId: id }, { at: 1 }), 'Work began'],
  [
    entry('session-closed', { sessionId: id }, { at: 2, minutes: 90, firstNext: 'Glue the lid' }),
    'Closed down after 90 min. First next time: Glue the lid',
  ],
];

describe('an entry in words', () => {
  it.each(spoken.map(([of, words]) => [words, of] as const))('%s', (words, of) => expect(say(of)).toBe(words));

  it('is there for every kind', () => {
    const kinds = new Set(spoken.map(([{ kind }]) => kind));
    expect((Object.keys(entryKinds) as EntryKind[]).filter((kind) => !kinds.has(kind))).toEqual([]);
  });

  it('S6: of a later program says that it is', () => {
    const known = done('choose-boards')[0]!;
    for (const later of [
      { ...known, v: 2, value: {} },
      { ...known, kind: 'moon-phase', value: null },
      { ...known, kind: 'photo-taken', v: 2, target: null, value: null },
      { ...known, kind: 'entry-undone', v: 2, target: null, value: null },
      { ...known, kind: 'session-opened', v: 2, target: null, value: null },
    ]) {
      expect(say(later as unknown as StandingEntry)).toBe('An entry of a newer version of Holdfast');
      const [day] = days([later as unknown as StandingEntry]);
      expect(day!.sessions[0]!.items).toMatchObject([{ words: 'An entry of a newer version of Holdfast' }]);
    }
  });
});

describe('the log by day and session', () => {
  const s1 = uuidOf(0xa1);
  const at = (madeAt: number) => ({ madeAt });
  const first = entry('session-opened', { sessionId: s1 }, { at: DAY }, at(DAY));
  const tick = entry('step-marked', { stepId: 'choose-boards' }, { mark: 'done' }, at(DAY + 1));
  const close = entry('session-closed', { sessionId: s1 }, { at: DAY + 2, minutes: 30 }, at(DAY + 2));
  const late = entry('note-written', { noteId: uuidOf(0xa2) }, { text: 'at home', stepId: null }, at(DAY + 3));
  const next = entry('photo-taken', { photoId: uuidOf(0xa3) }, photo, { madeAt: 2 * DAY, position: 5 });
  const undo = entry('entry-undone', { entryId: tick.id }, { undone: true }, at(2 * DAY + 1));
  const redo = entry('entry-undone', { entryId: tick.id }, { undone: false }, at(2 * DAY + 2));

  it('stands in order however the entries come, with who, and what is only held here', () => {
    const log = days([next, late, close, tick, first]);
    expect(log.map(({ day }) => day)).toEqual(['1970-01-02', '1970-01-03']);
    expect(log[0]!.sessions.map(({ sessionId, items }) => [sessionId, items.length])).toEqual([
      [s1, 3],
      [null, 1],
    ]);
    const [shown] = log[1]!.sessions[0]!.items;
    expect(shown).toMatchObject({ photo: 'a'.repeat(64), accountId: ACCOUNT, held: false, at: 2 * DAY });
    expect(log[0]!.sessions[0]!.items.every(({ held }) => held)).toBe(true);
  });

  it('keeps what was undone and marks it, until the undo is taken back; undos are no rows', () => {
    const row = (entries: StandingEntry[]) =>
      days(entries).flatMap(({ sessions }) => sessions.flatMap(({ items }) => items));
    expect(row([tick, undo])).toMatchObject([{ entryId: tick.id, undone: true }]);
    expect(row([redo, tick, undo])).toMatchObject([{ entryId: tick.id, undone: false }]);
  });

  it('goes on with a session whose closing was undone', () => {
    const mistake = entry('entry-undone', { entryId: close.id }, { undone: true }, at(DAY + 4));
    expect(days([first, tick, close, late, mistake])[0]!.sessions).toHaveLength(1);
  });

  it('keeps two phones apart that each opened a session with no signal, and one that opened none with the other', () => {
    const [mine, theirs] = [uuidOf(0xa5), uuidOf(0xa6)];
    const helper = uuidOf(0xd8);
    const by = (deviceId: string, madeAt: number) => ({ deviceId, madeAt });
    const tickBy = (deviceId: string, madeAt: number) =>
      entry('step-marked', { stepId: 'choose-boards' }, { mark: 'done' }, by(deviceId, madeAt));
    const log = days([
      entry('session-opened', { sessionId: mine }, { at: 1 }, by(PHONE, 1)),
      entry('session-opened', { sessionId: theirs }, { at: 2 }, by(helper, 2)),
      tickBy(PHONE, 3),
      tickBy(helper, 4),
      entry('session-closed', { sessionId: theirs }, { at: 5, minutes: 1 }, by(helper, 5)),
      tickBy(helper, 6),
      tickBy(PHONE, 7),
      entry('session-closed', { sessionId: mine }, { at: 8, minutes: 1 }, by(PHONE, 8)),
    ]);
    expect(log[0]!.sessions.map(({ sessionId, items }) => [sessionId, items.map(({ at }) => at)])).toEqual([
      [mine, [1, 3, 6, 7, 8]],
      [theirs, [2, 4, 5]],
    ]);
  });

  it('S4: puts an entry of a phone whose clock is days off where its stamp says', () => {
    const off = entry(
      'note-written',
      { noteId: uuidOf(0xa4) },
      { text: 'clock', stepId: null },
      { madeAt: 9 * DAY, stamp: DAY + 1 },
    );
    const log = days([tick, off, late]);
    expect(log).toHaveLength(1);
    expect(log[0]!.sessions[0]!.items.map(({ at }) => at)).toEqual([DAY + 1, DAY + 1, DAY + 3]);
  });

  it('the last act of this phone can be undone, not others’, not an undo, not what is undone', () => {
    const others = entry(
      'step-marked',
      { stepId: 'measure-sheets' },
      { mark: 'done' },
      { madeAt: 3 * DAY, deviceId: uuidOf(0xd9) },
    );
    const all = [first, tick, late, others];
    expect(lastUndoable(all, PHONE)?.id).toBe(late.id);
    const undone = entry('entry-undone', { entryId: late.id }, { undone: true });
    expect(lastUndoable([...all, undone], PHONE)?.id).toBe(tick.id);
    expect(lastUndoable([first], PHONE)).toBeNull();
    expect(lastUndoable([], PHONE)).toBeNull();
  });
});
