import { z } from 'zod';
import { MAX_PLAN_BYTES } from '@/lib/domain/plan/document';
import type { PlanProblem } from '@/lib/domain/plan/plan-problem';

const importedSchema = z.object({ planId: z.uuid(), number: z.int(), isNew: z.boolean() });
const problemSchema = z.object({
  detail: z.string(),
  problems: z.array(z.object({ path: z.string(), expected: z.string(), message: z.string() })).default([]),
});

export type ImportAnswer =
  { ok: true; value: z.infer<typeof importedSchema> } | { ok: false; detail: string; problems: PlanProblem[] };

/** Sends a plan file as it is: the server reads it, so that line and column of a slip are those of the file. */
export async function sendPlanFile(file: File): Promise<ImportAnswer> {
  const no = (detail: string, problems: PlanProblem[] = []): ImportAnswer => ({ ok: false, detail, problems });
  if (file.size > MAX_PLAN_BYTES)
    return no(`The file has ${(file.size / 1_000_000).toFixed(1)} MB; ${MAX_PLAN_BYTES / 1_000_000} MB is the most.`);
  let response: Response;
  let answer: unknown;
  try {
    response = await fetch('/api/plans/import', {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-holdfast': '1' },
      body: await file.arrayBuffer(),
    });
    answer = await response.json();
  } catch {
    return no('No answer came that could be read. Look whether this device has a signal, then try again.');
  }
  if (response.ok) {
    const imported = importedSchema.safeParse(answer);
    return imported.success
      ? { ok: true, value: imported.data }
      : no('The answer did not come from Holdfast. Try again.');
  }
  const problem = problemSchema.safeParse(answer);
  return problem.success
    ? no(problem.data.detail, problem.data.problems)
    : no('The answer did not come from Holdfast. Try again.');
}
