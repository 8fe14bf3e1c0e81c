import type { LogEntryOf } from './entry';
import { entryKinds, type EntryKind, type EntryTarget, type EntryValueInput } from './kinds';
import { readEntry } from './read-entry';
import type { RefusalCode } from './wire';

export interface EntryFields<K extends EntryKind> {
  /** UUID v7, fresh. */
  id: string;
  buildId: string;
  deviceId: string;
  /** ms since 1970 by this phone. */
  madeAt: number;
  /** Cursor: position up to which this phone holds the build's entries. */
  seen: number;
  target: EntryTarget<K>;
  value: EntryValueInput<K>;
}

/** Makes an entry of a kind at its present version, judged exactly as the server will judge it. */
export function makeEntry<K extends EntryKind>(
  kind: K,
  fields: EntryFields<K>,
): { ok: true; entry: LogEntryOf<K> } | { ok: false; code: RefusalCode; message: string } {
  const result = readEntry({ ...fields, kind, v: entryKinds[kind].v });
  return result.ok ? { ok: true, entry: result.entry as unknown as LogEntryOf<K> } : result;
}
