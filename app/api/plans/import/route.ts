import { z } from 'zod';
import { MAX_PLAN_BYTES } from '@/lib/domain/plan/document';
import { importPlan } from '@/lib/server/commands/import-plan';
import { route } from '@/lib/server/route';

/** Takes a plan file in. Its shape is judged by the plan reader, which names paths and expectations. */
export const POST = route({ auth: 'member', body: z.unknown(), maxBytes: MAX_PLAN_BYTES }, ({ account, body }) =>
  importPlan(account, body),
);
