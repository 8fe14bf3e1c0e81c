'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { formatLength } from '@/lib/domain/measure';
import { openAccountDatabase, type AccountDatabase } from '@/lib/store/database';
import { defaultSettings, getCurrentAccount, getSettings, type KnownAccount } from '@/lib/store/device-database';
import { SyncAgent } from '@/components/sync/sync-agent';
import { installShell } from '@/components/sync/update-prompt';
import { Announcer } from './shell/announcer';
import { BenchProvider } from './shell/bench-context';
import { BlankBench } from './shell/blank-bench';
import { formatAsRead, lengthStyle } from './shell/length-style';
import { SignedOutBench } from './shell/signed-out-bench';
import { StorageFault } from './shell/storage-fault';
import { useAccount } from './shell/use-account';
import { useAppearance } from './shell/use-appearance';
import { ViewSwitch } from './shell/view-switch';
import { warmUp } from './shell/warm-up';

if (typeof window !== 'undefined') void warmUp(window.location.search);

const never = () => () => {};

/** The whole bench. Nothing of the phone is read before it is mounted, so that the prerendered page always fits. */
export function Bench() {
  const mounted = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  useEffect(installShell, []);
  if (!mounted) return <BlankBench />;
  return (
    <StorageFault>
      <Announcer>
        <AccountBench />
      </Announcer>
    </StorageFault>
  );
}

function AccountBench() {
  const settings = useLiveQuery(getSettings, []);
  const known = useLiveQuery(async () => ({ account: await getCurrentAccount() }), []);
  useAppearance(settings ?? defaultSettings);
  const signIn = useAccount();
  if (!known || !settings) return <BlankBench />;
  if (!known.account) return <SignedOutBench state={signIn} />;
  return <OpenBench key={known.account.accountId} account={known.account} />;
}

function OpenBench({ account }: { account: KnownAccount }) {
  const db = useAccountDatabase(account.accountId);
  const settings = useLiveQuery(getSettings, []) ?? defaultSettings;
  const bench = useMemo(
    () =>
      db && {
        account,
        db,
        settings,
        format: (length: number) => formatLength(length, lengthStyle(settings)),
        formatRead: (length: number) => formatAsRead(length, settings),
      },
    [account, db, settings],
  );
  if (!bench) return <BlankBench />;
  return (
    <BenchProvider value={bench}>
      <SyncAgent>
        <ViewSwitch />
      </SyncAgent>
    </BenchProvider>
  );
}

/** The account's database once it is open; a refusal is thrown to the nearest {@link StorageFault}. */
function useAccountDatabase(accountId: string): AccountDatabase | null {
  const [opened, setOpened] = useState<{ db: AccountDatabase } | { error: unknown } | null>(null);
  useEffect(() => {
    let wanted = true;
    openAccountDatabase(accountId).then(
      (db) => wanted && setOpened({ db }),
      (error: unknown) => wanted && setOpened({ error }),
    );
    return () => {
      wanted = false;
    };
  }, [accountId]);
  if (opened && 'error' in opened) throw opened.error;
  return opened?.db ?? null;
}
