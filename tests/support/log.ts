import type { LogEntryOf, StandingEntry } from '@/lib/domain/build/entry';
import { entryKinds, type EntryKind, type EntryTarget, type EntryValueInput } from '@/lib/domain/build/kinds';
import { readEntry } from '@/lib/domain/build/read-entry';

let made = 0;

/** A UUID that is the same for the same number. */
export function uuidOf(number: number): string {
  return `00000000-0000-7000-8000-${number.toString(16).padStart(12, '0')}`;
}

export const BUILD = uuidOf(0xb);
export const ACCOUNT = uuidOf(0xa);
export const PHONE = uuidOf(0xd);

interface Beside {
  id?: string;
  deviceId?: string;
  madeAt?: number;
  stamp?: number;
  position?: number | null;
  seen?: number;
}

/** An entry as it stands in a log, judged like a real one. */
export function entry<K extends EntryKind>(
  kind: K,
  target: EntryTarget<K>,
  value: EntryValueInput<K>,
  {
    id = uuidOf(0x1000 + (made += 1)),
    deviceId = PHONE,
    madeAt = 1_000 + made,
    stamp = madeAt,
    position = null,
    seen = 0,
  }: Beside = {},
): StandingEntry {
  const read = readEntry({ id, buildId: BUILD, deviceId, madeAt, seen, kind, v: entryKinds[kind].v, target, value });
  if (!read.ok) throw new Error(read.message);
  return { ...(read.entry as LogEntryOf<K>), accountId: ACCOUNT, stamp, position } as unknown as StandingEntry;
}

/** Ticks of steps, in this order. */
export function done(...stepIds: string[]): StandingEntry[] {
  return stepIds.map((stepId) => entry('step-marked', { stepId }, { mark: 'done' }));
}

type TimerEvent = EntryTarget<'timer-marked'>['event'];

/** A glue timer of a step with the times (ms) of what was told to it. */
export function gluing(
  stepId: string,
  times: Partial<Record<TimerEvent, number>>,
  { timerId = uuidOf(0x70), temperatureC = null }: { timerId?: string; temperatureC?: number | null } = {},
): StandingEntry[] {
  return (Object.entries(times) as [TimerEvent, number][]).map(([event, at]) =>
    entry('timer-marked', { timerId, event }, { stepId, at, temperatureC }),
  );
}
