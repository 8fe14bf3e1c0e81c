'use client';
import { LocalTime } from '@/components/account/local-time';
import { useNow } from './use-now';
import { timerViews } from '@/lib/domain/build/locks';
import { progressOf } from '@/lib/domain/build/progress';
import type { BuildState } from '@/lib/domain/build/state';
import { findStep } from '@/lib/domain/plan/find';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { hours, hoursRange } from './hours';
import { ProgressRule } from './progress-rule';

/** Progress, hours and cures of a build, by the clock of whoever looks. */
export function BuildFacts({ plan, state, openedAt }: { plan: PlanDocument; state: BuildState; openedAt: number }) {
  const now = useNow(openedAt);
  const progress = progressOf(plan, state, now);
  const curing = timerViews(plan, state, now).filter(({ phase }) => ['open', 'in-clamps', 'curing'].includes(phase));
  return (
    <div className="grid gap-6">
      <div className="grid gap-2">
        <ProgressRule stages={progress.byStage} />
        <dl className="figures grid grid-cols-2 gap-4 text-lg sm:grid-cols-4">
          <Fact name="Steps done" value={`${progress.stepsDone} of ${progress.stepsInAll}`} />
          <Fact name="Pieces cut" value={`${progress.piecesCut} of ${progress.piecesInAll}`} />
          <Fact name="At the bench" value={hours(progress.minutesWorked)} />
          <Fact name="Work left" value={hoursRange(progress.minutesLeft)} />
        </dl>
      </div>
      {curing.length > 0 && (
        <ul className="grid gap-2" aria-label="In clamps or curing">
          {curing.map((timer) => (
            <li
              key={timer.timerId}
              className="rounded-[3px] border-2 border-amber bg-amber-ground px-4 py-3 text-lg text-on-amber"
            >
              <strong className="font-figures text-xl">
                {findStep(plan, timer.stepId)?.glueUp?.name ?? 'A glue-up'}
              </strong>{' '}
              {{ open: 'has wet glue', 'in-clamps': 'is in clamps', curing: 'is curing' }[timer.phase as 'open']}
              {timer.earliest !== null && timer.latest !== null ? (
                <>
                  {' '}
                  till between <LocalTime at={new Date(timer.earliest).toISOString()} /> and{' '}
                  <LocalTime at={new Date(timer.latest).toISOString()} />
                </>
              ) : (
                '; how long is unknown, go by the label'
              )}
            </li>
          ))}
        </ul>
      )}
      <ul className="grid gap-x-8 gap-y-1 text-lg sm:grid-cols-2" aria-label="By stage">
        {progress.byStage.map(({ stageId, name, done, skipped, inAll }) => (
          <li key={stageId} className="flex justify-between gap-4 border-b border-line py-1.5">
            <span>{name}</span>
            <span className="figures text-soft">
              {done + skipped === inAll ? <span className="text-green">done</span> : `${done} of ${inAll}`}
            </span>
          </li>
        ))}
      </ul>
    </div>
  );
}

function Fact({ name, value }: { name: string; value: string }) {
  return (
    <div className="grid">
      <dt className="text-base text-soft">{name}</dt>
      <dd className="text-2xl font-semibold">{value}</dd>
    </div>
  );
}
