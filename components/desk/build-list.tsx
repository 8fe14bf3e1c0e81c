'use client';
import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { LocalTime } from '@/components/account/local-time';
import { send } from '@/components/account/send';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';
import { buildListSchema, type BuildSummary } from '@/lib/domain/build/summary';
import { hours, hoursRange } from './hours';
import { ProgressRule } from './progress-rule';

/** Builds of the person, newest activity first. */
export function BuildList({ initial }: { initial: BuildSummary[] }) {
  const { data, error } = useQuery({
    queryKey: ['builds'],
    initialData: initial,
    queryFn: async () => {
      const answer = await send('GET', '/api/builds', buildListSchema);
      if (!answer.ok) throw new Error(answer.detail);
      return answer.value.builds;
    },
  });
  if (data.length === 0) {
    return (
      <div className="grid justify-items-start gap-4">
        <p className="text-xl">No build yet. Choose a plan, start a build from it, then take it to the bench.</p>
        <Link href="/desk/plans" className={linkLook.act}>
          Choose a plan
        </Link>
      </div>
    );
  }
  return (
    <div className="grid gap-4">
      {error && (
        <Notice tone="wait" live="status">
          This list is as it was: {error.message}
        </Notice>
      )}
      <ul className="grid gap-0">
        {data.map((build) => (
          <BuildLine key={build.id} build={build} />
        ))}
      </ul>
    </div>
  );
}

function BuildLine({ build }: { build: BuildSummary }) {
  const { stepsDone, stepsSkipped, stepsInAll, minutesWorked, minutesLeft, byStage } = build.progress;
  return (
    <li className="grid gap-2 border-t-2 border-iron py-5">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2 className="text-2xl">
          <Link href={`/desk/builds/${build.id}`} className="underline decoration-2 underline-offset-4">
            {build.name}
          </Link>
        </h2>
        <p className="text-soft">
          {build.planTitle}
          {build.role !== 'owner' && ` · you are its ${build.role}`}
        </p>
      </div>
      <ProgressRule stages={byStage} />
      <p className="figures flex flex-wrap gap-x-6 text-lg">
        <span>
          {stepsDone} of {stepsInAll} steps done{stepsSkipped > 0 && `, ${stepsSkipped} skipped`}
        </span>
        <span>{hours(minutesWorked)} at the bench</span>
        {stepsDone + stepsSkipped < stepsInAll && <span>about {hoursRange(minutesLeft)} of work left</span>}
        <span className="text-soft">
          {build.lastEntryAt ? (
            <>
              last entry here <LocalTime at={build.lastEntryAt} />
            </>
          ) : (
            'nothing in its log yet'
          )}
        </span>
      </p>
    </li>
  );
}
