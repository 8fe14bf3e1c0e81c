'use client';
import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, type FieldValues, type Path, type Resolver } from 'react-hook-form';
import type { z } from 'zod';
import type { Answer, Failure } from './send';
import { useHydrated } from './use-hydrated';

interface Options<Values extends FieldValues, T> {
  /** The same schema by which the server judges. */
  schema: z.ZodType<Values, Values>;
  act: (values: Values) => Promise<Answer<T>>;
  onDone?: (value: T, values: Values) => void;
  /** Fields that the page fills in itself, a link's secret for instance. */
  given?: Partial<Values>;
}

/**
 * One form about an account: checked by its schema, sent once, and told how it went. What the server says about a field is
 * shown at the field, and the first field that is wrong gets the focus.
 *
 * Inputs keep what was typed or filled in before scripts ran, since no default is written into them.
 */
export function useAccountForm<Values extends FieldValues, T>({ schema, act, onDone, given }: Options<Values, T>) {
  const hydrated = useHydrated();
  const [failure, setFailure] = useState<Failure | null>(null);
  const { register, handleSubmit, setError, reset, formState } = useForm<Values, unknown, Values>({
    resolver: withGiven(zodResolver(schema) as Resolver<Values, unknown, Values>, given),
  });

  const submit = handleSubmit(async (values) => {
    setFailure(null);
    const answer = await act(values);
    if (answer.ok) {
      onDone?.(answer.value, values);
      return;
    }
    const known = answer.fields.filter(({ path }) => path in values && given?.[path] === undefined);
    known.forEach(({ path, message }, index) => {
      setError(path as Path<Values>, { message }, { shouldFocus: index === 0 });
    });
    if (known.length === 0) setFailure(answer);
  });

  return {
    register,
    reset,
    failure,
    submit,
    /** What is wrong with a field, in words. */
    errorOf: (name: Path<Values>): string | undefined => formState.errors[name]?.message?.toString(),
    /** For the button: not to be pressed yet, or sending. */
    press: { disabled: !hydrated, pending: formState.isSubmitting },
  };
}

function withGiven<Values extends FieldValues>(
  resolver: Resolver<Values, unknown, Values>,
  given: Partial<Values> | undefined,
): Resolver<Values, unknown, Values> {
  return (values, context, options) => resolver({ ...values, ...given }, context, options);
}
