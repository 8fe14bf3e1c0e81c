import Dexie, { type Table } from 'dexie';
import { v4 } from 'uuid';

/** How a person wants the bench to look and count; one set for each phone. */
export interface DeviceSettings {
  system: 'imperial' | 'metric';
  denominator: 2 | 4 | 8 | 16 | 32 | 64 | 128;
  feet: boolean;
  theme: 'phone' | 'day' | 'dim';
  textScale: 1 | 1.15 | 1.3;
  photosOnWifiOnly: boolean;
}

export const defaultSettings: DeviceSettings = {
  system: 'imperial',
  denominator: 16,
  feet: false,
  theme: 'phone',
  textScale: 1,
  photosOnWifiOnly: false,
};

/** An account that was used on this phone. Its records are in a database of its own. */
export interface KnownAccount {
  accountId: string;
  name: string;
  email: string;
  lastUsedAt: number;
}

interface Fact {
  key: string;
  value: unknown;
}

class DeviceDatabase extends Dexie {
  facts!: Table<Fact, string>;
  accounts!: Table<KnownAccount, string>;

  constructor() {
    super('holdfast-device', { chromeTransactionDurability: 'strict' });
    this.version(1).stores({ facts: 'key', accounts: 'accountId' });
  }
}

let open: DeviceDatabase | undefined;

/** What this phone knows before anyone is named: its id, its settings and who has used it. */
export function deviceDatabase(): DeviceDatabase {
  open ??= new DeviceDatabase();
  return open;
}

async function readFact<T>(key: string): Promise<T | undefined> {
  return (await deviceDatabase().facts.get(key))?.value as T | undefined;
}

/** Id of this browser profile, made once. */
export async function getDeviceId(): Promise<string> {
  // Looked up without a write first: a durable write would hold up every opening.
  const kept = await readFact<string>('deviceId');
  if (kept) return kept;
  const db = deviceDatabase();
  return db.transaction('rw', db.facts, async () => {
    const known = await readFact<string>('deviceId');
    if (known) return known;
    const id = v4();
    await db.facts.put({ key: 'deviceId', value: id });
    return id;
  });
}

export async function getSettings(): Promise<DeviceSettings> {
  return { ...defaultSettings, ...(await readFact<Partial<DeviceSettings>>('settings')) };
}

export async function saveSettings(changes: Partial<DeviceSettings>): Promise<void> {
  const db = deviceDatabase();
  await db.transaction('rw', db.facts, async () => {
    await db.facts.put({ key: 'settings', value: { ...(await getSettings()), ...changes } });
  });
}

/** Account whose records the bench shows; null before the first sign-in. */
export async function getCurrentAccount(): Promise<KnownAccount | null> {
  const accountId = await readFact<string | null>('currentAccountId');
  return (accountId && (await deviceDatabase().accounts.get(accountId))) || null;
}

export async function getKnownAccounts(): Promise<KnownAccount[]> {
  return deviceDatabase().accounts.orderBy('accountId').toArray();
}

/** Makes an account the one that the bench shows. Nothing of another account is touched. */
export async function enterAccount(account: Omit<KnownAccount, 'lastUsedAt'>, now: number): Promise<void> {
  const db = deviceDatabase();
  await db.transaction('rw', db.facts, db.accounts, async () => {
    await db.accounts.put({ ...account, lastUsedAt: now });
    await db.facts.put({ key: 'currentAccountId', value: account.accountId });
  });
}

/** Nobody is signed in on this phone any more; records that are held here stay in their account's database. */
export async function leaveAccount(): Promise<void> {
  await deviceDatabase().facts.put({ key: 'currentAccountId', value: null });
}

/**
 * Notes that this browser's sign-in is still to be ended at the server, because it was left with no signal; `false` once
 * it has ended or another took its place.
 */
export async function saveSignOutOwed(owed: boolean): Promise<void> {
  await deviceDatabase().facts.put({ key: 'signOutOwed', value: owed });
}

export async function isSignOutOwed(): Promise<boolean> {
  return (await readFact<boolean>('signOutOwed')) === true;
}

/** Takes an account off the list of this phone, after its database was deleted. */
export async function forgetAccount(accountId: string): Promise<void> {
  const db = deviceDatabase();
  await db.transaction('rw', db.facts, db.accounts, async () => {
    await db.accounts.delete(accountId);
    if ((await readFact('currentAccountId')) === accountId)
      await db.facts.put({ key: 'currentAccountId', value: null });
  });
}
