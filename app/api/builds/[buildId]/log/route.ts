import { z } from 'zod';
import { logPushSchema, MAX_BATCH_BYTES, type LogAnswer } from '@/lib/domain/build/wire';
import { appendLog } from '@/lib/server/commands/append-log';
import { onBuild } from '@/lib/server/policies/on-build';
import { readLogAnswer } from '@/lib/server/queries/log-page';
import { buildParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

const after = z.object({ after: z.coerce.number().int().min(0).default(0) });

/** Others' entries after a position. */
export const GET = route(
  { auth: 'member', params: buildParams, query: after, policy: onBuild('read-log') },
  ({ params, query }): Promise<LogAnswer> => readLogAnswer(params.buildId, query.after),
);

/** A batch of a phone's entries. Who may add is judged entry by entry, in the transaction that adds them. */
export const POST = route(
  { auth: 'member', params: buildParams, body: logPushSchema, maxBytes: MAX_BATCH_BYTES * 2 },
  ({ account, params, body }): Promise<LogAnswer> => appendLog(params.buildId, account, body, Date.now()),
);
