'use client';
import { windowsOf } from '@/lib/domain/build/locks';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { findStep } from '@/lib/domain/plan/find';
import { Clamp } from '@/components/diagrams/clamp';
import { Notice } from '@/components/ui/notice';
import { clockTime, countdown, dayAndTime, minutesWords } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { BenchLink } from '../shell/bench-link';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { timersOf } from '@/lib/domain/build/views';
import { AlarmOffer } from './alarm-offer';
import { GlueOrder } from './glue-before';
import { GlueWorking } from './glue-working';
import { temperatureText } from './temperature';
import { TimerPlate } from './timer-plate';
import { useTellTimer } from './use-tell-timer';
import { ActButton } from '../entry/act-button';
import { useScreenOn } from './timer-watch';
import { PHASE_WORDS, timerWords } from './timer-words';

interface TimerCardProps {
  timer: TimerView;
  /** The one on top: its clock is as large as the screen allows, and its act is the plate. */
  foremost: boolean;
}

/** One glue-up: its clock or range, the clamp, what to do next, the alarm to set, and how the times were come by. */
export function TimerCard({ timer, foremost }: TimerCardProps) {
  const { settings } = useBench();
  const { build, plan, state, readOnly } = useBuild();
  const screenOn = useScreenOn();
  const clock = useClock(timer.phase === 'open' ? 1_000 : 15_000);
  const step = findStep(plan, timer.stepId);
  const name = step?.glueUp?.name ?? step?.title ?? 'Glue-up';
  const temperatureC = timersOf(state).find(({ timerId }) => timerId === timer.timerId)?.temperatureC ?? null;
  const windows = windowsOf(plan, timer.stepId, temperatureC);
  const { phase, earliest, latest } = timer;
  const open = phase === 'open';
  const tell = useTellTimer(timer, name);
  const said = timerWords(timer, clock);
  const range = windows.known ? (open ? windows.open : phase === 'in-clamps' ? windows.clamp : windows.cure) : null;
  return (
    <section
      aria-label={`${name}, ${PHASE_WORDS[phase]}`}
      className={`grid gap-4 ${foremost ? '' : 'border-t-2 border-iron pt-4'}`}
    >
      <div>
        {!foremost && <h2 className="text-[1.5rem]">{name}</h2>}
        <p className="flex flex-wrap justify-between gap-x-4 font-figures text-[1.1875rem] font-medium text-soft">
          <span>{PHASE_SENTENCE[phase]}</span>
          <span>
            {temperatureC !== null && temperatureText(temperatureC, settings)}
            {temperatureC !== null && screenOn && open && ' · '}
            {screenOn && open && 'screen stays on'}
          </span>
        </p>
        {open && earliest !== null && latest !== null && foremost ? (
          <p className={`figures clock-figure font-semibold ${clock >= earliest ? 'text-red' : ''}`} role="timer">
            {countdown(earliest - clock)}
          </p>
        ) : (
          <p className={`figures font-semibold ${foremost ? 'text-[3rem] leading-none' : 'text-[2rem] leading-tight'}`}>
            {said}
          </p>
        )}
      </div>
      {earliest !== null && latest !== null && (
        <div>
          <Clamp
            from={timer.phaseStartedAt}
            earliest={earliest}
            latest={latest}
            now={clock}
            purpose={open ? 'open' : 'wait'}
            label={`${name}, ${PHASE_WORDS[phase]}: ${said}`}
          />
          <p className="figures flex max-w-[30rem] justify-between gap-4 text-[1.0625rem] text-soft">
            <span>
              {open ? 'first glue' : 'clamps on'} {clockTime(timer.phaseStartedAt)}
            </span>
            <span>
              {range && `${open ? `${SAYS[range.working.confidence]} ` : ''}${minutesWords(range)}`}
              {!open && `, ${dayAndTime(earliest, clock)} to ${dayAndTime(latest, clock)}`}
            </span>
          </p>
        </div>
      )}
      {timer.pressBy && (
        <p className="figures">
          Clamps tight by {clockTime(timer.pressBy.earliest)}, {clockTime(timer.pressBy.latest)} at the very last.
        </p>
      )}
      {!windows.known && <Notice tone="wait">{windows.message}</Notice>}
      {windows.known && windows.temperature === 'too-cold' && (
        <Notice tone="danger" title="Too cold.">
          {windows.notes[0]}
        </Notice>
      )}
      {timer.pressedLate && (
        <Notice tone="danger" title="Late.">
          The clamps came on after the longest time from first glue. The joint may be weak: the label says what to do.
        </Notice>
      )}
      {timer.clampsOffEarly && (
        <Notice tone="wait" title="Early.">
          The clamps came off before the shortest clamp time. Put no stress on the joint until it has cured.
        </Notice>
      )}
      {open && step?.glueUp && <GlueOrder order={step.glueUp.order} />}
      {!readOnly && !foremost && <TimerPlate timer={timer} name={name} foremost={false} />}
      {!readOnly && open && (
        <div className="grid grid-cols-2 gap-6">
          <ActButton onClick={() => tell('first-glue', 'Begun a minute earlier', { at: timer.startedAt - 60_000 })}>
            It began 1 min earlier
          </ActButton>
          <ActButton onClick={() => tell('put-away', 'Timer put away')}>Not glued after all</ActButton>
        </div>
      )}
      {!open && latest !== null && latest > clock && <AlarmOffer timer={timer} name={name} at={latest} />}
      {step?.glueUp?.notBefore && !open && phase !== 'cured' && <Notice tone="wait">{step.glueUp.notBefore}</Notice>}
      {windows.known && <GlueWorking windows={windows} />}
      {step && (
        <BenchLink
          to={{ buildId: build.id, view: 'step', stepId: step.id }}
          className="flex min-h-[48px] items-center font-figures text-[1.125rem] font-medium text-blue underline underline-offset-4"
        >
          Go to its step
        </BenchLink>
      )}
    </section>
  );
}

/** Whose figure it is. */
const SAYS = { label: 'label says', read: 'usual for it', memory: 'usual for it' } as const;

const PHASE_SENTENCE: Record<TimerView['phase'], string> = {
  open: 'Open time: close the joint before',
  'in-clamps': 'In clamps for',
  curing: 'Curing, no stress on it for',
  cured: 'Cured',
  'put-away': 'Put away',
};
