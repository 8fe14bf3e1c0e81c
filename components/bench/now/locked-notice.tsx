'use client';
import { findStep } from '@/lib/domain/plan/find';
import { useBuild } from '../shell/build-context';

/** Nothing is ready: what each of the nearest steps waits for. */
export function LockedNotice() {
  const { plan, now } = useBuild();
  const nearest = now.locked.slice(0, 3);
  return (
    <ul className="grid gap-3">
      {nearest.map(({ stepId, locks }) => (
        <li key={stepId} className="rounded-plate border-2 border-amber bg-amber-ground px-4 py-3 text-on-amber">
          <b className="font-figures text-[1.375rem] font-semibold">{findStep(plan, stepId)?.title}</b>
          {locks.map((lock) => (
            <p key={`${lock.lock} ${lock.about}`}>{lock.words}</p>
          ))}
        </li>
      ))}
    </ul>
  );
}
