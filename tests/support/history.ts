import fc from 'fast-check';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { entry, uuidOf } from './log';

const step = (number: number) => ({ stepId: `step-${number}` });
const itemOf = (n: number) => uuidOf(0x900 + n);

const photoFacts = {
  stepId: null,
  wantedId: null,
  sha256: 'a'.repeat(64),
  bytes: 1,
  mediaType: 'image/jpeg' as const,
  width: 1,
  height: 1,
};

/** How each kind of act looks in a random history: `n` says what it is about, `m` what it says. */
const acts: Record<string, (n: number, m: number, beside: { id: string }) => StandingEntry> = {
  tick: (n, _, beside) => entry('step-marked', step(n), { mark: 'done' }, beside),
  skip: (n, _, beside) => entry('step-marked', step(n), { mark: 'skipped' }, beside),
  open: (n, _, beside) => entry('step-marked', step(n), { mark: 'open' }, beside),
  piece: (n, m, beside) =>
    entry('piece-marked', { partId: 'side', piece: n }, { mark: m % 2 ? 'cut' : 'open' }, beside),
  timer: (n, m, beside) =>
    entry(
      'timer-marked',
      { timerId: itemOf(n), event: (['first-glue', 'clamps-on', 'put-away'] as const)[m % 3]! },
      { stepId: 'step-1', at: m },
      beside,
    ),
  size: (n, m, beside) =>
    entry('key-size-set', { keySizeId: `size-${n}`, stockPiece: m % 2 ? null : 'A' }, { length: m }, beside),
  check: (n, m, beside) =>
    entry('check-recorded', { stepId: 'step-1', checkId: `check-${n}` }, { readings: [m], verdict: 'within' }, beside),
  note: (n, m, beside) => entry('note-written', { noteId: itemOf(n) }, { text: `note ${m}`, stepId: null }, beside),
  'note again': (n, m, beside) => entry('note-revised', { noteId: itemOf(n) }, { text: `revision ${m}` }, beside),
  measure: (n, m, beside) =>
    entry(
      'measurement-taken',
      { measurementId: itemOf(n) },
      { what: 'width', length: m, stepId: null, keySizeId: null },
      beside,
    ),
  'measure again': (n, m, beside) =>
    entry('measurement-revised', { measurementId: itemOf(n) }, { what: 'width', length: -m }, beside),
  photo: (n, _, beside) => entry('photo-taken', { photoId: itemOf(n) }, photoFacts, beside),
  caption: (n, m, beside) => entry('photo-captioned', { photoId: itemOf(n) }, { caption: `${m}` }, beside),
  departure: (n, m, beside) =>
    entry(
      'departure-recorded',
      { departureId: itemOf(n) },
      { what: `${m}`, why: '', stepId: null, touches: { steps: [], parts: [] } },
      beside,
    ),
  'departure again': (n, m, beside) =>
    entry('departure-revised', { departureId: itemOf(n) }, { what: `${m}`, why: 'so' }, beside),
  remove: (n, m, beside) =>
    entry(
      'item-removed',
      { collection: m % 2 ? 'notes' : 'photos', itemId: itemOf(n) },
      { removed: m % 3 > 0 },
      beside,
    ),
  undo: (n, m, beside) => entry('entry-undone', { entryId: uuidOf(n) }, { undone: m % 3 > 0 }, beside),
  begin: (n, m, beside) => entry('session-opened', { sessionId: itemOf(n) }, { at: m }, beside),
  close: (n, m, beside) => entry('session-closed', { sessionId: itemOf(n) }, { at: m, minutes: m }, beside),
  'later program': (n, _, beside) =>
    ({ ...entry('step-marked', step(n), { mark: 'done' }, beside), v: 9 }) as StandingEntry,
  'unknown kind': (n, _, beside) =>
    ({ ...entry('step-marked', step(n), { mark: 'done' }, beside), kind: 'moon-phase' }) as unknown as StandingEntry,
};

/** A random history of every kind: stamps that tie, some entries still held. */
export const history = fc
  .array(
    fc.record({
      act: fc.constantFrom(...Object.keys(acts)),
      subject: fc.integer({ min: 1, max: 4 }),
      stamp: fc.integer({ min: 1, max: 12 }),
      held: fc.boolean(),
    }),
    { maxLength: 40, size: 'max' },
  )
  .map((rows) =>
    rows.map(({ act, subject, stamp, held }, i) => {
      const beside = { id: uuidOf(i + 1), stamp, madeAt: stamp, position: held ? null : i + 1 };
      return acts[act]!(subject, stamp, beside);
    }),
  );

/** A history, and the order, repetition and batches in which its entries arrive. */
export const arrivals = history.chain((entries) =>
  fc.record({
    entries: fc.constant(entries),
    order: fc
      .tuple(
        fc.shuffledSubarray(entries, { minLength: entries.length }),
        entries.length === 0 ? fc.constant([]) : fc.array(fc.constantFrom(...entries), { maxLength: 20, size: 'max' }),
      )
      .chain(([all, again]) => fc.shuffledSubarray([...all, ...again], { minLength: all.length + again.length })),
    size: fc.integer({ min: 1, max: 7 }),
  }),
);
