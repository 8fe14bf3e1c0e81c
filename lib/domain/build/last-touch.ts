import type { PlanDocument } from '../plan/document';
import { at, counting } from './claims';
import { CUTTING } from './cutting';
import type { BuildState, Claim } from './state';
import { stepMark } from './views';

export interface Touch {
  stepId: string;
  /** Stamp of the act, ms since 1970. */
  stamp: number;
}

/**
 * The step that was touched last, and when: marked, checked, glued, cut for, measured at, noted or photographed. What
 * was undone does not count. Null for a build in which nothing was done. A piece belongs to the first open step that
 * cuts its part.
 */
export function lastTouch(plan: PlanDocument, state: BuildState): Touch | null {
  let last: Touch | null = null;
  const touch = (stepId: string | null | undefined, claims: readonly Claim<unknown>[] | undefined): void => {
    if (!stepId) return;
    const stamp = counting(state, claims).at(-1)?.stamp;
    if (stamp !== undefined && (!last || stamp >= last.stamp)) last = { stepId, stamp };
  };

  const cutAt = new Map<string, string>();
  for (const { id, operation, uses } of plan.steps) {
    if (!CUTTING.has(operation) || stepMark(state, id) !== 'open') continue;
    for (const { part } of uses) if (!cutAt.has(part)) cutAt.set(part, id);
  }
  for (const [key, claims] of Object.entries(state.pieces))
    touch(cutAt.get(key.slice(0, key.lastIndexOf('#'))), claims);
  for (const [key, claims] of Object.entries(state.keySizes)) {
    const size = plan.keySizes.find(({ id }) => id === key.split('@', 1)[0]);
    touch(size?.takeFromWork?.step, claims);
  }
  for (const [key, claims] of Object.entries(state.checks)) touch(key.slice(0, key.indexOf('/')), claims);
  for (const events of Object.values(state.timers)) {
    for (const event of ['first-glue', 'clamps-on', 'clamps-off'] as const) {
      const claims = events[event];
      touch(claims?.at(-1)?.value.stepId, claims);
    }
  }
  for (const items of [state.notes, state.measurements, state.photos]) {
    for (const { revisions } of Object.values<{ revisions: Claim<object>[] }>(items)) {
      const made = revisions.find(({ value }) => 'stepId' in value)?.value as { stepId: string | null } | undefined;
      touch(made?.stepId, revisions);
    }
  }
  // Ticks last: one made in the same moment as something else says how that ended.
  for (const { id } of plan.steps) touch(id, at(state.steps, id));
  return last;
}
