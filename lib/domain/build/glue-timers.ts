import { timerView, type TimerView } from '../glue/timer-view';
import { glueWindows, type GlueWindows } from '../glue/windows';
import type { PlanDocument } from '../plan/document';
import { adhesiveOf } from '../plan/find';
import type { BuildState } from './state';
import { timersOf } from './views';

/** Timers of a build as they stand, those of glue the plan does not know included, earliest first. */
export function timerViews(plan: PlanDocument, state: BuildState, now: number): TimerView[] {
  return timersOf(state).map((timer) => timerView(timer, windowsOf(plan, timer.stepId, timer.temperatureC), now));
}

/** Times of the glue of a step at a temperature of the wood. */
export function windowsOf(plan: PlanDocument, stepId: string, temperatureC: number | null): GlueWindows {
  const adhesive = adhesiveOf(plan, stepId);
  return adhesive
    ? glueWindows(adhesive, { temperatureC })
    : {
        known: false as const,
        adhesiveName: 'the glue',
        message: 'The plan names no glue for this step. Go by the label.',
      };
}

/** A glue-up of a step as the joint has it: how far it is, and why no time is known where none is. */
export interface Joint extends TimerView {
  unknown: 'no-times' | 'too-cold' | null;
  /** When the clamps may come off, however far it is; null before they are on or where it is unknown. */
  clampEnd: { earliest: number; latest: number } | null;
  /** When the joint may be loaded; null as above. */
  cureEnd: { earliest: number; latest: number } | null;
}

const MINUTE = 60_000;

/**
 * The glue-up of each step that is furthest from cured; steps without one are left out.
 *
 * Putting a timer away changes what is shown, not the joint: it goes on curing. Only a timer that was put away before
 * any clamp is no glue-up at all ("not glued after all"). Of several (two phones, two halves, done again) all must hold,
 * so the one that is furthest behind stands for the step.
 */
export function jointsByStep(plan: PlanDocument, state: BuildState, now: number): Map<string, Joint> {
  const joints = new Map<string, Joint>();
  for (const timer of timersOf(state)) {
    const { 'put-away': putAway, ...times } = timer.times;
    if (putAway !== undefined && times['clamps-on'] === undefined) continue;
    const windows = windowsOf(plan, timer.stepId, timer.temperatureC);
    const clampsOn = times['clamps-on'];
    const endOf = (range: { min: number; max: number }) =>
      clampsOn === undefined
        ? null
        : { earliest: clampsOn + range.min * MINUTE, latest: clampsOn + range.max * MINUTE };
    const unknown = !windows.known ? 'no-times' : windows.temperature === 'too-cold' ? 'too-cold' : null;
    const joint: Joint = {
      ...timerView({ ...timer, times }, windows, now),
      unknown,
      clampEnd: windows.known && !unknown ? endOf(windows.clamp) : null,
      cureEnd: windows.known && !unknown ? endOf(windows.cure) : null,
    };
    const other = joints.get(timer.stepId);
    if (!other || isBehind(joint, other)) joints.set(timer.stepId, joint);
  }
  return joints;
}

const PHASES: readonly TimerView['phase'][] = ['open', 'in-clamps', 'curing', 'cured', 'put-away'];

function isBehind(a: Joint, b: Joint): boolean {
  const byPhase = PHASES.indexOf(a.phase) - PHASES.indexOf(b.phase);
  return byPhase !== 0 ? byPhase < 0 : (a.latest ?? Infinity) >= (b.latest ?? Infinity);
}
