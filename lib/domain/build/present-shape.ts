import type { LogEntry } from './entry';
import { entryVersion } from './entry-versions';
import { entryMigrations, migrateParts, type EntryMigrations } from './migrate-entry';

/** Kinds and versions that a program knows, and how it brings older ones up. */
export interface EntryShapes {
  /** Version at which the program writes a kind; undefined for a kind it does not know. */
  versionOf: (kind: string) => number | undefined;
  migrations: EntryMigrations;
}

export const presentShapes: EntryShapes = { versionOf: entryVersion, migrations: entryMigrations };

/** True for an entry that this program can read: a known kind, at its present version or an older one. */
export function isKnown({ kind, v }: Pick<LogEntry, 'kind' | 'v'>, shapes: EntryShapes = presentShapes): boolean {
  return v <= (shapes.versionOf(kind) ?? 0);
}

/**
 * An entry of a known kind in the shape of today (S6). One that is there already comes back itself.
 *
 * @throws Error when a migration is missing: a broken release
 */
export function toPresentShape<E extends LogEntry>(entry: E, shapes: EntryShapes = presentShapes): E {
  const v = shapes.versionOf(entry.kind);
  if (v === undefined || entry.v >= v) return entry;
  return { ...entry, ...migrateParts(entry.kind, entry, entry.v, v, shapes.migrations), v };
}
