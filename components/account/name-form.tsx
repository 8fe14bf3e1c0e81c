'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { z } from 'zod';
import { Field } from '@/components/ui/field';
import { nameForm } from '@/lib/domain/account/forms';
import { AccountForm } from './account-form';
import { send } from './send';
import { useAccountForm } from './use-account-form';

const answer = z.object({ name: z.string() });

export function NameForm({ name }: { name: string }) {
  const router = useRouter();
  const [saved, setSaved] = useState<string | null>(null);
  const { register, errorOf, submit, failure, press } = useAccountForm({
    schema: nameForm,
    act: (values) => send('PUT', '/api/accounts/name', answer, values),
    onDone: (value) => {
      setSaved(value.name);
      router.refresh();
    },
  });
  return (
    <AccountForm
      onSubmit={submit}
      failure={failure}
      action="Change name"
      running="Changing"
      press={press}
      weight="act"
      done={saved && `Your name is ${saved} from now on.`}
    >
      <Field label="Name" hint="Shown to the people you build with, and in the build log." error={errorOf('name')}>
        <input {...register('name')} type="text" autoComplete="name" maxLength={80} defaultValue={name} />
      </Field>
    </AccountForm>
  );
}
