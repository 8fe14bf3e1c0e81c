import type { StandingEntry } from './entry';
import { compareStanding } from './entry';
import { isKnown, presentShapes, toPresentShape, type EntryShapes } from './present-shape';
import type { BuildState, Claim, CollectionItem } from './state';

/** State of a build with no entries. Keys come from entries, so every record is without a prototype. */
export function emptyState(): BuildState {
  const none = () => Object.create(null);
  return {
    steps: none(),
    pieces: none(),
    timers: none(),
    keySizes: none(),
    checks: none(),
    sessionsOpened: none(),
    sessionsClosed: none(),
    removed: none(),
    undone: none(),
    notes: none(),
    measurements: none(),
    photos: none(),
    departures: none(),
    parked: none(),
  };
}

/**
 * State of a build from all its entries.
 *
 * Idempotent and independent of the order and number of times in which entries arrive: only their standing
 * (stamp, position, id) orders them.
 */
export function foldEntries(entries: readonly StandingEntry[], shapes: EntryShapes = presentShapes): BuildState {
  return applyEntries(emptyState(), entries, shapes);
}

/**
 * State after some more entries. The given state is left as it was; parts that do not change are shared with it.
 *
 * An entry already in the state is replaced when its standing is now the server's (position not null), so a late echo of
 * an estimate cannot unsettle what the server has ordered. An older version is brought to the present shape; what this
 * program does not know is parked, and counts as soon as one that knows it is given the entry again (S6). After a
 * restore of the server positions are given anew: then fold all entries afresh.
 *
 * @param shapes  kinds and versions known; those of this program unless a test says otherwise
 */
export function applyEntries(
  state: BuildState,
  entries: readonly StandingEntry[],
  shapes: EntryShapes = presentShapes,
): BuildState {
  if (entries.length === 0) return state;
  const draft = new Draft(state, shapes);
  for (const entry of entries) draft.take(entry);
  return draft.state;
}

type Records = { [K in keyof BuildState]: BuildState[K] };
type ClaimRecord = Exclude<keyof BuildState, 'timers' | 'notes' | 'measurements' | 'photos' | 'departures' | 'parked'>;
type Collection = 'notes' | 'measurements' | 'photos' | 'departures';

/** Copies a record or list the first time it is written, so that folding a page of entries copies each only once. */
class Draft {
  readonly state: Records;
  private readonly copied = new Set<object>();

  constructor(
    from: BuildState,
    private readonly shapes: EntryShapes,
  ) {
    this.state = { ...from };
  }

  take(raw: StandingEntry): void {
    if (!isKnown(raw, this.shapes)) return this.park(raw);
    if (Object.hasOwn(this.state.parked, raw.id)) delete this.record('parked')[raw.id];
    const entry = toPresentShape(raw, this.shapes);
    switch (entry.kind) {
      case 'step-marked':
        return this.claim('steps', entry.target.stepId, entry);
      case 'piece-marked':
        return this.claim('pieces', `${entry.target.partId}#${entry.target.piece}`, entry);
      case 'timer-marked':
        return this.claimTimer(entry.target.timerId, entry.target.event, entry);
      case 'key-size-set': {
        const { keySizeId, stockPiece } = entry.target;
        return this.claim('keySizes', stockPiece === null ? keySizeId : `${keySizeId}@${stockPiece}`, entry);
      }
      case 'check-recorded':
        return this.claim('checks', `${entry.target.stepId}/${entry.target.checkId}`, entry);
      case 'session-opened':
        return this.claim('sessionsOpened', entry.target.sessionId, entry);
      case 'session-closed':
        return this.claim('sessionsClosed', entry.target.sessionId, entry);
      case 'item-removed':
        return this.claim('removed', `${entry.target.collection}/${entry.target.itemId}`, entry);
      case 'entry-undone':
        return this.claim('undone', entry.target.entryId, entry);
      case 'note-written':
      case 'note-revised':
        return this.revise('notes', entry.target.noteId, entry);
      case 'measurement-taken':
      case 'measurement-revised':
        return this.revise('measurements', entry.target.measurementId, entry);
      case 'photo-taken':
      case 'photo-captioned':
        return this.revise('photos', entry.target.photoId, entry);
      case 'departure-recorded':
      case 'departure-revised':
        return this.revise('departures', entry.target.departureId, entry);
    }
  }

  private own<T extends object>(value: T, copy: (value: T) => T): T {
    if (this.copied.has(value)) return value;
    const fresh = copy(value);
    this.copied.add(fresh);
    return fresh;
  }

  private record<K extends keyof BuildState>(name: K): Record<string, unknown> {
    const owned = this.own(this.state[name] as Record<string, unknown>, copyRecord);
    this.state[name] = owned as BuildState[K];
    return owned;
  }

  private claim(name: ClaimRecord, key: string, entry: StandingEntry): void {
    const record = this.record(name);
    record[key] = this.insert((record[key] as Claim<unknown>[] | undefined) ?? [], entry);
  }

  private claimTimer(timerId: string, event: string, entry: StandingEntry): void {
    const timers = this.record('timers');
    const events = this.own((timers[timerId] as Record<string, unknown> | undefined) ?? {}, copyRecord);
    timers[timerId] = events;
    events[event] = this.insert((events[event] as Claim<unknown>[] | undefined) ?? [], entry);
  }

  private revise(name: Collection, id: string, entry: StandingEntry): void {
    const record = this.record(name);
    const item = (record[id] as CollectionItem<unknown> | undefined) ?? { id, revisions: [] };
    record[id] = { id, revisions: this.insert(item.revisions, entry) };
  }

  private park(entry: StandingEntry): void {
    this.record('parked')[entry.id] = { entryId: entry.id, kind: entry.kind, v: entry.v };
  }

  /** Puts the entry's claim in its place by standing; replaces its own earlier claim when this standing is better. */
  private insert(claims: Claim<unknown>[], entry: StandingEntry): Claim<unknown>[] {
    const claim: Claim<unknown> = {
      entryId: entry.id,
      stamp: entry.stamp,
      position: entry.position,
      madeAt: entry.madeAt,
      accountId: entry.accountId,
      deviceId: entry.deviceId,
      value: entry.value,
    };
    const known = claims.findLastIndex(({ entryId }) => entryId === entry.id);
    if (known >= 0 && !isBetter(claim, claims[known]!)) return claims;
    const owned = this.own(claims, (list) => [...list]);
    if (known >= 0) owned.splice(known, 1);
    owned.splice(placeOf(owned, claim), 0, claim);
    return owned;
  }
}

/**
 * Which of two standings of one entry counts, whichever came first: the server's over an estimate, the later of two
 * alike.
 */
function isBetter(claim: Claim<unknown>, known: Claim<unknown>): boolean {
  const [settled, wasSettled] = [claim.position !== null, known.position !== null];
  return settled === wasSettled ? compareClaims(claim, known) > 0 : settled;
}

/** Index at which a claim stands among claims in order; nearly always the end, so that is asked first. */
function placeOf(claims: readonly Claim<unknown>[], claim: Claim<unknown>): number {
  let [low, high] = [0, claims.length];
  if (high === 0 || compareClaims(claims[high - 1]!, claim) < 0) return high;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (compareClaims(claims[middle]!, claim) < 0) low = middle + 1;
    else high = middle;
  }
  return low;
}

function compareClaims(a: Claim<unknown>, b: Claim<unknown>): number {
  return compareStanding({ ...a, id: a.entryId }, { ...b, id: b.entryId });
}

function copyRecord<T extends object>(record: T): T {
  return Object.assign(Object.create(null), record);
}
