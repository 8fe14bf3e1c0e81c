import type { EntryKind, EntryTarget, EntryValue } from './kinds';

/** One entry's claim on a register or item. All are kept, so that an undo or a late arrival can bring an earlier one back. */
export interface Claim<V> {
  entryId: string;
  stamp: number;
  position: number | null;
  madeAt: number;
  accountId: string;
  deviceId: string;
  value: V;
}

/** An item of a grow-only collection: revisions in order, first as written; removed when the register says so. */
export interface CollectionItem<V> {
  id: string;
  /** Claims of the creating entry and its revisions, in order of standing. */
  revisions: Claim<V>[];
}

/**
 * The fold of a build's entries. JSON, the same on the phone and the server. Registers hold every claim in order of
 * standing; the one in force is the last whose entry is not undone. Keys of registers:
 * steps by stepId; pieces by `partId#piece`; timers by `timerId`, then event; keySizes by `keySizeId` or
 * `keySizeId@stockPiece`; checks by `stepId/checkId`; removed by `collection/itemId`; undone by entryId.
 */
export interface BuildState {
  steps: Record<string, Claim<EntryValue<'step-marked'>>[]>;
  pieces: Record<string, Claim<EntryValue<'piece-marked'>>[]>;
  timers: Record<string, Partial<Record<EntryTarget<'timer-marked'>['event'], Claim<EntryValue<'timer-marked'>>[]>>>;
  keySizes: Record<string, Claim<EntryValue<'key-size-set'>>[]>;
  checks: Record<string, Claim<EntryValue<'check-recorded'>>[]>;
  sessionsOpened: Record<string, Claim<EntryValue<'session-opened'>>[]>;
  sessionsClosed: Record<string, Claim<EntryValue<'session-closed'>>[]>;
  removed: Record<string, Claim<EntryValue<'item-removed'>>[]>;
  undone: Record<string, Claim<EntryValue<'entry-undone'>>[]>;
  notes: Record<string, CollectionItem<EntryValue<'note-written'> | EntryValue<'note-revised'>>>;
  measurements: Record<string, CollectionItem<EntryValue<'measurement-taken'> | EntryValue<'measurement-revised'>>>;
  photos: Record<string, CollectionItem<EntryValue<'photo-taken'> | EntryValue<'photo-captioned'>>>;
  departures: Record<string, CollectionItem<EntryValue<'departure-recorded'> | EntryValue<'departure-revised'>>>;
  /** Entries of a kind or version this program does not know, kept to be replayed after an update (S6). */
  parked: Record<string, { entryId: string; kind: EntryKind | string; v: number }>;
}
