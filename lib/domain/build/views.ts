import { at, counting, inForce, isRemoved } from './claims';
import type { EntryTarget, EntryValue } from './kinds';
import type { BuildState, Claim, CollectionItem } from './state';

export type StepMark = EntryValue<'step-marked'>['mark'];

/** The claim in force on a step, or undefined when it was never marked. */
export function stepClaim(state: BuildState, stepId: string): Claim<EntryValue<'step-marked'>> | undefined {
  return inForce(state, at(state.steps, stepId));
}

/** Mark of a step; a step nobody has marked is open. */
export function stepMark(state: BuildState, stepId: string): StepMark {
  return stepClaim(state, stepId)?.value.mark ?? 'open';
}

/** Mark of one piece of a part; pieces are numbered from 1. */
export function pieceMark(state: BuildState, partId: string, piece: number): 'cut' | 'open' {
  return inForce(state, at(state.pieces, `${partId}#${piece}`))?.value.mark ?? 'open';
}

type TimerEvent = EntryTarget<'timer-marked'>['event'];

/** A glue timer as told: absolute times (ms) of the events that happened. */
export interface TimerTimes {
  timerId: string;
  stepId: string;
  times: Partial<Record<TimerEvent, number>>;
  temperatureC: number | null;
}

/** Timers whose first glue counts, earliest first. Two phones starting one glue-up give two timers: both are shown. */
export function timersOf(state: BuildState): TimerTimes[] {
  const timers: TimerTimes[] = [];
  for (const timerId of Object.keys(state.timers)) {
    const events = at(state.timers, timerId)!;
    const first = inForce(state, events['first-glue']);
    if (!first) continue;
    const times: TimerTimes['times'] = {};
    for (const event of Object.keys(events) as TimerEvent[]) {
      const claim = inForce(state, events[event]);
      if (claim) times[event] = claim.value.at;
    }
    timers.push({ timerId, stepId: first.value.stepId, times, temperatureC: first.value.temperatureC ?? null });
  }
  return timers.sort((a, b) => a.times['first-glue']! - b.times['first-glue']! || (a.timerId < b.timerId ? -1 : 1));
}

/** Measured key sizes in force: key size id, or `id@piece of stock`, to its length; those set back to none are left out. */
export function measuredKeySizes(state: BuildState): Record<string, number> {
  const measured: Record<string, number> = Object.create(null);
  for (const key of Object.keys(state.keySizes)) {
    const length = inForce(state, at(state.keySizes, key))?.value.length;
    if (length !== undefined && length !== null) measured[key] = length;
  }
  return measured;
}

/** Result in force of a check, or undefined when it was not taken or was cleared. */
export function checkOf(
  state: BuildState,
  stepId: string,
  checkId: string,
): Claim<EntryValue<'check-recorded'>> | undefined {
  const claim = inForce(state, at(state.checks, `${stepId}/${checkId}`));
  return claim?.value.verdict === 'cleared' ? undefined : claim;
}

/** What a person has put into a collection, with who and when; revisions counted, removed ones left out. */
export interface ItemView<V> {
  id: string;
  /** Time of making by the phone that made it, ms. */
  madeAt: number;
  accountId: string;
  entryId: string;
  value: V;
  /** How many times it was changed after it was made. */
  revised: number;
  held: boolean;
}

function itemsOf<V extends object>(
  state: BuildState,
  collection: 'notes' | 'measurements' | 'photos' | 'departures',
  isMade: (value: object) => boolean,
): ItemView<V>[] {
  const record = state[collection] as Record<string, CollectionItem<object>>;
  const views: ItemView<V>[] = [];
  for (const id of Object.keys(record)) {
    const item = at(record, id)!;
    if (isRemoved(state, collection, item)) continue;
    const claims = counting(state, item.revisions);
    const made = claims.find((claim) => isMade(claim.value));
    if (!made) continue;
    const changes = claims.filter((claim) => claim !== made && !isMade(claim.value));
    const value = Object.assign({}, made.value, ...changes.map((claim) => claim.value)) as V;
    views.push({
      id,
      madeAt: made.madeAt,
      accountId: made.accountId,
      entryId: made.entryId,
      value,
      revised: changes.length,
      held: claims.some((claim) => claim.position === null),
    });
  }
  return views.sort((a, b) => a.madeAt - b.madeAt || (a.id < b.id ? -1 : 1));
}

export const notesOf = (state: BuildState) =>
  itemsOf<EntryValue<'note-written'>>(state, 'notes', (value) => 'about' in value);
export const measurementsOf = (state: BuildState) =>
  itemsOf<EntryValue<'measurement-taken'>>(state, 'measurements', (value) => 'stepId' in value);
export const photosOf = (state: BuildState) =>
  itemsOf<EntryValue<'photo-taken'>>(state, 'photos', (value) => 'sha256' in value);
export const departuresOf = (state: BuildState) =>
  itemsOf<EntryValue<'departure-recorded'>>(state, 'departures', (value) => 'touches' in value);

/** A stretch of work: opened by a first act or a tap, closed by close-down; open ones have no end. */
export interface SessionView {
  sessionId: string;
  openedAt: number | null;
  closedAt: number | null;
  minutes: number | null;
  firstNext: string;
}

/** Sessions in order of opening. One that was closed without a known opening has only its end. */
export function sessionsOf(state: BuildState): SessionView[] {
  const ids = new Set([...Object.keys(state.sessionsOpened), ...Object.keys(state.sessionsClosed)]);
  const sessions: SessionView[] = [];
  for (const sessionId of ids) {
    const opened = inForce(state, at(state.sessionsOpened, sessionId));
    const closed = inForce(state, at(state.sessionsClosed, sessionId));
    if (!opened && !closed) continue;
    sessions.push({
      sessionId,
      openedAt: opened?.value.at ?? null,
      closedAt: closed?.value.at ?? null,
      minutes: closed?.value.minutes ?? null,
      firstNext: closed?.value.firstNext ?? '',
    });
  }
  return sessions.sort((a, b) => (a.openedAt ?? a.closedAt!) - (b.openedAt ?? b.closedAt!));
}
