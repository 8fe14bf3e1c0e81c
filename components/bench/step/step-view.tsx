'use client';
import { useMemo, useState } from 'react';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { findStep } from '@/lib/domain/plan/find';
import { useWide } from '../entry/use-wide';
import { useDraft } from '../entry/use-draft';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';
import { BuildFrame } from '../shell/build-frame';
import { ViewHeading } from '../shell/view-heading';
import { LockForm } from './lock-form';
import { lockKey } from './plate-of';
import { Rule } from './rule';
import { ruleMarks } from './rule-marks';
import { StepAct } from './step-act';
import { StepBody } from './step-body';
import { StepDrawings } from './step-drawings';
import { StepFoot } from './step-foot';
import { StepReminder } from './step-reminder';
import { usePassedLocks } from './use-passed-locks';

/** One step fills the screen: the rule at the left, what to do, the plate at the thumb, plain words under it. */
export function StepView({ stepId }: { stepId: string }) {
  const { build, plan, now } = useBuild();
  const marks = useMemo(() => ruleMarks(plan, now.statuses), [plan, now.statuses]);
  const [askingPast, setAskingPast] = useState<string | null>(null);
  const wide = useWide();
  const locks = usePassedLocks(build.id, stepId);
  const method = useDraft(`method/${build.id}/${stepId}`);
  const step = findStep(plan, stepId);
  const status = now.statuses[stepId];
  if (!step || !status) return <UnknownStep stepId={stepId} />;

  // A glue-up done again has a timer for each time; the last begun counts.
  const timer = now.timers
    .filter((each) => each.stepId === stepId)
    .reduce<TimerView | undefined>((last, each) => (last && last.startedAt >= each.startedAt ? last : each), undefined);
  const methodId = method.text || step.methods[0]?.id;
  const open = status.locks.filter((lock) => !locks.passed.has(lockKey(lock)));
  const asking = askingPast === stepId && open.length > 0 && status.mark === 'open';

  return (
    <BuildFrame layout="step" foot={<StepFoot stepId={stepId} />}>
      <main className="bench-step">
        <Rule
          marks={marks}
          here={plan.steps.indexOf(step)}
          onMove={(index, by) =>
            goTo(
              { buildId: build.id, view: 'step', stepId: plan.steps[index]!.id },
              { focus: by === 'key' ? 'stay' : 'heading' },
            )
          }
        />
        <div className="step-body" key={`${stepId} ${asking}`}>
          {asking ? (
            <div className="step-columns">
              <ViewHeading focusKey={`past ${stepId}`} over={step.title}>
                What stands in the way
              </ViewHeading>
              <LockForm
                draftKey={`past/${build.id}/${stepId}`}
                locks={open}
                onLeave={() => setAskingPast(null)}
                onPass={(why) => {
                  locks.pass(open, why);
                  setAskingPast(null);
                }}
              />
            </div>
          ) : (
            <StepBody
              step={step}
              status={status}
              timer={timer}
              locks={locks}
              methodId={methodId ?? ''}
              onMethod={method.setText}
            />
          )}
        </div>
        <div className="step-act">
          {!asking && (
            <>
              {wide && (
                <div className="step-aside">
                  <StepDrawings step={step} />
                </div>
              )}
              <StepReminder step={step} status={status} />
              <StepAct
                step={step}
                status={status}
                timer={timer}
                locks={locks}
                methodId={methodId}
                onAskPast={() => setAskingPast(stepId)}
              />
            </>
          )}
        </div>
      </main>
    </BuildFrame>
  );
}

function UnknownStep({ stepId }: { stepId: string }) {
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`unknown ${stepId}`}>This plan has no such step</ViewHeading>
        <p>The address names a step that this revision of the plan does not have. Look it up under Steps.</p>
      </div>
    </BuildFrame>
  );
}
