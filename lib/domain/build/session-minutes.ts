import type { BuildState, Claim } from './state';

/** An open session in which nothing was done for this long was left open by mistake, ms. */
const LEFT_OPEN_MS = 12 * 3_600_000;
/** Most minutes that one session can have, a whole day. */
const MOST_MINUTES = 1_440;

/**
 * Minutes of a session that is still open: up to now, or up to the last act where somebody forgot to close it and
 * nothing was done for twelve hours. Whole minutes, at most a day.
 *
 * @param openedAt,now  ms since 1970
 */
export function openMinutes(state: BuildState, openedAt: number, now: number): number {
  const last = Math.max(openedAt, lastActUpTo(state, now));
  const end = now - last > LEFT_OPEN_MS ? last : now;
  return Math.min(MOST_MINUTES, Math.max(0, Math.round((end - openedAt) / 60_000)));
}

/** When the last act was made, by the phone that made it; acts of clocks that run ahead of `now` are passed over. */
function lastActUpTo(state: BuildState, now: number): number {
  let last = -Infinity;
  const look = (claims: readonly Claim<unknown>[]) => {
    for (const { madeAt } of claims) if (madeAt <= now && madeAt > last) last = madeAt;
  };
  const { steps, pieces, keySizes, checks, sessionsOpened, sessionsClosed, removed, undone } = state;
  for (const record of [steps, pieces, keySizes, checks, sessionsOpened, sessionsClosed, removed, undone])
    Object.values<Claim<unknown>[]>(record).forEach(look);
  for (const events of Object.values(state.timers)) Object.values<Claim<unknown>[]>(events).forEach(look);
  for (const items of [state.notes, state.measurements, state.photos, state.departures])
    Object.values<{ revisions: Claim<unknown>[] }>(items).forEach(({ revisions }) => look(revisions));
  return last;
}
