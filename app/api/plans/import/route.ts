import { MAX_PLAN_BYTES } from '@/lib/domain/plan/document';
import { importPlanFile } from '@/lib/server/commands/import-plan';
import { route } from '@/lib/server/route';

/**
 * Takes a plan file in. Its text goes to the plan reader as it came, so that a slip is named by line and column, a field
 * by its path.
 */
export const POST = route(
  { auth: 'member', kind: 'bytes', mediaTypes: ['application/json'], maxBytes: MAX_PLAN_BYTES },
  ({ account, bytes }) => importPlanFile(account, bytes),
);
