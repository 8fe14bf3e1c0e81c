'use client';
import type { StepStatus } from '@/lib/domain/build/locks';
import { progressOf } from '@/lib/domain/build/progress';
import { TrueFractions } from '../entry/true-fractions';
import { minutesWords } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { BenchLink } from '../shell/bench-link';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { Tick } from '../step/step-act';
import { ProgressBar } from './progress-bar';

/** Every step by stage, each stage with how far it is. */
export function StepsView() {
  const { build, plan, state, now } = useBuild();
  const progress = progressOf(plan, state, useClock(60_000));
  const { stepsDone, stepsInAll, stepsSkipped, minutesLeft } = progress;
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`steps ${build.id}`} over={build.name}>
          {stepsDone} of {stepsInAll} steps done
        </ViewHeading>
        <p className="text-soft">
          {stepsSkipped > 0 && `${stepsSkipped} skipped. `}
          {minutesLeft.max > 0 ? `${minutesWords(minutesLeft)} of hands-on work left.` : 'Nothing is left to do.'}
        </p>
        {progress.byStage.map((stage) => (
          <section key={stage.stageId} aria-labelledby={`stage-${stage.stageId}`}>
            <div className="grid gap-1.5 border-b-2 border-iron pb-2">
              <h2 id={`stage-${stage.stageId}`} className="flex items-baseline justify-between gap-3 text-[1.5rem]">
                {stage.name}
                <span className="figures text-[1.125rem] font-medium text-soft">
                  {stage.done} of {stage.inAll}
                </span>
              </h2>
              <ProgressBar done={stage.done} skipped={stage.skipped} inAll={stage.inAll} />
            </div>
            <ol>
              {plan.steps.map((step, index) =>
                step.stage === stage.stageId ? (
                  <li key={step.id} className="border-b border-line">
                    <BenchLink
                      to={{ buildId: build.id, view: 'step', stepId: step.id }}
                      className="grid min-h-[81px] grid-cols-[2.2rem_1fr_auto] items-center gap-x-3 py-2 active:bg-line"
                    >
                      <span className="figures text-[1.375rem] font-semibold">{index + 1}</span>
                      <span className={`leading-snug ${now.here === step.id ? 'font-bold' : ''}`}>
                        <TrueFractions text={step.title} />
                      </span>
                      <StepState status={now.statuses[step.id]} here={now.here === step.id} />
                    </BenchLink>
                  </li>
                ) : null,
              )}
            </ol>
          </section>
        ))}
      </div>
    </BuildFrame>
  );
}

const WORDS = { skipped: 'skipped', waiting: 'waits for glue', locked: 'locked', ready: 'ready' } as const;

function StepState({ status, here }: { status: StepStatus | undefined; here: boolean }) {
  if (!status) return null;
  if (status.state === 'done') {
    return (
      <span className="text-green">
        <Tick size={26} />
        <span className="sr-only">done</span>
      </span>
    );
  }
  const look =
    status.state === 'waiting'
      ? 'rounded-[3px] bg-amber-ground px-2 text-on-amber'
      : here
        ? 'rounded-[3px] bg-blue px-2 text-on-blue'
        : 'text-soft';
  return (
    <span className={`font-figures text-[1.0625rem] font-medium ${look}`}>{here ? 'now' : WORDS[status.state]}</span>
  );
}
