'use client';
import type { Lock } from '@/lib/domain/build/locks';
import { findStep } from '@/lib/domain/plan/find';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { lockKey } from './plate-of';

/** What the step waits for, each with the way there. */
export function WaitsFor({ locks, stepId }: { locks: readonly Lock[]; stepId: string }) {
  const { build, plan } = useBuild();
  const clock = useClock(60_000);
  if (locks.length === 0) return null;
  return (
    <ul
      className="grid gap-2 rounded-plate border-2 border-amber bg-amber-ground px-4 py-3 text-on-amber"
      aria-label="Waits for"
    >
      {locks.map((lock) => (
        <li key={lockKey(lock)}>
          {lock.words}
          {lock.until && ` (${dayAndTime(lock.until.earliest, clock)} at the earliest)`}
          {findStep(plan, lock.about) ? (
            <BenchLink
              to={{ buildId: build.id, view: 'step', stepId: lock.about }}
              className="flex min-h-[48px] items-center font-figures font-semibold underline underline-offset-4"
            >
              Go to that step
            </BenchLink>
          ) : lock.lock === 'measure-first' ? (
            <BenchLink
              to={{ buildId: build.id, view: 'sizes', stepId, open: lock.about }}
              className="flex min-h-[48px] items-center font-figures font-semibold underline underline-offset-4"
            >
              Measure it
            </BenchLink>
          ) : null}
        </li>
      ))}
    </ul>
  );
}
