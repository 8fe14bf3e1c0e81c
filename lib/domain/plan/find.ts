import type { PlanAdhesive, PlanDocument, PlanPart, PlanStep } from './document';

export function findStep(plan: PlanDocument, stepId: string): PlanStep | undefined {
  return plan.steps.find(({ id }) => id === stepId);
}

export function findPart(plan: PlanDocument, partId: string): PlanPart | undefined {
  return plan.parts.find(({ id }) => id === partId);
}

/** Adhesive of a step's glue-up. */
export function adhesiveOf(plan: PlanDocument, stepId: string): PlanAdhesive | undefined {
  const wanted = findStep(plan, stepId)?.glueUp?.adhesive;
  return plan.adhesives.find(({ id }) => id === wanted);
}

/** Number of a step as people say it, from 1; 0 where there is none. */
export function stepNumber(plan: PlanDocument, stepId: string): number {
  return plan.steps.findIndex(({ id }) => id === stepId) + 1;
}
