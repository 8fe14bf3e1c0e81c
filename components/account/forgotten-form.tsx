'use client';
import { useState } from 'react';
import { z } from 'zod';
import { emailForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { EmailField } from './email-field';
import { Outcome } from './outcome';
import { send } from './send';
import { useAccountForm } from './use-account-form';

const answer = z.object({ sent: z.literal(true) });

export function ForgottenForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: emailForm,
    act: (values) => send('POST', '/api/accounts/forgotten', answer, values),
    onDone: (_value, values) => setSentTo(values.email),
  });
  if (sentTo !== null) {
    return (
      <Outcome title="Now look in your mail">
        <p>
          If <strong className="break-words">{sentTo}</strong> has an account, a letter is on its way there. The link in
          it works once, within one hour.
        </p>
        <p className="text-soft">
          Nothing there after a few minutes? Look among the spam, or sign up with that address.
        </p>
      </Outcome>
    );
  }
  return (
    <AccountForm onSubmit={submit} failure={failure} action="Send me a link" running="Sending" press={press}>
      <EmailField label="E-mail" autoComplete="username" error={errorOf('email')} input={register('email')} />
    </AccountForm>
  );
}
