import type { UseFormRegisterReturn } from 'react-hook-form';
import { Field } from '@/components/ui/field';

interface EmailFieldProps {
  label: string;
  hint?: string;
  error?: string;
  /** `username` where a password goes with it, for password managers. */
  autoComplete: 'username' | 'email';
  input: UseFormRegisterReturn;
}

export function EmailField({ input, autoComplete, ...field }: EmailFieldProps) {
  return (
    <Field {...field}>
      <input
        {...input}
        type="email"
        inputMode="email"
        autoComplete={autoComplete}
        autoCapitalize="none"
        autoCorrect="off"
        spellCheck={false}
      />
    </Field>
  );
}
