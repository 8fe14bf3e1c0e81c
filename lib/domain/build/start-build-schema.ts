import { z } from 'zod';

/** What a person says when they start a build. */
export const startBuildSchema = z.object({
  planId: z.uuid('Choose a plan.'),
  name: z
    .string()
    .trim()
    .min(1, 'Give the build a name.')
    .max(120, 'Keep the name under 120 characters.')
    // Control and direction characters could turn a page's text round.
    .regex(/^[^\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]*$/u, 'Letters, digits and punctuation only.'),
});
