import type { Metadata } from 'next';
import type { ReactNode } from 'react';
import { ChangeEmailForm } from '@/components/account/change-email-form';
import { ChangePasswordForm } from '@/components/account/change-password-form';
import { NameForm } from '@/components/account/name-form';
import { SessionList } from '@/components/account/session-list';
import { SignOut } from '@/components/account/sign-out';
import { requireSession } from '@/lib/server/auth/current-account';
import { listSessions } from '@/lib/server/auth/sessions';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const { account, session } = await requireSession('/desk/account');
  const sessions = await listSessions(account.id, session.id);
  return (
    <div className="grid max-w-2xl gap-2">
      <h1 className="mb-4 text-4xl">Account</h1>
      <Part title="Name">
        <NameForm name={account.name} />
      </Part>
      <Part title="E-mail">
        <ChangeEmailForm email={account.email} />
      </Part>
      <Part title="Password">
        <ChangePasswordForm email={account.email} />
      </Part>
      <Part title="Signed in on">
        <SessionList sessions={sessions} />
      </Part>
      <Part title="Sign out">
        <SignOut accountId={account.id} />
      </Part>
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="grid gap-4 border-t-2 border-iron py-6">
      <h2 className="text-2xl">{title}</h2>
      {children}
    </section>
  );
}
