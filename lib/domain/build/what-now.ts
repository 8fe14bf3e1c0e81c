import type { TimerView } from '../glue/timer-view';
import type { PlanDocument, PlanStep } from '../plan/document';
import { stepsBefore } from '../plan/step-order';
import { getOut, type GetOut } from './get-out';
import { lastTouch } from './last-touch';
import { stepStatuses, timerViews, windowsOf, type Lock, type LockOptions, type StepStatus } from './locks';
import type { BuildState } from './state';
import { stepClaim } from './views';

export interface StepSuggestion {
  stepId: string;
  /** Why it is offered here, in words. */
  why: string;
  minutes: { min: number; max: number };
}

export interface WhatNow {
  /** The one thing to do: the step under way, else the best that is ready; null when nothing can be done. */
  here: string | null;
  ready: StepSuggestion[];
  /** Timers that want a look, overdue first, then by their earliest end; put-away ones are left out. */
  timers: TimerView[];
  locked: { stepId: string; locks: Lock[] }[];
  getOut: GetOut | null;
  finished: boolean;
  statuses: Record<string, StepStatus>;
}

/**
 * What can be done now: ready steps with the reason for their place. First the step that was touched last and is still
 * open; then the stage under way before others; within a stage what starts a wait, the longest first, since what cures
 * meanwhile costs nothing; then what follows from the last step; then the plan's order.
 *
 * @param now  ms since 1970
 */
export function whatNow(plan: PlanDocument, state: BuildState, now: number, options: LockOptions = {}): WhatNow {
  const statuses = stepStatuses(plan, state, now, options);
  const last = lastPassed(plan, state, statuses);
  const stageHere = (last ?? plan.steps[0]!).stage;
  const underWay = lastTouch(plan, state)?.stepId;
  const ready = plan.steps.filter(({ id }) => statuses[id]!.state === 'ready');
  const ranked = ready
    .map((step, order) => ({
      step,
      order,
      ...(step.id === underWay
        ? { rank: 0, wait: 0, why: 'You were at this step' }
        : judge(plan, step, stageHere, last)),
    }))
    .sort((a, b) => a.rank - b.rank || b.wait - a.wait || a.order - b.order);
  const here = ranked[0]?.step ?? null;
  return {
    here: here?.id ?? null,
    ready: ranked.map(({ step, why }) => ({ stepId: step.id, why, minutes: step.minutes })),
    timers: timerViews(plan, state, now)
      .filter(({ phase }) => phase !== 'put-away')
      .sort(
        (a, b) => Number(b.overdue) - Number(a.overdue) || (a.earliest ?? a.startedAt) - (b.earliest ?? b.startedAt),
      ),
    locked: plan.steps
      .filter(({ id }) => ['locked', 'waiting'].includes(statuses[id]!.state))
      .map(({ id }) => ({ stepId: id, locks: statuses[id]!.locks })),
    getOut: here && getOut(plan, state, here),
    finished: plan.steps.every(({ id }) => statuses[id]!.mark !== 'open'),
    statuses,
  };
}

/** The step that was done or skipped last. */
function lastPassed(plan: PlanDocument, state: BuildState, statuses: Record<string, StepStatus>): PlanStep | null {
  let last: PlanStep | null = null;
  let at = -Infinity;
  for (const step of plan.steps) {
    const stamp = statuses[step.id]!.mark === 'open' ? undefined : stepClaim(state, step.id)?.stamp;
    if (stamp !== undefined && stamp >= at) [last, at] = [step, stamp];
  }
  return last;
}

interface Judged {
  rank: number;
  /** Longest minutes of the wait that the step starts. */
  wait: number;
  why: string;
}

function judge(plan: PlanDocument, step: PlanStep, stageHere: string, last: PlanStep | null): Judged {
  const isHere = step.stage === stageHere;
  const rank = (within: number) => (isHere ? within : within + 3);
  const wait = waitOf(plan, step);
  if (wait !== null) {
    const does = step.glueUp ? 'cures' : 'dries';
    return { rank: rank(1), wait, why: `Starts a wait: it ${does} while you do something else` };
  }
  if (last && stepsBefore(step).includes(last.id))
    return { rank: rank(2), wait: 0, why: 'Comes right after what you did last' };
  const stage = plan.stages.find(({ id }) => id === step.stage)?.name ?? '';
  return { rank: rank(3), wait: 0, why: isHere ? `Goes on with ${stage}` : `Free now, in ${stage}` };
}

/** Longest minutes of the cure or drying that a step starts, 0 where it is unknown; null for a step that starts none. */
function waitOf(plan: PlanDocument, step: PlanStep): number | null {
  if (step.glueUp) {
    const windows = windowsOf(plan, step.id, null);
    return windows.known ? windows.cure.max : 0;
  }
  return step.finish?.recoatMin.max ?? null;
}
