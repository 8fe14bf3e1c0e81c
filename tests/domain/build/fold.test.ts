import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { applyEntries, emptyState, foldEntries } from '@/lib/domain/build/fold';
import type { EntryParts } from '@/lib/domain/build/migrate-entry';
import type { EntryShapes } from '@/lib/domain/build/present-shape';
import type { BuildState } from '@/lib/domain/build/state';
import { notesOf, photosOf, pieceMark, stepClaim, stepMark, timersOf } from '@/lib/domain/build/views';
import { arrivals, history } from '../../support/history';
import { entry, uuidOf } from '../../support/log';

const step = (number: number) => ({ stepId: `step-${number}` });

function foldInBatches(entries: readonly StandingEntry[], size: number) {
  let state = emptyState();
  for (let from = 0; from < entries.length; from += size) state = applyEntries(state, entries.slice(from, from + size));
  return state;
}

const plain = (value: unknown) => JSON.parse(JSON.stringify(value)) as unknown;

describe('the fold', () => {
  it('S4: does not depend on order, repetition or batches of what arrives', () => {
    fc.assert(
      fc.property(arrivals, ({ entries, order, size }) => {
        expect(plain(foldInBatches(order, size))).toEqual(plain(foldEntries(entries)));
      }),
      { numRuns: 300 },
    );
  });

  it('S4: what the server has settled stands, whenever the estimates of it come', () => {
    fc.assert(
      fc.property(arrivals, fc.array(fc.integer({ min: 1, max: 12 })), ({ entries, order, size }, guesses) => {
        const settle = (all: StandingEntry[]) =>
          all.map((each) => ({ ...each, position: Number.parseInt(each.id.slice(-6), 16) }) as StandingEntry);
        const estimates = order.map(
          (each, i) => ({ ...each, position: null, stamp: guesses[i] ?? 3 }) as StandingEntry,
        );
        const mixed = settle(order).flatMap((each, i) => (i % 2 ? [each, estimates[i]!] : [estimates[i]!, each]));
        expect(plain(foldInBatches(mixed, size))).toEqual(plain(foldEntries(settle(entries))));
      }),
    );
  });

  it('of two estimates of one entry the same one stands, whichever comes first', () => {
    const early = entry('step-marked', step(1), { mark: 'done' }, { id: uuidOf(76), stamp: 5 });
    const late = { ...early, stamp: 9 };
    expect(plain(foldEntries([early, late]))).toEqual(plain(foldEntries([late, early])));
  });

  it('S2: an entry that arrives again changes nothing', () => {
    fc.assert(
      fc.property(history, (entries) => {
        const once = foldEntries(entries);
        expect(plain(applyEntries(once, entries))).toEqual(plain(once));
      }),
    );
  });

  it('leaves the state it is given as it was', () => {
    fc.assert(
      fc.property(history, history, (before, more) => {
        const state = foldEntries(before);
        const copy = plain(state);
        applyEntries(state, more);
        expect(plain(state)).toEqual(copy);
      }),
    );
  });

  it('S4: the estimate of a phone gives way to the standing of the server, whichever comes first', () => {
    const id = uuidOf(77);
    const held = entry('step-marked', step(1), { mark: 'done' }, { id, stamp: 50 });
    const accepted = { ...held, stamp: 10, position: 1 };
    const later = entry('step-marked', step(1), { mark: 'skipped' }, { stamp: 20, position: 2 });
    for (const order of [
      [held, accepted, later],
      [accepted, later, held],
      [later, held, accepted],
    ]) {
      expect(stepMark(foldEntries(order), 'step-1')).toBe('skipped');
    }
  });

  it('S6: a kind or version of a later program is parked, and counts when it is given again after the update', () => {
    const known = entry('step-marked', step(1), { mark: 'done' });
    const newer = { ...known, id: uuidOf(88), v: 99 };
    const unknown = { ...known, id: uuidOf(89), kind: 'moon-phase' } as unknown as StandingEntry;
    const state = foldEntries([newer, unknown]);
    expect(stepMark(state, 'step-1')).toBe('open');
    expect(Object.keys(state.parked)).toEqual([uuidOf(88), uuidOf(89)]);

    const step98 = (parts: EntryParts) => parts;
    const updated: EntryShapes = {
      versionOf: (kind) => (kind === 'step-marked' ? 99 : undefined),
      migrations: { 'step-marked': Array.from({ length: 98 }, () => step98) },
    };
    const after = applyEntries(state, [newer, unknown], updated);
    expect(stepMark(after, 'step-1')).toBe('done');
    expect(Object.keys(after.parked)).toEqual([uuidOf(89)]);
    expect(plain(after)).toEqual(plain(foldEntries([unknown, newer], updated)));
  });

  it('S6: an entry of an older version counts in the shape of today', () => {
    const old = {
      ...entry('step-marked', step(1), { mark: 'done' }),
      value: { ticked: true },
    } as unknown as StandingEntry;
    const shapes: EntryShapes = {
      versionOf: (kind) => (kind === 'step-marked' ? 2 : undefined),
      migrations: {
        'step-marked': [({ target, value }) => ({ target, value: { mark: value['ticked'] ? 'done' : 'open' } })],
      },
    };
    expect(stepMark(foldEntries([old], shapes), 'step-1')).toBe('done');
  });

  it('survives a trip through JSON', () => {
    fc.assert(
      fc.property(history, history, (before, more) => {
        const direct = applyEntries(foldEntries(before), more);
        const stored = JSON.parse(JSON.stringify(foldEntries(before))) as ReturnType<typeof emptyState>;
        expect(plain(applyEntries(stored, more))).toEqual(plain(direct));
      }),
    );
  });
});

