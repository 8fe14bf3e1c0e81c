'use client';
import Link from 'next/link';
import { linkLook } from '@/components/ui/link-look';
import { signInForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { EmailField } from './email-field';
import { PasswordField } from './password-field';
import { signIn } from './sign-in-out';
import { useAccountForm } from './use-account-form';

/** @param next  where to go then: a path on this site, already judged */
export function SignInForm({ next }: { next: string }) {
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: signInForm,
    act: signIn,
    // A whole load, so that nothing of the page as it was for nobody stays.
    onDone: () => window.location.assign(next),
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Sign in"
      running="Signing in"
      press={press}
      help={
        failure?.code === 'sign-in-failed' && (
          <span className="flex flex-wrap gap-x-6">
            <Link href="/confirm" className={linkLook.quiet}>
              Send me that letter again
            </Link>
            <Link href="/forgotten" className={linkLook.quiet}>
              Set a new password
            </Link>
          </span>
        )
      }
    >
      <EmailField label="E-mail" autoComplete="username" error={errorOf('email')} input={register('email')} />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={errorOf('password')}
        input={register('password')}
      />
    </AccountForm>
  );
}
