import type { EntryKind, EntryTarget, EntryValue } from './kinds';

/** One act at the bench, as the phone wrote it. Immutable; `id` is the idempotency key (rule S2). */
export interface LogEntryOf<K extends EntryKind> {
  /** UUID v7, made on the phone, never used twice. */
  id: string;
  buildId: string;
  /** One phone, one browser profile. */
  deviceId: string;
  /** Phone's clock, ms since 1970. Information only: the stamp orders (S4). */
  madeAt: number;
  /** Position up to which this phone had others' entries when this one was made; 0 before the first. */
  seen: number;
  kind: K;
  /** Version of the kind's shape. */
  v: number;
  target: EntryTarget<K>;
  value: EntryValue<K>;
}

export type LogEntry = { [K in EntryKind]: LogEntryOf<K> }[EntryKind];

/** Where an entry stands in the order. Before the server has accepted it, the phone estimates the stamp and position is null. */
export interface Standing {
  /** ms since 1970 by the server's clock (S4). */
  stamp: number;
  /** Gapless number within the build (S3); null while held here. */
  position: number | null;
}

export type StandingEntry = LogEntry &
  Standing & {
    /** Account that made it. */
    accountId: string;
  };

/** Order of entries: stamp, then position (held entries last), then id. */
export function compareStanding(a: Standing & { id: string }, b: Standing & { id: string }): number {
  if (a.stamp !== b.stamp) return a.stamp - b.stamp;
  const byPosition = (a.position ?? Number.MAX_SAFE_INTEGER) - (b.position ?? Number.MAX_SAFE_INTEGER);
  if (byPosition !== 0) return byPosition;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}
