'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { z } from 'zod';
import { changePasswordForm } from '@/lib/domain/account/forms';
import { MIN_PASSWORD } from '@/lib/domain/account/password';
import { AccountForm } from './account-form';
import { PasswordField } from './password-field';
import { send } from './send';
import { useAccountForm } from './use-account-form';

const answer = z.object({ changed: z.literal(true) });

/** @param email  told to password managers, so that they store the new password with the right account */
export function ChangePasswordForm({ email }: { email: string }) {
  const router = useRouter();
  const [changed, setChanged] = useState(false);
  const { register, reset, errorOf, submit, failure, press } = useAccountForm({
    schema: changePasswordForm,
    act: (values) => send('PUT', '/api/accounts/password', answer, values),
    onDone: () => {
      setChanged(true);
      reset();
      router.refresh();
    },
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Change password"
      running="Changing"
      press={press}
      weight="act"
      done={changed && 'Your password is changed, and your other devices are signed out.'}
    >
      <input type="email" autoComplete="username" value={email} readOnly hidden />
      <PasswordField
        label="Present password"
        autoComplete="current-password"
        error={errorOf('present')}
        input={register('present')}
      />
      <PasswordField
        label="New password"
        hint={`At least ${MIN_PASSWORD} characters. Your other devices are signed out by it.`}
        autoComplete="new-password"
        error={errorOf('password')}
        input={register('password')}
      />
    </AccountForm>
  );
}
