import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { applyEntries, emptyState, foldEntries } from '@/lib/domain/build/fold';
import { notesOf, photosOf, pieceMark, stepClaim, stepMark } from '@/lib/domain/build/views';
import { entry, uuidOf } from '../../support/log';

const step = (number: number) => ({ stepId: `step-${number}` });

/** A random history: registers, collections, revisions and undos, stamps that tie, some entries still held. */
const history = fc
  .array(
    fc.record({
      act: fc.constantFrom('tick', 'skip', 'open', 'piece', 'note', 'revise', 'remove', 'undo', 'redo', 'timer'),
      subject: fc.integer({ min: 1, max: 4 }),
      stamp: fc.integer({ min: 1, max: 12 }),
      held: fc.boolean(),
    }),
    { maxLength: 40 },
  )
  .map((acts) =>
    acts.map(({ act, subject, stamp, held }, i): StandingEntry => {
      const beside = { id: uuidOf(i + 1), stamp, madeAt: stamp, position: held ? null : i + 1 };
      const itemId = uuidOf(0x900 + subject);
      switch (act) {
        case 'piece':
          return entry(
            'piece-marked',
            { partId: 'side', piece: subject },
            { mark: stamp % 2 ? 'cut' : 'open' },
            beside,
          );
        case 'note':
          return entry('note-written', { noteId: itemId }, { text: `note ${i}`, stepId: null }, beside);
        case 'revise':
          return entry('note-revised', { noteId: itemId }, { text: `revision ${i}` }, beside);
        case 'remove':
          return entry('item-removed', { collection: 'notes', itemId }, { removed: stamp % 2 === 0 }, beside);
        case 'undo':
          return entry('entry-undone', { entryId: uuidOf(subject) }, { undone: true }, beside);
        case 'redo':
          return entry('entry-undone', { entryId: uuidOf(subject) }, { undone: false }, beside);
        case 'timer':
          return entry(
            'timer-marked',
            { timerId: itemId, event: stamp % 2 ? 'first-glue' : 'clamps-on' },
            { stepId: 'step-1', at: stamp },
            beside,
          );
        default:
          return entry(
            'step-marked',
            step(subject),
            { mark: ({ tick: 'done', skip: 'skipped', open: 'open' } as const)[act as 'tick'] },
            beside,
          );
      }
    }),
  );

const plain = (value: unknown) => JSON.parse(JSON.stringify(value)) as unknown;

describe('the fold', () => {
  it('S4: does not depend on the order in which entries arrive, nor on how they are cut into batches', () => {
    fc.assert(
      fc.property(history, fc.integer(), fc.integer({ min: 1, max: 7 }), (entries, seed, size) => {
        const shuffled = [...entries].sort(
          (a, b) =>
            Math.sin(seed + Number.parseInt(a.id.slice(-6), 16)) - Math.sin(seed + Number.parseInt(b.id.slice(-6), 16)),
        );
        let state = emptyState();
        for (let from = 0; from < shuffled.length; from += size)
          state = applyEntries(state, shuffled.slice(from, from + size));
        expect(plain(state)).toEqual(plain(foldEntries(entries)));
      }),
      { numRuns: 300 },
    );
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

  it('S6: a kind or version of a later program is parked and counts after the update', () => {
    const known = entry('step-marked', step(1), { mark: 'done' });
    const newer = { ...known, id: uuidOf(88), v: 99 };
    const unknown = { ...known, id: uuidOf(89), kind: 'moon-phase' } as unknown as StandingEntry;
    const state = foldEntries([newer, unknown]);
    expect(stepMark(state, 'step-1')).toBe('open');
    expect(Object.keys(state.parked)).toEqual([uuidOf(88), uuidOf(89)]);
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
});
