import { compareStanding, type StandingEntry } from './entry';
import { isKnown, toPresentShape } from './present-shape';

/** Kinds that an undo button takes back: acts on the record, not undos themselves or the opening of a session. */
const NOT_UNDOABLE: ReadonlySet<string> = new Set(['entry-undone', 'session-opened']);

/** True when an undo can be offered for an entry. */
export function isUndoable(entry: Pick<StandingEntry, 'kind'>): boolean {
  return !NOT_UNDOABLE.has(entry.kind);
}

/** Ids of entries that are undone at present. */
export function undoneIds(entries: readonly StandingEntry[]): Set<string> {
  const last = new Map<string, StandingEntry & { kind: 'entry-undone' }>();
  for (const raw of entries) {
    if (!isKnown(raw)) continue;
    const entry = toPresentShape(raw);
    if (entry.kind !== 'entry-undone') continue;
    const known = last.get(entry.target.entryId);
    if (!known || compareStanding(known, entry) < 0) last.set(entry.target.entryId, entry);
  }
  return new Set([...last.values()].filter(({ value }) => value.undone).map(({ target }) => target.entryId));
}

/** The newest entry of this phone that can be undone and is not; null when there is none. */
export function lastUndoable(entries: readonly StandingEntry[], deviceId: string): StandingEntry | null {
  const undone = undoneIds(entries);
  let last: StandingEntry | null = null;
  for (const entry of entries) {
    if (entry.deviceId !== deviceId || !isUndoable(entry) || undone.has(entry.id)) continue;
    if (!last || compareStanding(last, entry) < 0) last = entry;
  }
  return last;
}
