import type { EntryKind } from './kinds';

/**
 * Version at which this program writes each kind. Apart from their shapes, so that reading a log does not load the
 * schemas; a test holds the two together.
 */
const entryVersions: Record<EntryKind, number> = {
  'step-marked': 1,
  'piece-marked': 1,
  'timer-marked': 1,
  'key-size-set': 1,
  'measurement-taken': 1,
  'measurement-revised': 1,
  'check-recorded': 1,
  'note-written': 1,
  'note-revised': 1,
  'photo-taken': 1,
  'photo-captioned': 1,
  'departure-recorded': 1,
  'departure-revised': 1,
  'item-removed': 1,
  'entry-undone': 1,
  'session-opened': 1,
  'session-closed': 1,
};

/** Version of a kind, or undefined for a kind that this program does not know. */
export function entryVersion(kind: string): number | undefined {
  return Object.hasOwn(entryVersions, kind) ? entryVersions[kind as EntryKind] : undefined;
}

/** Names every kind with its version. A state that was folded under other ones is folded anew from the entries (S6). */
export const entryVersionsKey = Object.entries(entryVersions)
  .map(([kind, v]) => `${kind} ${v}`)
  .sort()
  .join(', ');
