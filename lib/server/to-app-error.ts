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
  if (error instanceof ConnectionError) {
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
