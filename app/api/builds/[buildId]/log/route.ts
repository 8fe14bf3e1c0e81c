import { z } from 'zod';
import { logPushSchema, looseEntrySchema, MAX_BATCH_BYTES, type LogAnswer } from '@/lib/domain/build/wire';
import { appendLog } from '@/lib/server/commands/append-log';
import { onBuild } from '@/lib/server/policies/on-build';
import { readLogAnswer } from '@/lib/server/queries/log-page';
import { buildParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** How many entries are too many is the command's to say, with the code that makes a phone send fewer. */
const push = logPushSchema.extend({ entries: z.array(looseEntrySchema) });
const after = z.object({ after: z.coerce.number().int().min(0).default(0) });

/** Others' entries after a position. */
export const GET = route(
  { auth: 'member', params: buildParams, query: after, policy: onBuild('read-log') },
  ({ params, query }): Promise<LogAnswer> => readLogAnswer(params.buildId, query.after),
);

/** A batch of a phone's entries. Who may add is judged entry by entry, in the transaction that adds them. */
export const POST = route(
  { auth: 'member', params: buildParams, body: push, maxBytes: MAX_BATCH_BYTES * 2 },
  ({ account, params, body }): Promise<LogAnswer> => appendLog(params.buildId, account, body, Date.now()),
);
