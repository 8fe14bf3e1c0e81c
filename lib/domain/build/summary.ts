import { z } from 'zod';

/** How far a build is, as the desk lists it. */
export const progressSchema = z.object({
  stepsDone: z.int(),
  stepsSkipped: z.int(),
  stepsInAll: z.int(),
  piecesCut: z.int(),
  piecesInAll: z.int(),
  minutesWorked: z.number(),
  minutesLeft: z.object({ min: z.number(), max: z.number() }),
  byStage: z.array(
    z.object({ stageId: z.string(), name: z.string(), done: z.int(), skipped: z.int(), inAll: z.int() }),
  ),
});

export const buildRowSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  planTitle: z.string(),
  role: z.enum(['owner', 'helper', 'onlooker']),
  startedAt: z.string(),
  lastEntryAt: z.string().nullable(),
  entries: z.int(),
  progress: progressSchema,
});
export type BuildSummary = z.infer<typeof buildRowSchema>;
export const buildListSchema = z.object({ builds: z.array(buildRowSchema) });

export const planRowSchema = z.object({
  id: z.uuid(),
  title: z.string(),
  summary: z.string(),
  author: z.string(),
  visibility: z.enum(['private', 'public']),
  isOwn: z.boolean(),
  revisionId: z.uuid(),
  revisionNumber: z.int(),
  steps: z.int(),
  parts: z.int(),
  minutes: z.object({ min: z.number(), max: z.number() }),
});
export type PlanSummary = z.infer<typeof planRowSchema>;
export const planListSchema = z.object({ plans: z.array(planRowSchema) });
