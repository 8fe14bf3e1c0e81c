import { v7 } from 'uuid';
import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Work begins. */
export function openSession(db: AccountDatabase, { buildId, at }: { buildId: string; at: number }): Promise<Saved> {
  return recordEntry(db, buildId, 'session-opened', { target: { sessionId: v7() }, value: { at } });
}

/** Work ends for today. */
export function closeSession(
  db: AccountDatabase,
  { buildId, sessionId, ...value }: { buildId: string; sessionId: string } & EntryValueInput<'session-closed'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'session-closed', { target: { sessionId }, value });
}
