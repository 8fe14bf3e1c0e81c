import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Keeps the readings of a check with its verdict. */
export function recordCheck(
  db: AccountDatabase,
  {
    buildId,
    stepId,
    checkId,
    ...value
  }: { buildId: string; stepId: string; checkId: string } & EntryValueInput<'check-recorded'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'check-recorded', { target: { stepId, checkId }, value });
}
