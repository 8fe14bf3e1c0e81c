import type { PlanDocument } from '../plan/document';
import { namesIn, parseFormula } from '../plan/formula/parse';
import { stepOrder } from '../plan/step-order';

export interface Touches {
  steps: string[];
  parts: string[];
  items: string[];
}

/** What a departure is about. */
export interface DepartureSubject {
  stepId?: string | null;
  partIds?: readonly string[];
  keySizeIds?: readonly string[];
}

/**
 * Later steps, parts and hardware that a departure touches: parts whose sizes follow from the key sizes, parts made from
 * those parts, and steps that come after and use or make any of them, check a size that follows, or wait for the step
 * itself.
 */
export function touchesOf(plan: PlanDocument, { stepId, partIds = [], keySizeIds = [] }: DepartureSubject): Touches {
  const sizes = grow(
    new Set(keySizeIds),
    plan.keySizes,
    ({ id }) => id,
    ({ formula }) => namesOf(formula),
  );
  const bySize = plan.parts.filter((part) =>
    [part.length, part.width, part.thickness].some((size) => namesOf(size).some((name) => sizes.has(name))),
  );
  const made = stepId ? (plan.steps.find(({ id }) => id === stepId)?.makes ?? []) : [];
  const parts = grow(
    new Set([...partIds, ...bySize.map(({ id }) => id), ...made]),
    plan.parts,
    ({ id }) => id,
    ({ madeFrom }) => madeFrom ?? [],
  );
  const order = stepOrder(plan.steps);
  const later = (id: string) => !stepId || (order.ok && order.comesBefore(stepId, id));
  const steps = plan.steps.filter(
    (step) =>
      step.id !== stepId &&
      later(step.id) &&
      (step.uses.some(({ part }) => parts.has(part)) ||
        step.makes.some((part) => parts.has(part)) ||
        step.checks.some(({ judge }) => judge.kind === 'length' && namesOf(judge.target).some((id) => sizes.has(id))) ||
        (stepId !== null &&
          stepId !== undefined &&
          step.after.some((after) => (typeof after === 'string' ? after : after.step) === stepId))),
  );
  return {
    steps: steps.map(({ id }) => id),
    parts: plan.parts.filter(({ id }) => parts.has(id)).map(({ id }) => id),
    items: [...new Set(steps.flatMap(({ takes }) => takes.map(({ item }) => item)))],
  };
}

function namesOf(size: number | string | undefined): string[] {
  return typeof size === 'string' ? namesIn(parseFormula(size)) : [];
}

/** Adds everything that is made from what is in the set, until nothing more is. */
function grow<T>(
  from: Set<string>,
  all: readonly T[],
  idOf: (row: T) => string,
  sourcesOf: (row: T) => readonly string[],
): Set<string> {
  for (let before = -1; before !== from.size;) {
    before = from.size;
    for (const row of all) if (sourcesOf(row).some((id) => from.has(id))) from.add(idOf(row));
  }
  return from;
}
