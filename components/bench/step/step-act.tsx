'use client';
import { useState } from 'react';
import type { Lock, StepStatus } from '@/lib/domain/build/locks';
import { touchesOf } from '@/lib/domain/build/touches';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import type { PlanStep } from '@/lib/domain/plan/document';
import { stepNumber } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { goTo } from '../shell/address';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';
import { FirstGluePlate } from '../timers/first-glue-plate';
import { ClampsOnPlate } from '../timers/clamps-on-plate';
import { plateOf } from './plate-of';
import type { usePassedLocks } from './use-passed-locks';

interface StepActProps {
  step: PlanStep;
  status: StepStatus;
  timer: TimerView | undefined;
  locks: ReturnType<typeof usePassedLocks>;
  methodId: string | undefined;
  /** Opens the way past the locks, in the body. */
  onAskPast: () => void;
}

/** The plate: the act of the moment, across the thumb's reach. */
export function StepAct({ step, status, timer, locks, methodId, onAskPast }: StepActProps) {
  const { build, plan, now, readOnly } = useBuild();
  const { act } = useActs();
  const [pending, setPending] = useState(false);
  const plate = plateOf(step, status, timer, locks.passed);
  const number = stepNumber(plan, step.id);

  async function tick() {
    setPending(true);
    const gonePast = status.locks;
    const saved = await act(`Step ${number} ticked`, async (acts, db) => {
      const marked = await acts.markStep(db, {
        buildId: build.id,
        stepId: step.id,
        mark: 'done',
        methodId,
        ...(gonePast.length > 0 ? { reason: locks.why, passedLocks: gonePast.map(passedLock) } : {}),
      });
      if (!marked.ok || gonePast.length === 0) return marked;
      const departure = await acts.recordDeparture(db, {
        buildId: build.id,
        stepId: step.id,
        what: `Step ${number}, ${step.title}, done before its time. ${gonePast.map(({ words }) => words).join(' ')}`,
        why: locks.why,
        touches: { steps: touchesOf(plan, { stepId: step.id }).steps, parts: step.makes },
      });
      return [marked, departure];
    });
    if (saved) locks.clear();
    setPending(false);
  }

  if (readOnly) return <p className="py-3 text-soft">You look on at this build: its crew ticks the steps.</p>;
  if (plate.act === 'first-glue') return <FirstGluePlate step={step} />;
  if (plate.act === 'clamps-on') return <ClampsOnPlate timer={plate.timer} name={step.glueUp?.name ?? step.title} />;
  if (plate.act === 'wait') return <WaitPlate locks={plate.locks} onlyTime={plate.onlyTime} onAskPast={onAskPast} />;
  const next = plate.act === 'go-on' ? now.here : null;
  // One and the same button through tick and going on, so that its debounce covers a second, ghostly touch.
  return (
    <Button
      kind="plate"
      pending={pending}
      pendingLabel="Keeping it"
      className="flex items-center justify-center gap-6 text-[2.125rem]!"
      onClick={() => {
        if (plate.act === 'done') void tick();
        else if (next) goTo({ buildId: build.id, view: 'step', stepId: next });
        else goTo({ buildId: build.id });
      }}
    >
      {plate.act === 'done' ? (
        <>
          <Tick />
          Done
        </>
      ) : next ? (
        `On with step ${stepNumber(plan, next)}`
      ) : (
        'What now'
      )}
    </Button>
  );
}

function WaitPlate({
  locks,
  onlyTime,
  onAskPast,
}: {
  locks: readonly Lock[];
  onlyTime: boolean;
  onAskPast: () => void;
}) {
  const clock = useClock(60_000);
  const first = locks[0]!;
  const latest = Math.max(...locks.map(({ until }) => until?.latest ?? 0));
  return (
    <Button
      kind="plain"
      onClick={onAskPast}
      className="min-h-32! w-full rounded-plate border-2 border-amber bg-amber-ground px-5 text-left text-on-amber active:brightness-90"
    >
      <span className="block text-[1.625rem] leading-tight font-semibold">
        {onlyTime ? `Not yet: till about ${dayAndTime(latest, clock)}` : first.words}
      </span>
      <span className="mt-1 block text-[1.125rem]">
        {onlyTime ? first.words : locks.length > 1 ? `and ${locks.length - 1} more. ` : ''}
        {!onlyTime && 'Touch to go past it.'}
      </span>
    </Button>
  );
}

export function Tick({ size = 54 }: { size?: number }) {
  return (
    <svg
      viewBox="0 0 54 50"
      width={size}
      height={(size * 50) / 54}
      fill="none"
      stroke="currentColor"
      strokeWidth={8}
      aria-hidden="true"
    >
      <path d="M4 28c5 1 9 7 13 15C23 27 34 12 50 5" strokeLinejoin="round" />
    </svg>
  );
}

const passedLock = ({ lock, protects, about }: Lock) => ({ lock, protects, about });
