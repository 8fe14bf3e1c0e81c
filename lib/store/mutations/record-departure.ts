import { v7 } from 'uuid';
import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Writes down a change from the plan: what, why, and what it touches later. */
export function recordDeparture(
  db: AccountDatabase,
  { buildId, ...value }: { buildId: string } & EntryValueInput<'departure-recorded'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'departure-recorded', { target: { departureId: v7() }, value });
}
