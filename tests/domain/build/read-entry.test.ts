import { describe, expect, it } from 'vitest';
import { entryVersion } from '@/lib/domain/build/entry-versions';
import { entryKinds, MAX_NOTE_CHARACTERS } from '@/lib/domain/build/kinds';
import { migrateParts } from '@/lib/domain/build/migrate-entry';
import { readEntry } from '@/lib/domain/build/read-entry';
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

  it('S6: brings an older version to the present shape, step by step', () => {
    const migrations = {
      'made-up': [
        ({ target, value }: { target: unknown; value: unknown }) => ({ target, value: { ...(value as object), b: 2 } }),
        ({ target, value }: { target: unknown; value: unknown }) => ({ target, value: { ...(value as object), c: 3 } }),
      ],
    };
    expect(migrateParts('made-up', { target: 1, value: { a: 1 } }, 1, 3, migrations)).toEqual({
      target: 1,
      value: { a: 1, b: 2, c: 3 },
    });
    expect(() => migrateParts('made-up', { target: 1, value: {} }, 1, 4, migrations)).toThrow(
      /no migration of made-up from version 3/,
    );
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

  it('is estimated by the phone in the same way', () => {
    expect(estimateStamp({ madeAt: 5_000, clockOffsetMs: -1_000, seenStamp: 4_500, previousStamp: null })).toBe(4_500);
  });
});
