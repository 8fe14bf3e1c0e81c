import { z } from 'zod';

/** What a person says when they start a build. */
export const startBuildSchema = z.object({
  planId: z.uuid('Choose a plan.'),
  name: z.string().trim().min(1, 'Give the build a name.').max(120, 'Keep the name under 120 characters.'),
});
