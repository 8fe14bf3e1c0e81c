'use client';
import Link from 'next/link';
import { useState } from 'react';
import { z } from 'zod';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { confirmEmailForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { Outcome } from './outcome';
import { send } from './send';
import { useAccountForm } from './use-account-form';
import { useLinkSecret } from './use-link-secret';

const answer = z.object({ email: z.string() });
const wayBack = (
  <Link href="/desk/account" className={linkLook.quiet}>
    To your account
  </Link>
);

/** The page behind the link that was sent to a new address. A press uses it, so that a mail program that opens links does not. */
export function NewAddressForm() {
  const secret = useLinkSecret();
  if (secret === undefined) return null;
  if (secret !== null) return <UseAddress key={secret} secret={secret} />;
  return <Notice tone="info">This page opens from the link in a letter. {wayBack}</Notice>;
}

function UseAddress({ secret }: { secret: string }) {
  const [email, setEmail] = useState<string | null>(null);
  const { submit, failure, press } = useAccountForm({
    schema: confirmEmailForm,
    given: { token: secret },
    act: (values) => send('POST', '/api/accounts/new-address', answer, values),
    onDone: (value) => setEmail(value.email),
  });
  if (email !== null) {
    return (
      <Outcome title="Your address is changed">
        <p>
          From now on you sign in with <strong className="break-words">{email}</strong>.
        </p>
        <p>{wayBack}</p>
      </Outcome>
    );
  }
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Use this address"
      running="Changing"
      press={press}
      help={failure?.code === 'link-spent' && wayBack}
    >
      <p className="text-lg">Your account at Holdfast will use the address to which this link was sent.</p>
    </AccountForm>
  );
}
