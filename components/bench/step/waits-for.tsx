'use client';
import type { Lock } from '@/lib/domain/build/locks';
import { findStep } from '@/lib/domain/plan/find';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { lockKey } from './plate-of';

interface WaitsForProps {
  locks: readonly Lock[];
  stepId: string;
  /** Keys of the locks gone past, and why. */
  passed: ReadonlySet<string>;
  why: string;
}

/** What the step waits for, each with the way there; what was gone past, with its reason. */
export function WaitsFor({ locks, stepId, passed, why }: WaitsForProps) {
  const { build, plan } = useBuild();
  const clock = useClock(60_000);
  if (locks.length === 0) return null;
  if (locks.every((lock) => passed.has(lockKey(lock)))) {
    return (
      <p className="border-l-4 border-amber pl-3">
        <b className="font-figures font-semibold">Gone past, {why}.</b> {locks.map(({ words }) => words).join(' ')}
      </p>
    );
  }
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
