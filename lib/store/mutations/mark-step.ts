import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Ticks, skips or opens a step again. */
export function markStep(
  db: AccountDatabase,
  { buildId, stepId, ...value }: { buildId: string; stepId: string } & EntryValueInput<'step-marked'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'step-marked', { target: { stepId }, value });
}
