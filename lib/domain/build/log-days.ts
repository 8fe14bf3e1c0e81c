import type { PlanDocument } from '../plan/document';
import { describeEntry, type DescribeOptions } from './describe-entry';
import { compareStanding, type StandingEntry } from './entry';
import { isKnown, toPresentShape } from './present-shape';
import { isUndoable, undoneIds } from './undo';

export interface LogItem {
  entryId: string;
  kind: StandingEntry['kind'];
  /** When it was made, ms: its stamp, which is the phone's clock put right, so that times stand in order. */
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
 * of their own. An act belongs to the session that its phone opened, else to the one that is open.
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
  let open: { sessionId: string; deviceId: string }[] = [];
  for (const raw of [...entries].sort(compareStanding)) {
    const entry = isKnown(raw) ? toPresentShape(raw) : { ...raw, kind: null };
    if (entry.kind === 'entry-undone') continue;
    if (entry.kind === 'session-opened') open.push({ sessionId: entry.target.sessionId, deviceId: entry.deviceId });
    const its = open.findLast(({ deviceId }) => deviceId === entry.deviceId) ?? open.at(-1);
    const sessionId = entry.kind === 'session-closed' ? entry.target.sessionId : (its?.sessionId ?? null);
    sessionOn(days, dayOf(entry.stamp), sessionId).items.push({
      entryId: entry.id,
      kind: raw.kind,
      at: entry.stamp,
      accountId: entry.accountId,
      words: describeEntry(raw, plan, options),
      undone: undone.has(entry.id),
      undoable: isUndoable(raw),
      held: entry.position === null,
      ...(entry.kind === 'photo-taken' ? { photo: entry.value.sha256 } : {}),
    });
    if (entry.kind === 'session-closed' && !undone.has(entry.id))
      open = open.filter((session) => session.sessionId !== sessionId);
  }
  return days;
}

/** The session of a day that an entry goes into, begun when it is not there. Acts outside any session stand in between. */
function sessionOn(days: LogDay[], name: string, sessionId: string | null): LogSession {
  let day = days.at(-1);
  if (day?.day !== name) days.push((day = { day: name, sessions: [] }));
  const last = day.sessions.at(-1);
  const known = sessionId === null ? last : day.sessions.find((session) => session.sessionId === sessionId);
  if (known?.sessionId === sessionId) return known;
  const session = { sessionId, items: [] };
  day.sessions.push(session);
  return session;
}
