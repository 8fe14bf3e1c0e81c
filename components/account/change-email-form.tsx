'use client';
import { useState } from 'react';
import { z } from 'zod';
import { changeEmailForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { EmailField } from './email-field';
import { PasswordField } from './password-field';
import { send } from './send';
import { useAccountForm } from './use-account-form';

const answer = z.object({ sent: z.literal(true) });

export function ChangeEmailForm({ email }: { email: string }) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, reset, errorOf, submit, failure, press } = useAccountForm({
    schema: changeEmailForm,
    act: (values) => send('PUT', '/api/accounts/email', answer, values),
    onDone: (_value, values) => {
      setSentTo(values.email);
      reset();
    },
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Change e-mail"
      running="Sending"
      press={press}
      weight="act"
      done={
        sentTo && (
          <>
            A letter is on its way to <strong className="break-words">{sentTo}</strong>. Your address changes when you
            open the link in it; until then it stays {email}.
          </>
        )
      }
    >
      <p className="text-lg">
        You sign in with <strong className="break-words">{email}</strong>.
      </p>
      <EmailField label="New e-mail" autoComplete="email" error={errorOf('email')} input={register('email')} />
      <PasswordField
        label="Present password"
        autoComplete="current-password"
        error={errorOf('present')}
        input={register('present')}
      />
    </AccountForm>
  );
}
