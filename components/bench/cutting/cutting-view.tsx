'use client';
import { useMemo } from 'react';
import { cuttingJobs, usualHabits } from '@/lib/domain/cutting';
import { useBench } from '../shell/bench-context';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { JobSection } from './job-section';
import { useCuttingPlans } from './use-cutting-plans';

/** What to buy for a build and how to cut it up, worked out on this phone. */
export function CuttingView() {
  const { format } = useBench();
  const { build, plan, parts } = useBuild();
  const jobs = useMemo(() => cuttingJobs(plan.stock, parts.values()), [plan, parts]);
  const answers = useCuttingPlans(jobs);
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`cutting ${build.id}`} over={build.name}>
          What to buy and how to cut it
        </ViewHeading>
        <p className="text-[1.0625rem] text-soft">
          For a kerf of {format(usualHabits.kerf).text}; boards are squared at both ends,{' '}
          {format(usualHabits.squareEnds).text} each. Parts have what is left on at first. Measure what you bought
          before you cut: sizes sold differ.
        </p>
        <div aria-live="polite" className="sr-only">
          {answers.every(({ state }) => state !== 'planning') ? 'All stock is planned.' : 'Planning.'}
        </div>
        {jobs.map((job, index) => (
          <JobSection key={job.stock.id} job={job} answer={answers[index]!} />
        ))}
      </div>
    </BuildFrame>
  );
}
