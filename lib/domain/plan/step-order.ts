import type { PlanStep } from './document';

export type StepOrder =
  | {
      ok: true;
      /** Step ids so that each comes after all that it waits for; otherwise in the order of the plan. */
      ids: string[];
      /** True when `a` must be done before `b`, directly or over others. */
      comesBefore: (a: string, b: string) => boolean;
    }
  | { ok: false; circle: string[] };

/** Ids of the steps that a step waits for. */
export function stepsBefore(step: Pick<PlanStep, 'after'>): string[] {
  return step.after.map((after) => (typeof after === 'string' ? after : after.step));
}

/** Order of the steps by what each waits for; names a circle where there is one. Unknown ids are passed over. */
export function stepOrder(steps: readonly PlanStep[]): StepOrder {
  const byId = new Map(steps.map((step) => [step.id, step]));
  const done = new Set<string>();
  const ids: string[] = [];

  for (const root of steps) {
    const path: { id: string; rest: string[] }[] = [];
    const enter = (id: string) =>
      path.push({ id, rest: stepsBefore(byId.get(id)!).filter((other) => byId.has(other)) });
    if (!done.has(root.id)) enter(root.id);
    while (path.length > 0) {
      const here = path.at(-1)!;
      const next = here.rest.shift();
      if (next === undefined) {
        path.pop();
        if (!done.has(here.id)) ids.push(here.id);
        done.add(here.id);
      } else if (!done.has(next)) {
        const from = path.findIndex(({ id }) => id === next);
        if (from >= 0) return { ok: false, circle: path.slice(from).map(({ id }) => id) };
        enter(next);
      }
    }
  }

  const before = new Map<string, Set<string>>();
  for (const id of ids) {
    const all = new Set<string>();
    for (const other of stepsBefore(byId.get(id)!)) {
      all.add(other);
      before.get(other)?.forEach((earlier) => all.add(earlier));
    }
    before.set(id, all);
  }
  return { ok: true, ids, comesBefore: (a, b) => before.get(b)?.has(a) ?? false };
}
