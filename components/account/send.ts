import { z } from 'zod';

/** What came of a request: the answer, or a failure in words for the person. */
export type Answer<T> = { ok: true; value: T } | Failure;

export interface Failure {
  ok: false;
  /** The server's code, or `no-signal` and `not-ours` for answers that never came from it. */
  code: string;
  detail: string;
  /** What is wrong field by field. */
  fields: { path: string; message: string }[];
}

const problemSchema = z.object({
  code: z.string(),
  detail: z.string(),
  fields: z.array(z.object({ path: z.string(), message: z.string() })).default([]),
});

/** Long enough for a weak signal; a request that takes longer has most likely been lost. */
const TIMEOUT_MS = 30_000;

/**
 * Sends one of our own requests and reads the answer by its schema. An answer that is not ours, a Wi-Fi sign-in page for
 * instance, is told apart from one of the server's.
 *
 * @param path  on this site, /api/…
 * @param body  sent as JSON with anything but GET
 */
export async function send<T>(
  method: 'GET' | 'POST' | 'PUT' | 'DELETE',
  path: string,
  answer: z.ZodType<T>,
  body: unknown = {},
): Promise<Answer<T>> {
  let response: Response;
  let text: string;
  try {
    response = await fetch(path, {
      method,
      signal: AbortSignal.timeout(TIMEOUT_MS),
      ...(method !== 'GET' && {
        headers: { 'content-type': 'application/json', 'x-holdfast': '1' },
        body: JSON.stringify(body),
      }),
    });
    text = await response.text();
  } catch {
    return failure('no-signal', 'No answer came. Look whether this device has a signal, then try again.');
  }
  const value = readJson(text);
  if (response.ok) {
    const read = answer.safeParse(value);
    return read.success ? { ok: true, value: read.data } : notOurs();
  }
  const problem = problemSchema.safeParse(value);
  return problem.success ? { ok: false, ...problem.data } : notOurs();
}

/** The schema of an answer that says nothing but that it was done. */
export const nothing = z.undefined();

function readJson(text: string): unknown {
  if (text === '') return undefined;
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function notOurs(): Failure {
  return failure(
    'not-ours',
    'The answer did not come from Holdfast. A Wi-Fi network may want you to sign in to it first; then try again.',
  );
}

function failure(code: string, detail: string): Failure {
  return { ok: false, code, detail, fields: [] };
}
