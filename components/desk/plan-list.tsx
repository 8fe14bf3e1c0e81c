'use client';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { send } from '@/components/account/send';
import { Button } from '@/components/ui/button';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { planListSchema, type PlanSummary } from '@/lib/domain/build/summary';
import { hoursRange } from './hours';
import { StartBuild } from './start-build';

/** Plans that the person may build from: their own and the public ones. */
export function PlanList({ initial }: { initial: PlanSummary[] }) {
  const { data, error } = useQuery({
    queryKey: ['plans'],
    initialData: initial,
    queryFn: async () => {
      const answer = await send('GET', '/api/plans', planListSchema);
      if (!answer.ok) throw new Error(answer.detail);
      return answer.value.plans;
    },
  });
  if (data.length === 0) return <p className="text-xl">No plan yet. Bring one in from its file below.</p>;
  return (
    <div className="grid gap-4">
      {error && (
        <Notice tone="wait" live="status">
          This list is as it was: {error.message}
        </Notice>
      )}
      <ul className="grid">
        {data.map((plan) => (
          <PlanLine key={plan.id} plan={plan} />
        ))}
      </ul>
    </div>
  );
}

function PlanLine({ plan }: { plan: PlanSummary }) {
  const [starting, setStarting] = useState(false);
  return (
    <li className="grid gap-3 border-t-2 border-iron py-5">
      <div className="grid gap-1">
        <h2 className="text-2xl">{plan.title}</h2>
        <p className="text-lg">{plan.summary}</p>
        <p className="figures flex flex-wrap gap-x-6 text-lg text-soft">
          <span>{plan.steps} steps</span>
          <span>{plan.parts} different parts</span>
          <span>{hoursRange(plan.minutes)} of work</span>
          <span>by {plan.author}</span>
          <span>
            revision {plan.revisionNumber}, {plan.visibility === 'public' ? 'for everyone' : 'only yours'}
          </span>
        </p>
      </div>
      {starting ? (
        <StartBuild plan={plan} onCancel={() => setStarting(false)} />
      ) : (
        <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
          <Button kind="act" onClick={() => setStarting(true)} aria-label={`Start a build of ${plan.title}`}>
            Start a build
          </Button>
          <a href={`/api/plans/${plan.id}/export`} download className={linkLook.quiet}>
            Save as a file
          </a>
        </div>
      )}
    </li>
  );
}
