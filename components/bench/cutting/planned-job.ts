import { planBoards, planSheets, type BoardPlan, type CuttingJob, type SheetPlan } from '@/lib/domain/cutting';

/** A cutting job with the plan for it. */
export type PlannedJob = { job: CuttingJob } & ({ of: 'boards'; plan: BoardPlan } | { of: 'sheets'; plan: SheetPlan });

/** Longest search for one stock, ms; the first answer is there long before. */
export const JOB_LIMIT_MS = 2_000;

export function planJob(job: CuttingJob): PlannedJob {
  const { request } = job;
  if (request.of === 'boards')
    return { job, of: 'boards', plan: planBoards({ ...request.boards, timeLimitMs: JOB_LIMIT_MS }) };
  return { job, of: 'sheets', plan: planSheets({ ...request.sheets, timeLimitMs: JOB_LIMIT_MS }) };
}
