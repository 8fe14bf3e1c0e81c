'use client';
import { useState } from 'react';
import { z } from 'zod';
import Link from 'next/link';
import { linkLook } from '@/components/ui/link-look';
import { confirmForm, emailForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { EmailField } from './email-field';
import { LetterSent } from './letter-sent';
import { PasswordField } from './password-field';
import { send } from './send';
import { signIn } from './sign-in-out';
import { useAccountForm } from './use-account-form';
import { useLinkSecret } from './use-link-secret';

const confirmed = z.object({ email: z.string() });
const sent = z.object({ sent: z.literal(true) });

/** The page behind the link of a sign-up, and, opened without one, the way to a new letter. */
export function ConfirmForm() {
  const secret = useLinkSecret();
  if (secret === undefined) return null;
  return secret === null ? <LetterAgainForm /> : <PasswordForLink key={secret} secret={secret} />;
}

function PasswordForLink({ secret }: { secret: string }) {
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: confirmForm,
    given: { token: secret },
    act: (values) => send('POST', '/api/accounts/confirm', confirmed, values),
    onDone: async ({ email }, { password }) => {
      const result = await signIn({ email, password });
      window.location.replace(result.ok ? '/desk' : '/sign-in');
    },
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Confirm and sign in"
      running="Confirming"
      press={press}
      help={
        <span className="flex flex-wrap gap-x-6">
          {failure?.code === 'link-spent' && (
            <>
              <Link href="/sign-in" className={linkLook.quiet}>
                Sign in
              </Link>
              <Link href="/confirm" className={linkLook.quiet}>
                Send me a new letter
              </Link>
            </>
          )}
          {failure?.code === 'wrong-password' && (
            <Link href="/forgotten" className={linkLook.quiet}>
              Set a new password
            </Link>
          )}
        </span>
      }
    >
      <p className="text-lg">Put in the password that you chose when you signed up, so that we know it was you.</p>
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={errorOf('password')}
        input={register('password')}
      />
    </AccountForm>
  );
}

function LetterAgainForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: emailForm,
    act: (values) => send('POST', '/api/accounts/letter', sent, values),
    onDone: (_value, values) => setSentTo(values.email),
  });
  if (sentTo !== null) return <LetterSent email={sentTo} />;
  return (
    <AccountForm onSubmit={submit} failure={failure} action="Send the letter again" running="Sending" press={press}>
      <p className="text-lg">The letter that came after your sign-up carries a link. Have it sent again here.</p>
      <EmailField label="E-mail" autoComplete="email" error={errorOf('email')} input={register('email')} />
    </AccountForm>
  );
}
