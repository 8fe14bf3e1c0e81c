import { v4 } from 'uuid';
import type { EntryTarget } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

export interface TimerMark {
  buildId: string;
  timerId: string;
  event: EntryTarget<'timer-marked'>['event'];
  stepId: string;
  /** When it happened, ms since 1970. */
  at: number;
  temperatureC?: number | null;
  note?: string;
}

/** Tells an event of a glue timer: first glue, clamps on, clamps off, put away. */
export function markTimer(db: AccountDatabase, { buildId, timerId, event, ...value }: TimerMark): Promise<Saved> {
  return recordEntry(db, buildId, 'timer-marked', { target: { timerId, event }, value });
}

/** One tap at first glue. */
export function startTimer(db: AccountDatabase, mark: Omit<TimerMark, 'timerId' | 'event'>): Promise<Saved> {
  return markTimer(db, { ...mark, timerId: v4(), event: 'first-glue' });
}
