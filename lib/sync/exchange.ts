import { z } from 'zod';

export type Fetch = (input: string, init?: RequestInit) => Promise<Response>;

/** The request is to be made again later, or only after the person has done something. */
export type NotNow =
  | { outcome: 'later'; message: string; retryAfterMs?: number }
  | { outcome: 'sign-in'; message: string }
  | { outcome: 'update'; message: string };

/** The server looked at it and will not have it, as a whole (`too-much`: perhaps in smaller parts). */
export interface NotEver {
  outcome: 'too-much' | 'refused';
  message: string;
}

/** Outcome of one request, by what the phone must do next (see rules.md, "How an answer is judged"). */
export type Exchange<T> = { outcome: 'answer'; answer: T; sentAt: number; receivedAt: number } | NotNow | NotEver;

const problemSchema = z.looseObject({
  type: z.string().startsWith('urn:holdfast:problem:'),
  detail: z.string(),
  code: z.string(),
});

interface ExchangeOptions<T> {
  fetch: Fetch;
  now: () => number;
  url: string;
  init: RequestInit;
  /** Judges the JSON: null where it is not our answer to this request (S8). */
  judge: (json: unknown) => T | null;
  timeLimitMs: number;
}

/** Sends one request with a time limit and classes what comes back. Never throws. */
export async function exchange<T>({
  fetch,
  now,
  url,
  init,
  judge,
  timeLimitMs,
}: ExchangeOptions<T>): Promise<Exchange<T>> {
  const sentAt = now();
  let response: Response;
  let json: unknown;
  try {
    response = await fetch(url, {
      ...init,
      headers: { ...init.headers, 'X-Holdfast': '1', Accept: 'application/json' },
      credentials: 'same-origin',
      redirect: 'manual',
      cache: 'no-store',
      signal: AbortSignal.timeout(timeLimitMs),
    });
    json = await response.json().catch(() => undefined);
  } catch (error) {
    const late = error instanceof DOMException && error.name === 'TimeoutError';
    return {
      outcome: 'later',
      message: late ? 'The server took too long to answer.' : 'No signal, or the server cannot be reached.',
    };
  }
  const receivedAt = now();
  const problem = problemSchema.safeParse(json);
  const { status } = response;
  if (status === 200) {
    const answer = judge(json);
    return answer === null
      ? { outcome: 'later', message: 'What answered is not Holdfast’s server. A Wi-Fi sign-in page may be in the way.' }
      : { outcome: 'answer', answer, sentAt, receivedAt };
  }
  if (!problem.success || status >= 500 || [408, 425, 429].includes(status)) {
    const wait = Number(response.headers.get('retry-after'));
    return {
      outcome: 'later',
      message: problem.success ? problem.data.detail : `The server could not be understood (${status}).`,
      ...(Number.isFinite(wait) && wait > 0 ? { retryAfterMs: wait * 1000 } : {}),
    };
  }
  const message = problem.data.detail;
  // Another person signed in on this browser: what is held waits for the one who made it.
  if (status === 401 || problem.data.code === 'wrong-account') return { outcome: 'sign-in', message };
  if (status === 426) return { outcome: 'update', message };
  if (status === 413 || status === 422) return { outcome: 'too-much', message };
  return { outcome: 'refused', message };
}
