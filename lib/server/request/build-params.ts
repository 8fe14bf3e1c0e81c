import { z } from 'zod';

const hash = z.string().regex(/^[0-9a-f]{64}$/, 'a sha256 in lower-case hex');

export const buildParams = z.object({ buildId: z.uuid('the id of a build') });
export const buildFileParams = buildParams.extend({ sha256: hash });
export const buildPlanParams = buildParams.extend({ contentHash: hash });
export const planParams = z.object({ planId: z.uuid('the id of a plan') });
