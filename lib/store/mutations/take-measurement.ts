import { v7 } from 'uuid';
import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Writes a length down with what was measured. */
export function takeMeasurement(
  db: AccountDatabase,
  { buildId, ...value }: { buildId: string } & EntryValueInput<'measurement-taken'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'measurement-taken', { target: { measurementId: v7() }, value });
}

/** Changes a measurement; the old one stays in the log. */
export function reviseMeasurement(
  db: AccountDatabase,
  { buildId, measurementId, what, length }: { buildId: string; measurementId: string; what: string; length: number },
): Promise<Saved> {
  return recordEntry(db, buildId, 'measurement-revised', { target: { measurementId }, value: { what, length } });
}
