import { randomUUID } from 'node:crypto';
import { ConnectionError } from 'sequelize';
import { AppError } from './errors';
import { log } from './log';

/**
 * A failure as one that can be answered. What the program meant to say passes through; a database that cannot be reached
 * is said to be away; anything else is logged with an id, and the person gets the id and nothing of the cause.
 */
export function toAppError(error: unknown, request: Request): AppError {
  if (error instanceof AppError) return error;
  const id = randomUUID();
  const { pathname } = new URL(request.url);
  log.error({ err: error, id, method: request.method, path: pathname }, 'a request failed');
  if (isUnreachable(error)) {
    return new AppError('away', 'The records cannot be reached just now. Nothing was changed; try again in a minute.', {
      retryAfterS: 30,
      instance: `urn:uuid:${id}`,
    });
  }
  return new AppError(
    'fault',
    `Something broke on our side and the request was not finished. Try again; if it stays so, tell whoever runs this site the number ${id}.`,
    { instance: `urn:uuid:${id}` },
  );
}

const unreachable = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ETIMEDOUT',
  'ENOTFOUND',
  '53300',
  '57P01',
  '57P02',
  '57P03',
]);

/** By Sequelize's class, or by the code of the socket or of PostgreSQL (appendix A, classes 53 and 57). */
function isUnreachable(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  return unreachable.has(String((error as { code?: unknown } | null)?.code));
}
