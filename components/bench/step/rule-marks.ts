import type { StepStatus } from '@/lib/domain/build/locks';
import type { PlanDocument } from '@/lib/domain/plan/document';

/** How a graduation of the rule is drawn. */
export type RuleMarkLook = 'done' | 'skipped' | 'ready' | 'waiting' | 'locked';

export interface RuleMark {
  stepId: string;
  /** From 1. */
  number: number;
  title: string;
  look: RuleMarkLook;
  /** First step of a stage: longer and numbered. */
  stageStart: boolean;
}

const WORDS: Record<RuleMarkLook, string> = {
  done: 'done',
  skipped: 'skipped',
  ready: 'ready',
  waiting: 'waiting for glue',
  locked: 'locked',
};

/** One graduation a step, in the order of the plan. */
export function ruleMarks(plan: PlanDocument, statuses: Readonly<Record<string, StepStatus>>): RuleMark[] {
  let stage: string | null = null;
  return plan.steps.map((step, index) => {
    const stageStart = step.stage !== stage;
    stage = step.stage;
    const look = statuses[step.id]?.state ?? 'locked';
    return { stepId: step.id, number: index + 1, title: step.title, look, stageStart };
  });
}

/** What a screen reader says of a place on the rule. */
export function ruleValueText(mark: RuleMark, count: number): string {
  return `Step ${mark.number} of ${count}: ${mark.title}, ${WORDS[mark.look]}`;
}

/** Place of a graduation down the rule, 0 to 1; a margin is kept at both ends. */
export function markPlace(index: number, count: number): number {
  const margin = 0.026;
  return count === 1 ? 0.5 : margin + (index / (count - 1)) * (1 - 2 * margin);
}

/** The graduation nearest to a place down the rule. */
export function markAt(place: number, count: number): number {
  if (count === 1) return 0;
  const margin = 0.026;
  const index = Math.round(((place - margin) / (1 - 2 * margin)) * (count - 1));
  return Math.min(count - 1, Math.max(0, index));
}

/**
 * Which graduations carry their number: stage starts, the first and the last, as far as there is room between them and
 * round the pointer.
 *
 * @param heightPx  height of the rule
 * @param here      index of the step pointed at
 */
export function numberedMarks(marks: readonly RuleMark[], heightPx: number, here: number): Set<number> {
  const LEAST_GAP = 19;
  const POINTER_GAP = 24;
  const y = (index: number) => markPlace(index, marks.length) * heightPx;
  const last = marks.length - 1;
  const numbered = new Set<number>();
  const free = (index: number) =>
    Math.abs(y(index) - y(here)) >= POINTER_GAP &&
    [...numbered].every((other) => Math.abs(y(index) - y(other)) >= LEAST_GAP);
  for (const index of [0, last, ...marks.keys()]) {
    const wanted = index === 0 || index === last || marks[index]!.stageStart;
    if (wanted && index !== here && free(index)) numbered.add(index);
  }
  return numbered;
}
