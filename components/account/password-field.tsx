'use client';
import { useState } from 'react';
import type { UseFormRegisterReturn } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';

interface PasswordFieldProps {
  label: string;
  hint?: string;
  error?: string;
  /** For password managers: one that exists, or one that is being chosen. */
  autoComplete: 'current-password' | 'new-password';
  input: UseFormRegisterReturn;
}

/** A password, which can be shown while it is typed: dusty hands mistype, and nobody looks over a shoulder in a garage. */
export function PasswordField({ autoComplete, input, label, ...field }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <div>
      <Field label={label} {...field}>
        <input
          {...input}
          type={shown ? 'text' : 'password'}
          autoComplete={autoComplete}
          autoCapitalize="none"
          autoCorrect="off"
          spellCheck={false}
        />
      </Field>
      <Button kind="quiet" className="-ml-2" debounceMs={0} aria-pressed={shown} onClick={() => setShown(!shown)}>
        Show {label.toLowerCase()}
      </Button>
    </div>
  );
}
