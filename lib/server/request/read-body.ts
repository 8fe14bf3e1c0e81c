import { AppError } from '../errors';

/**
 * Refuses a body of a kind that the route does not take. Browsers send `text/plain` and form types across sites without
 * asking first, so the type must be named exactly; `charset=utf-8` is the only parameter let through.
 *
 * @param accepted  media types in lower case, the usual one first
 * @throws AppError `wrong-type`
 */
export function refuseWrongType(request: Request, accepted: readonly string[]): void {
  const [type, ...parameters] = (request.headers.get('content-type') ?? '').split(';').map((part) => part.trim());
  const plain = parameters.every((parameter) => /^charset="?utf-8"?$/i.test(parameter));
  if (plain && accepted.includes((type ?? '').toLowerCase())) return;
  throw new AppError(
    'wrong-type',
    `This address takes ${accepted.join(', ')} and was sent ${type || 'no type at all'}.`,
    {
      accepted,
    },
  );
}

/**
 * The whole body, read no further than the limit, so that a large upload is refused without being held in memory.
 *
 * @throws AppError `too-large` naming the limit
 */
export async function readBytes(request: Request, maxBytes: number): Promise<Uint8Array<ArrayBuffer>> {
  const declared = Number(request.headers.get('content-length') ?? 0);
  if (declared > maxBytes) throw tooLarge(maxBytes);
  if (!request.body) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > maxBytes) {
      await reader.cancel();
      throw tooLarge(maxBytes);
    }
    chunks.push(value);
  }
  const bytes = new Uint8Array(size);
  let offset = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, offset);
    offset += chunk.byteLength;
  }
  return bytes;
}

/**
 * The body as JSON.
 *
 * @throws AppError `malformed` when it is not UTF-8 or not JSON, `too-large` past the limit
 */
export async function readJson(request: Request, maxBytes: number): Promise<unknown> {
  const bytes = await readBytes(request, maxBytes);
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch (error) {
    const reason = error instanceof Error ? error.message : 'unreadable';
    throw new AppError('malformed', `The request is not JSON that can be read: ${reason}.`);
  }
}

function tooLarge(maxBytes: number): AppError {
  const limit = maxBytes >= 1_000_000 ? `${maxBytes / 1_000_000} MB` : `${Math.round(maxBytes / 1_000)} kB`;
  return new AppError('too-large', `This is larger than the ${limit} taken here. Nothing was stored.`, { maxBytes });
}
