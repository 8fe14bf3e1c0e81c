'use client';
import { findStep } from '@/lib/domain/plan/find';
import { useBenchAddress } from '../shell/address';
import { BenchLink } from '../shell/bench-link';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { TimerPlate } from './timer-plate';
import { TimerCard } from './timer-card';
import { RingNotice } from './ring-notice';

/** Every glue-up that runs, the one asked for first, else overdue ones, else by their earliest end. */
export function TimersView() {
  const { build, plan, now, readOnly } = useBuild();
  const { open } = useBenchAddress();
  const asked = now.timers.find(({ timerId }) => timerId === open);
  const timers = asked ? [asked, ...now.timers.filter((timer) => timer !== asked)] : now.timers;
  const first = timers[0];
  const glueSteps = plan.steps.filter((step) => step.glueUp && now.statuses[step.id]?.mark === 'open');
  const title =
    first && (findStep(plan, first.stepId)?.glueUp?.name ?? findStep(plan, first.stepId)?.title ?? 'Glue-up');
  return (
    <BuildFrame layout="step">
      <main className="bench-now">
        <div className="bench-scroll">
          <div className="bench-page">
            <ViewHeading focusKey={`timers ${open ?? ''}`} over={title ? 'Timers' : undefined}>
              {title ?? 'No glue is curing'}
            </ViewHeading>
            {timers.map((timer, index) => (
              <TimerCard key={timer.timerId} timer={timer} foremost={index === 0} />
            ))}
            {timers.length > 0 && <RingNotice />}
            {glueSteps.length > 0 && (
              <section aria-labelledby="glue-to-come">
                <h2 id="glue-to-come" className="border-b-2 border-iron pb-1 text-[1.5rem]">
                  Glue-ups to come
                </h2>
                <ul>
                  {glueSteps.map((step) => (
                    <li key={step.id} className="border-b border-line">
                      <BenchLink
                        to={{ buildId: build.id, view: 'step', stepId: step.id }}
                        className="grid min-h-[81px] grid-cols-[2.6rem_1fr] items-center py-2 active:bg-line"
                      >
                        <span className="figures text-[1.375rem] font-semibold">{plan.steps.indexOf(step) + 1}</span>
                        <span>{step.glueUp?.name}</span>
                      </BenchLink>
                    </li>
                  ))}
                </ul>
              </section>
            )}
          </div>
        </div>
        {first && title && !readOnly && (
          <div className="now-act">
            <TimerPlate key={first.timerId} timer={first} name={title} foremost />
          </div>
        )}
      </main>
    </BuildFrame>
  );
}
