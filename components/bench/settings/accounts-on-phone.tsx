'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useState } from 'react';
import { getKnownAccounts } from '@/lib/store/device-database';
import { ActButton } from '../entry/act-button';
import { SignOutForm } from '@/components/sync/sign-out-form';
import { useBench } from '../shell/bench-context';

/** Who has used this phone. Each account's records are in a store of their own; signing in changes which is shown. */
export function AccountsOnPhone() {
  const { account } = useBench();
  const accounts = useLiveQuery(getKnownAccounts, []);
  const [leaving, setLeaving] = useState(false);
  const others = accounts?.filter(({ accountId }) => accountId !== account.accountId) ?? [];
  return (
    <section aria-labelledby="accounts" className="grid gap-3">
      <h2 id="accounts" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Accounts on this phone
      </h2>
      <p>
        <b>{account.name}</b>, {account.email}: this bench.
      </p>
      {others.map(({ accountId, name, email }) => (
        <p key={accountId} className="text-soft">
          {name}, {email}: kept apart; sign in as them to see it.
        </p>
      ))}
      {leaving ? (
        <SignOutForm onLeave={() => setLeaving(false)} />
      ) : (
        <ActButton onClick={() => setLeaving(true)}>Sign out</ActButton>
      )}
    </section>
  );
}
