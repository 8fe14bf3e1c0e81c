'use client';
import { useState } from 'react';
import { z } from 'zod';
import { Field } from '@/components/ui/field';
import { signUpForm } from '@/lib/domain/account/forms';
import { MIN_PASSWORD } from '@/lib/domain/account/password';
import { AccountForm } from './account-form';
import { EmailField } from './email-field';
import { LetterSent } from './letter-sent';
import { PasswordField } from './password-field';
import { send } from './send';
import { useAccountForm } from './use-account-form';

const answer = z.object({ sent: z.literal(true) });

export function SignUpForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: signUpForm,
    act: (values) => send('POST', '/api/accounts/sign-up', answer, values),
    onDone: (_value, values) => setSentTo(values.email),
  });
  if (sentTo !== null) return <LetterSent email={sentTo} />;
  return (
    <AccountForm onSubmit={submit} failure={failure} action="Sign up" running="Signing up" press={press}>
      <Field label="Name" hint="Shown to the people you build with." error={errorOf('name')}>
        <input {...register('name')} type="text" autoComplete="name" maxLength={80} />
      </Field>
      <EmailField
        label="E-mail"
        hint="For signing in, and for a letter to confirm it."
        autoComplete="username"
        error={errorOf('email')}
        input={register('email')}
      />
      <PasswordField
        label="Password"
        hint={`At least ${MIN_PASSWORD} characters. A few words in a row are easy to remember.`}
        autoComplete="new-password"
        error={errorOf('password')}
        input={register('password')}
      />
    </AccountForm>
  );
}
