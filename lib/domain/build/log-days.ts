import type { PlanDocument } from '../plan/document';
import { describeEntry, type DescribeOptions } from './describe-entry';
import { entryVersion } from './entry-versions';
import { compareStanding, type StandingEntry } from './entry';
import { isUndoable, undoneIds } from './undo';

export interface LogItem {
  entryId: string;
  kind: StandingEntry['kind'];
  /** When it was made by the phone that made it, ms. */
  at: number;
  accountId: string;
  words: string;
  undone: boolean;
  undoable: boolean;
  /** Still only on this phone. */
  held: boolean;
  /** Hash of the photo that goes with it. */
  photo?: string;
}

export interface LogSession {
  sessionId: string | null;
  items: LogItem[];
}

export interface LogDay {
  day: string;
  sessions: LogSession[];
}

/**
 * The log as people read it: by day, then by session, in order of standing. Undos mark what they undo and are not rows
 * of their own.
 *
 * @param dayOf  day of a time in the person's own zone, for example `2026-12-01`
 */
export function logDays(
  entries: readonly StandingEntry[],
  plan: PlanDocument,
  dayOf: (ms: number) => string,
  options: DescribeOptions,
): LogDay[] {
  const undone = undoneIds(entries);
  const days: LogDay[] = [];
  let sessionId: string | null = null;
  for (const entry of [...entries].sort(compareStanding)) {
    if (entry.kind === 'entry-undone') continue;
    if (entry.kind === 'session-opened') sessionId = entry.target.sessionId;
    const name = dayOf(entry.madeAt);
    let day = days.at(-1);
    if (day?.day !== name) days.push((day = { day: name, sessions: [] }));
    let session = day.sessions.at(-1);
    if (session?.sessionId !== sessionId || !session) day.sessions.push((session = { sessionId, items: [] }));
    session.items.push({
      entryId: entry.id,
      kind: entry.kind,
      at: entry.madeAt,
      accountId: entry.accountId,
      words: entryVersion(entry.kind) ? describeEntry(entry, plan, options) : 'An entry of a newer version of Holdfast',
      undone: undone.has(entry.id),
      undoable: isUndoable(entry),
      held: entry.position === null,
      ...(entry.kind === 'photo-taken' ? { photo: entry.value.sha256 } : {}),
    });
    if (entry.kind === 'session-closed') sessionId = null;
  }
  return days;
}
