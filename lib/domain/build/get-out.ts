import type { PlanDocument, PlanPart, PlanStep } from '../plan/document';
import { findPart } from '../plan/find';
import { pieceNumbers } from './progress';
import type { BuildState } from './state';
import { pieceMark, stepMark } from './views';

export interface GetOut {
  tools: string[];
  items: { id: string; item: string; quantity: number; unit: string }[];
  /** `cut`: pieces of the part that are cut, or made where it is put together from others. */
  parts: { partId: string; label: string; name: string; pieces: number; cut: number }[];
  clamps: number;
  people: number;
}

/** What to get out for a step: tools of its safest method, hardware, parts and how many of their pieces are there. */
export function getOut(plan: PlanDocument, state: BuildState, step: PlanStep): GetOut {
  const items = [...plan.hardware, ...plan.supplies];
  return {
    tools: [...new Set([...(step.methods[0]?.tools ?? []), ...step.tools])],
    items: step.takes.flatMap(({ item, quantity }) => {
      const found = items.find(({ id }) => id === item);
      return found ? [{ id: item, item: found.item, quantity, unit: found.unit }] : [];
    }),
    parts: step.uses.flatMap(({ part: partId, pieces }) => {
      const part = findPart(plan, partId);
      if (!part) return [];
      const { label, name, quantity } = part;
      return [{ partId, label, name, pieces: pieces ?? quantity, cut: piecesThere(plan, state, part) }];
    }),
    clamps: Math.max(step.clamps, step.glueUp?.clamps.count ?? 0),
    people: step.people,
  };
}

function piecesThere(plan: PlanDocument, state: BuildState, { id, quantity, madeFrom }: PlanPart): number {
  if (!madeFrom) return pieceNumbers(quantity).filter((piece) => pieceMark(state, id, piece) === 'cut').length;
  const makers = plan.steps.filter(({ makes }) => makes.includes(id));
  return makers.length > 0 && makers.every((step) => stepMark(state, step.id) === 'done') ? quantity : 0;
}