describe('what the fold says', () => {
  it('an undo brings back what was before, and taking it back restores it', () => {
    const done = entry('step-marked', step(1), { mark: 'done' }, { stamp: 1, position: 1 });
    const skipped = entry('step-marked', step(1), { mark: 'skipped' }, { stamp: 2, position: 2 });
    const undo = entry('entry-undone', { entryId: skipped.id }, { undone: true }, { stamp: 3, position: 3 });
    const redo = entry('entry-undone', { entryId: skipped.id }, { undone: false }, { stamp: 4, position: 4 });
    expect(stepMark(foldEntries([done, skipped]), 'step-1')).toBe('skipped');
    expect(stepMark(foldEntries([done, skipped, undo]), 'step-1')).toBe('done');
    expect(stepMark(foldEntries([done, skipped, undo, redo]), 'step-1')).toBe('skipped');
  });

  it('an edit keeps the old, and a revision that arrives first waits for its note', () => {
    const noteId = uuidOf(5);
    const revised = entry('note-revised', { noteId }, { text: 'three coats' }, { stamp: 2, position: 2 });
    const written = entry(
      'note-written',
      { noteId },
      { text: 'two coats', stepId: 'finish' },
      { stamp: 1, position: 1 },
    );
    expect(notesOf(foldEntries([revised]))).toEqual([]);
    const [note] = notesOf(foldEntries([revised, written]));
    expect(note).toMatchObject({ revised: 1, value: { text: 'three coats', stepId: 'finish' } });
    const state = foldEntries([revised, written]);
    expect(state.notes[noteId]!.revisions).toHaveLength(2);
  });

  it('a removal is an entry, and can be taken back', () => {
    const photoId = uuidOf(6);
    const photo = entry(
      'photo-taken',
      { photoId },
      { stepId: null, wantedId: null, sha256: 'a'.repeat(64), bytes: 1, mediaType: 'image/jpeg', width: 1, height: 1 },
    );
    const removed = entry('item-removed', { collection: 'photos', itemId: photoId }, { removed: true });
    const undo = entry('entry-undone', { entryId: removed.id }, { undone: true });
    expect(photosOf(foldEntries([photo, removed]))).toHaveLength(0);
    expect(photosOf(foldEntries([photo, removed, undo]))).toHaveLength(1);
  });

  it('ids that are names of the language are ids like others', () => {
    const state = JSON.parse(
      JSON.stringify(foldEntries([entry('step-marked', { stepId: 'constructor' }, { mark: 'done' })])),
    ) as ReturnType<typeof emptyState>;
    expect(stepMark(state, 'constructor')).toBe('done');
    expect(stepMark(emptyState(), 'constructor')).toBe('open');
    expect(
      stepClaim(JSON.parse(JSON.stringify(emptyState())) as ReturnType<typeof emptyState>, 'constructor'),
    ).toBeUndefined();
    expect(pieceMark(state, 'valueof', 1)).toBe('open');
  });

  it('an id made to reach the language’s own objects reaches nothing', () => {
    const evil = (kind: string, target: object, value: object) =>
      ({ ...entry('step-marked', step(1), { mark: 'done' }), kind, target, value }) as unknown as StandingEntry;
    const entries = [
      evil('step-marked', { stepId: '__proto__' }, { mark: 'done', polluted: true }),
      evil('timer-marked', { timerId: '__proto__', event: '__proto__' }, { stepId: 'a', at: 1 }),
      evil('note-written', { noteId: '__proto__' }, { text: 'x', stepId: null, about: 'note' }),
      { ...evil('moon-phase', {}, {}), id: '__proto__' } as StandingEntry,
    ];
    for (const from of [emptyState(), JSON.parse(JSON.stringify(emptyState())) as BuildState]) {
      const state = applyEntries(from, entries);
      expect(Object.keys(state.steps)).toEqual(['__proto__']);
      expect(stepMark(state, '__proto__')).toBe('done');
      expect(stepMark(JSON.parse(JSON.stringify(state)) as BuildState, '__proto__')).toBe('done');
      expect(notesOf(state)).toHaveLength(1);
      expect(timersOf(state)).toEqual([]);
      expect(stepMark(state, 'toString')).toBe('open');
    }
    expect(Object.keys(Object.prototype)).toEqual([]);
    expect(({} as { polluted?: boolean; mark?: string }).polluted).toBeUndefined();
  });
});
