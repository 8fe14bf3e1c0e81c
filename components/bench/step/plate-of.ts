import type { Lock, StepStatus } from '@/lib/domain/build/locks';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import type { PlanStep } from '@/lib/domain/plan/document';

/** The one act of a step at this moment. */
export type PlateAct =
  /** Something stands in the way; the plate says what and opens the way past it. */
  | { act: 'wait'; locks: Lock[]; onlyTime: boolean }
  | { act: 'first-glue' }
  | { act: 'clamps-on'; timer: TimerView }
  | { act: 'done' }
  /** Done or skipped: on with what comes next. */
  | { act: 'go-on' };

/** Key of a lock, to say which of them a person has gone past. */
export const lockKey = ({ lock, about }: Pick<Lock, 'lock' | 'about'>) => `${lock} ${about}`;

/**
 * What the plate does. A glue step goes from first glue to clamps on to done; it is never ticked by a timer.
 *
 * @param timer   the last timer of the step that is not put away
 * @param passed  keys of the locks that the person has gone past, each confirmed by name
 */
export function plateOf(
  step: PlanStep,
  status: StepStatus,
  timer: TimerView | undefined,
  passed: ReadonlySet<string>,
): PlateAct {
  if (status.mark !== 'open') return { act: 'go-on' };
  const locks = status.locks.filter((lock) => !passed.has(lockKey(lock)));
  if (locks.length > 0)
    return { act: 'wait', locks, onlyTime: locks.every(({ lock, until }) => lock === 'cure' && until) };
  if (step.glueUp && !timer) return { act: 'first-glue' };
  if (step.glueUp && timer?.phase === 'open') return { act: 'clamps-on', timer };
  return { act: 'done' };
}
