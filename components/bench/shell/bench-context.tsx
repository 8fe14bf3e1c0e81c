'use client';
import { createContext, useContext } from 'react';
import type { FormattedLength, Length } from '@/lib/domain/measure';
import type { AccountDatabase } from '@/lib/store/database';
import type { DeviceSettings, KnownAccount } from '@/lib/store/device-database';

export interface BenchContextValue {
  account: KnownAccount;
  db: AccountDatabase;
  settings: DeviceSettings;
  /** A length in the person's system and precision. */
  format: (length: Length) => FormattedLength;
  /** A length that was read off the work, finer than the person's precision where it was read finer. */
  formatRead: (length: Length) => FormattedLength;
}

const BenchContext = createContext<BenchContextValue | null>(null);

export const BenchProvider = BenchContext.Provider;

/** The open bench of the account. */
export function useBench(): BenchContextValue {
  const bench = useContext(BenchContext);
  if (!bench) throw new Error('useBench is used outside the open bench');
  return bench;
}
