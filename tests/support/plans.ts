import { readFileSync } from 'node:fs';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { readPlan } from '@/lib/domain/plan/read-plan';

/** A demo plan as it is committed. */
export function demoPlan(name: 'hall-bench' | 'folding-trestles'): PlanDocument {
  const read = readPlan(readFileSync(`plans/${name}.json`, 'utf8'));
  if (!read.ok) throw new Error(JSON.stringify(read.problems));
  return read.plan;
}
