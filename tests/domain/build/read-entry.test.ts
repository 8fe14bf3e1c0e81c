import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { entryVersion } from '@/lib/domain/build/entry-versions';
import { entryKinds, MAX_NOTE_CHARACTERS } from '@/lib/domain/build/kinds';
import { migrateParts } from '@/lib/domain/build/migrate-entry';
import type { EntryShapes } from '@/lib/domain/build/present-shape';
import { MAX_ENTRY_SIZE, readEntry } from '@/lib/domain/build/read-entry';
import { assignStamp, estimateStamp } from '@/lib/domain/build/stamp';
import { BUILD, PHONE, uuidOf } from '../../support/log';

const good = {
  id: uuidOf(1),
  buildId: BUILD,
  deviceId: PHONE,
  madeAt: 1_000,
  seen: 0,
  kind: 'note-written',
  v: 1,
  target: { noteId: uuidOf(2) },
  value: { text: 'Grain runs out at the knot', stepId: null },
};

describe('readEntry', () => {
  it('takes an entry and fills its defaults', () => {
    expect(readEntry(good)).toMatchObject({ ok: true, entry: { value: { about: 'note' } } });
  });

  it.each([
    ['nothing', null, 'malformed'],
    ['a bare text', 'hello', 'malformed'],
    ['no id', { ...good, id: undefined }, 'malformed'],
    ['a negative cursor', { ...good, seen: -1 }, 'malformed'],
    ['a target of another kind', { ...good, target: { stepId: 'a' } }, 'malformed'],
    ['an empty note', { ...good, value: { text: '  ', stepId: null } }, 'malformed'],
    ['a field that is not known', { ...good, value: { ...good.value, colour: 'red' } }, 'malformed'],
    ['a step id that is no id', { ...good, value: { text: 'x', stepId: '__proto__' } }, 'malformed'],
    ['an unknown kind', { ...good, kind: 'moon-phase' }, 'unknown-kind'],
    ['a kind that is a name of the language', { ...good, kind: 'constructor' }, 'unknown-kind'],
    ['a newer version', { ...good, v: 2 }, 'newer-version'],
    [
      'a note over its length',
      { ...good, value: { text: 'x'.repeat(MAX_NOTE_CHARACTERS + 1), stepId: null } },
      'too-large',
    ],
    ['a note of 1 MB', { ...good, value: { text: 'x'.repeat(1_000_000), stepId: null } }, 'too-large'],
  ])('refuses %s', (_name, raw, code) => {
    const result = readEntry(raw);
    expect(result).toMatchObject({ ok: false, code });
    expect(result.ok ? '' : result.message.length).toBeGreaterThan(10);
  });

  it('keeps a note that was cut in the middle of an emoji, without the half that no database takes', () => {
    const result = readEntry({ ...good, value: { text: 'dry fit \ud83d and a \0 between 🪵', stepId: null } });
    expect(result).toMatchObject({ ok: true, entry: { value: { text: 'dry fit \ufffd and a \ufffd between 🪵' } } });
  });

  it.each([5_000, 25_000, 50_000])('refuses what is nested %i levels deep', (levels) => {
    const deep = JSON.parse('['.repeat(levels) + ']'.repeat(levels)) as unknown;
    expect(readEntry({ ...good, value: deep }).ok).toBe(false);
  });

  it('says how long a note may be', () => {
    const result = readEntry({ ...good, value: { text: 'x'.repeat(1_000_000), stepId: null } });
    expect(result.ok ? '' : result.message).toContain(String(MAX_NOTE_CHARACTERS));
  });

  it('holds an entry to 64 000 characters, wherever they stand', () => {
    const result = readEntry({ ...good, padding: 'x'.repeat(MAX_ENTRY_SIZE) });
    expect(result).toMatchObject({ ok: false, code: 'too-large' });
  });
});

describe('S6: entries of an older program', () => {
  /** A made-up past in which a note was `{ words }` at version 1 and had no kind of its own at version 2. */
  const shapes: EntryShapes = {
    versionOf: (kind) => (kind === 'note-written' ? 3 : undefined),
    migrations: {
      'note-written': [
        ({ target, value: { words, ...rest } }) => ({ target, value: { ...rest, text: words } }),
        ({ target, value }) => ({ target, value: { ...value, about: 'near-miss' } }),
      ],
    },
  };
  const old = { ...good, v: 1, value: { words: 'chisel slipped', stepId: null } };

  it('are brought to the present shape, step by step', () => {
    expect(readEntry(old, shapes)).toMatchObject({
      ok: true,
      entry: { v: 3, value: { text: 'chisel slipped', about: 'near-miss' } },
    });
    expect(readEntry({ ...good, v: 2 }, shapes)).toMatchObject({ ok: true, entry: { v: 3 } });
    expect(readEntry({ ...good, v: 4 }, shapes)).toMatchObject({ ok: false, code: 'newer-version' });
  });

  it.each([null, 'text', [], 7])('that are broken (%j) are refused, and no migration stumbles over them', (value) => {
    expect(readEntry({ ...old, value }, shapes)).toMatchObject({ ok: false, code: 'malformed' });
  });

  it('a release that forgot its migration says which', () => {
    expect(() => readEntry(old, { ...shapes, migrations: {} })).toThrow('no migration of note-written from version 1');
    expect(() => migrateParts('constructor', { target: {}, value: {} }, 1, 2)).toThrow('no migration of constructor');
  });
});

it.each(Object.entries(entryKinds))('the version of %s is that of its shape', (kind, { v }) =>
  expect(entryVersion(kind)).toBe(v),
);

describe('S4: the stamp', () => {
  const base = { madeAt: 5_000, clockOffsetMs: 0, receivedAt: 10_000, seenStamp: null, previousStamp: null };
  it.each([
    ['is the time of making, corrected by the measured offset', { ...base, clockOffsetMs: 250 }, 5_250],
    ['is not later than receipt, for a clock days ahead', { ...base, madeAt: 500_000_000 }, 10_000],
    [
      'is not earlier than anything that was seen, for a clock days behind',
      { ...base, madeAt: 1, seenStamp: 7_000 },
      7_000,
    ],
    [
      'is not earlier than the entry before it on the same phone',
      { ...base, madeAt: 1, previousStamp: 8_000, seenStamp: 7_000 },
      8_000,
    ],
  ])('%s', (_name, input, stamp) => expect(assignStamp(input)).toBe(stamp));

  it('keeps its bounds whatever the clock says, and never goes behind what is known', () => {
    const ms = fc.integer({ min: -8e15, max: 8e15 });
    fc.assert(
      fc.property(ms, ms, fc.nat(), fc.nat(), fc.nat(), (madeAt, clockOffsetMs, past, seenAgo, beforeAgo) => {
        const receivedAt = 1e12 + past;
        const [seenStamp, previousStamp] = [receivedAt - seenAgo, receivedAt - beforeAgo];
        const stamp = assignStamp({ madeAt, clockOffsetMs, receivedAt, seenStamp, previousStamp });
        expect(stamp).toBeLessThanOrEqual(receivedAt);
        expect(stamp).toBeGreaterThanOrEqual(Math.max(seenStamp, previousStamp));
        expect(Number.isSafeInteger(stamp)).toBe(true);
      }),
    );
  });

  it('lets what was seen rule where the clock of the server itself went back', () => {
    expect(assignStamp({ ...base, seenStamp: 12_000 })).toBe(12_000);
  });

  it('is estimated by the phone in the same way', () => {
    expect(estimateStamp({ madeAt: 5_000, clockOffsetMs: -1_000, seenStamp: 4_500, previousStamp: null })).toBe(4_500);
  });
});
