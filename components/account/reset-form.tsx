'use client';
import Link from 'next/link';
import { z } from 'zod';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { resetForm } from '@/lib/domain/account/forms';
import { MIN_PASSWORD } from '@/lib/domain/account/password';
import { AccountForm } from './account-form';
import { PasswordField } from './password-field';
import { send } from './send';
import { signIn } from './sign-in-out';
import { useAccountForm } from './use-account-form';
import { useLinkSecret } from './use-link-secret';

const answer = z.object({ email: z.string() });

/** The page behind the link for a new password. */
export function ResetForm() {
  const secret = useLinkSecret();
  if (secret === undefined) return null;
  if (secret !== null) return <NewPassword key={secret} secret={secret} />;
  return (
    <Notice tone="info">
      This page opens from the link in a letter.{' '}
      <Link href="/forgotten" className={linkLook.quiet}>
        Have one sent
      </Link>
    </Notice>
  );
}

function NewPassword({ secret }: { secret: string }) {
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: resetForm,
    given: { token: secret },
    act: (values) => send('POST', '/api/accounts/reset', answer, values),
    onDone: async ({ email }, { password }) => {
      const result = await signIn({ email, password });
      window.location.replace(result.ok ? '/desk' : '/sign-in');
    },
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Set password and sign in"
      running="Setting it"
      press={press}
      help={
        failure?.code === 'link-spent' && (
          <Link href="/forgotten" className={linkLook.quiet}>
            Have a new link sent
          </Link>
        )
      }
    >
      <PasswordField
        label="New password"
        hint={`At least ${MIN_PASSWORD} characters. A few words in a row are easy to remember.`}
        autoComplete="new-password"
        error={errorOf('password')}
        input={register('password')}
      />
      <p className="text-base text-soft">
        Every device is signed out by it. What a phone has not sent yet stays on it until you sign in there again.
      </p>
    </AccountForm>
  );
}
