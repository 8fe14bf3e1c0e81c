import Dexie from 'dexie';
import { closeAccountDatabase, databaseName, type AccountDatabase } from './database';
import { forgetAccount, leaveAccount } from './device-database';

/** Word that a person types before records that are only here are thrown away. */
export const DISCARD_WORD = 'discard';

/** Leaves the account on this phone and keeps its records here, to be sent after its next sign-in. */
export async function keepHere(db: AccountDatabase): Promise<void> {
  await leaveAccount();
  await closeAccountDatabase(db.accountId);
}

/**
 * Throws an account's records on this phone away. Records that the server has stay there.
 *
 * @returns false, having done nothing, unless nothing is held here or the word was typed
 */
export async function discardAccount(db: AccountDatabase, heldHere: number, typed: string): Promise<boolean> {
  if (heldHere > 0 && typed.trim().toLowerCase() !== DISCARD_WORD) return false;
  await forgetAccount(db.accountId);
  await closeAccountDatabase(db.accountId);
  await Dexie.delete(databaseName(db.accountId));
  return true;
}
