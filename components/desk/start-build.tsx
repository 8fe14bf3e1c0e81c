'use client';
import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { send } from '@/components/account/send';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { startBuildSchema } from '@/lib/domain/build/start-build-schema';
import type { PlanSummary } from '@/lib/domain/build/summary';

const answerSchema = z.object({ buildId: z.uuid() });

/** Names a build and starts it. */
export function StartBuild({ plan, onCancel }: { plan: PlanSummary; onCancel: () => void }) {
  const router = useRouter();
  const [failure, setFailure] = useState('');
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(startBuildSchema),
    defaultValues: { planId: plan.id, name: plan.title },
  });
  const start = handleSubmit(async (values) => {
    setFailure('');
    const answer = await send('POST', '/api/builds', answerSchema, values);
    if (answer.ok) router.push(`/desk/builds/${answer.value.buildId}`);
    else setFailure(answer.detail);
  });
  return (
    <form onSubmit={(event) => void start(event)} noValidate className="grid max-w-xl gap-4">
      <Field
        label="Name of this build"
        hint="For whom or where, for example: Bench for the back door"
        error={formState.errors.name?.message}
      >
        <input type="text" autoComplete="off" {...register('name')} />
      </Field>
      {failure && (
        <Notice tone="danger" title="Not started." live="alert">
          {failure}
        </Notice>
      )}
      <div className="flex flex-wrap items-center gap-4">
        <Button kind="act" type="submit" pending={formState.isSubmitting} pendingLabel="Starting …">
          Start this build
        </Button>
        <Button kind="quiet" onClick={onCancel}>
          Not now
        </Button>
      </div>
    </form>
  );
}
