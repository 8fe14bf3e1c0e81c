import type { TimerView } from '../glue/timer-view';
import type { PlanDocument, PlanStep } from '../plan/document';
import { stepsBefore } from '../plan/step-order';
import { stepStatuses, timerViews, type Lock, type LockOptions, type StepStatus } from './locks';
import { pieceNumbers } from './progress';
import type { BuildState } from './state';
import { pieceMark } from './views';

export interface StepSuggestion {
  stepId: string;
  /** Why it is offered here, in words. */
  why: string;
  minutes: { min: number; max: number };
}

export interface GetOut {
  tools: string[];
  items: { id: string; item: string; quantity: number; unit: string }[];
  parts: { partId: string; label: string; name: string; pieces: number; cut: number }[];
  clamps: number;
  people: number;
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
 * What can be done now: ready steps with the reason for their place. Steps that start the longest wait come before
 * others of the same stage, since what cures meanwhile costs nothing; then the stage under way; then the plan's order.
 */
export function whatNow(plan: PlanDocument, state: BuildState, now: number, options: LockOptions = {}): WhatNow {
  const statuses = stepStatuses(plan, state, now, options);
  const lastMarked = lastTouched(plan, statuses);
  const stageHere = lastMarked?.stage ?? plan.steps[0]!.stage;
  const ready = plan.steps.filter(({ id }) => statuses[id]!.state === 'ready');
  const ranked = ready
    .map((step, order) => ({ step, order, ...judge(plan, step, stageHere, lastMarked) }))
    .sort((a, b) => a.rank - b.rank || a.order - b.order);
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

/** What to get out for a step: tools, hardware, parts and how many of their pieces are cut. */
export function getOut(plan: PlanDocument, state: BuildState, step: PlanStep): GetOut {
  const items = [...plan.hardware, ...plan.supplies];
  const tools = step.methods[0] ? [...new Set([...step.methods[0].tools, ...step.tools])] : step.tools;
  return {
    tools,
    items: step.takes.flatMap(({ item, quantity }) => {
      const found = items.find(({ id }) => id === item);
      return found ? [{ id: item, item: found.item, quantity, unit: found.unit }] : [];
    }),
    parts: step.uses.flatMap(({ part, pieces }) => {
      const found = plan.parts.find(({ id }) => id === part);
      if (!found) return [];
      const cut = pieceNumbers(found.quantity).filter((n) => pieceMark(state, part, n) === 'cut').length;
      return [{ partId: part, label: found.label, name: found.name, pieces: pieces ?? found.quantity, cut }];
    }),
    clamps: Math.max(step.clamps, step.glueUp?.clamps.count ?? 0),
    people: step.people,
  };
}

function lastTouched(plan: PlanDocument, statuses: Record<string, StepStatus>): PlanStep | null {
  let last: PlanStep | null = null;
  let at = -Infinity;
  for (const step of plan.steps) {
    const claim = statuses[step.id]!.claim;
    if (claim && claim.madeAt >= at) [last, at] = [step, claim.madeAt];
  }
  return last;
}

function judge(
  plan: PlanDocument,
  step: PlanStep,
  stageHere: string,
  last: PlanStep | null,
): { rank: number; why: string } {
  if (last && stepsBefore(step).includes(last.id)) return { rank: 0, why: 'Comes right after what you did last' };
  if (step.glueUp) return { rank: 1, why: 'Starts a wait: it cures while you do something else' };
  if (step.finish) return { rank: 2, why: 'Starts a wait: it dries while you do something else' };
  const stage = plan.stages.find(({ id }) => id === step.stage)?.name ?? '';
  return step.stage === stageHere
    ? { rank: 1, why: `Goes on with ${stage}` }
    : { rank: 3, why: `Free now, in ${stage}` };
}
