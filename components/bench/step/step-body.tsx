'use client';
import type { StepStatus } from '@/lib/domain/build/locks';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import type { PlanStep } from '@/lib/domain/plan/document';
import { stepNumber } from '@/lib/domain/plan/find';
import { PlanText } from '../entry/plan-text';
import { dayAndTime, minutesWords } from '../entry/time-words';
import { TrueFractions } from '../entry/true-fractions';
import { useWide } from '../entry/use-wide';
import { useClock } from '../entry/use-clock';
import { AskedPhoto } from '../photos/asked-photo';
import { PhotosWanted } from '../photos/photos-wanted';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { GlueBefore, GlueOrder } from '../timers/glue-before';
import { TimerBox } from '../timers/timer-box';
import { Cautions } from './cautions';
import { Checks } from './checks';
import { Methods } from './methods';
import { Needs } from './needs';
import { PartLine } from './part-line';
import { StepDrawings } from './step-drawings';
import { StepMore } from './step-more';
import { StepWritten } from './step-written';
import type { usePassedLocks } from './use-passed-locks';
import { WaitsFor } from './waits-for';

interface StepBodyProps {
  step: PlanStep;
  status: StepStatus;
  timer: TimerView | undefined;
  locks: ReturnType<typeof usePassedLocks>;
  methodId: string;
  onMethod: (methodId: string) => void;
}

/** All there is to know about a step, the next thing to look at first. */
export function StepBody({ step, status, timer, locks, methodId, onMethod }: StepBodyProps) {
  const { plan, now, readOnly } = useBuild();
  const wide = useWide();
  const stage = plan.stages.find(({ id }) => id === step.stage)?.name;
  const others = now.timers.filter(({ timerId }) => timerId !== timer?.timerId).slice(0, 2);
  return (
    <div className="step-columns">
      <AskedPhoto />
      <ViewHeading
        focusKey={step.id}
        over={
          <>
            {stage} · step {stepNumber(plan, step.id)} of {plan.steps.length}
            <Marked status={status} />
          </>
        }
      >
        <TrueFractions text={step.title} />
      </ViewHeading>
      <PlanText text={step.body} className="text-[1.375rem]" />
      {status.mark === 'open' && (
        <WaitsFor locks={status.locks} stepId={step.id} passed={locks.passed} why={locks.why} />
      )}
      {/* Before the parts: a long list of them must not push what can hurt out of sight. */}
      <Cautions cautions={step.cautions} />
      {step.uses.length > 0 && (
        <ul className="grid gap-2" aria-label="Parts">
          {step.uses.map((use) => (
            <PartLine key={use.part} step={step} use={use} />
          ))}
        </ul>
      )}
      {(timer || others.length > 0) && (
        <div className="grid grid-cols-[repeat(auto-fit,minmax(9rem,1fr))] gap-3">
          {[...(timer ? [timer] : []), ...others].map((each) => (
            <TimerBox key={each.timerId} timer={each} />
          ))}
        </div>
      )}
      <Checks step={step} />
      <Methods methods={step.methods} chosen={methodId} onChoose={onMethod} />
      {step.glueUp && (timer ? <GlueOrder order={step.glueUp.order} /> : <GlueBefore step={step} />)}
      {step.finish && <Coat step={step} />}
      {!wide && <StepDrawings step={step} />}
      <Needs step={step} />
      {step.photosWanted.length > 0 && <PhotosWanted step={step} />}
      {step.stoppingPlace && (
        <p className="border-l-4 border-green pl-3">
          <b className="font-figures font-semibold text-green">Stopping place.</b> {step.stoppingPlace.why}
        </p>
      )}
      <StepWritten stepId={step.id} />
      {!readOnly && <StepMore step={step} status={status} />}
    </div>
  );
}

function Marked({ status }: { status: StepStatus }) {
  const { build } = useBuild();
  const clock = useClock(60_000);
  const { claim } = status;
  if (!claim) return null;
  const who = build.crew.find(({ accountId }) => accountId === claim.accountId)?.name;
  return (
    <span className={`font-semibold ${status.mark === 'done' ? 'text-green' : ''}`}>
      {status.mark === 'done' ? ' · done' : ' · skipped'} {dayAndTime(claim.madeAt, clock)}
      {build.crew.length > 1 && who && ` by ${who}`}
      {claim.reason && `: ${claim.reason}`}
    </span>
  );
}

function Coat({ step }: { step: PlanStep }) {
  const { finish } = step;
  if (!finish) return null;
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4">
      {[
        ['Coat', `${finish.number} of ${finish.of}, ${finish.name}`],
        ['Next coat after', minutesWords(finish.recoatMin)],
        ...(finish.cureMin ? [['In use after', minutesWords(finish.cureMin)]] : []),
      ].map(([name, says]) => (
        <div key={name} className="col-span-2 grid grid-cols-subgrid border-b border-line py-2">
          <dt className="font-figures text-soft">{name}</dt>
          <dd className="figures font-semibold">{says}</dd>
        </div>
      ))}
    </dl>
  );
}
