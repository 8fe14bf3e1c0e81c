/**
 * Every way a request can fail, by code, with its HTTP status and its title. Screens and tests go by the code; the
 * words of a particular failure travel in `detail`. Nobody chooses a status anywhere else.
 */
export const failures = {
  malformed: { status: 400, title: 'The request could not be read' },
  'sign-in-needed': { status: 401, title: 'Sign in first' },
  'sign-in-failed': { status: 401, title: 'Not signed in' },
  'foreign-request': { status: 403, title: 'The request did not come from this site' },
  'not-allowed': { status: 403, title: 'Not yours to do' },
  'wrong-account': { status: 403, title: 'Signed in as someone else' },
  'wrong-password': { status: 403, title: 'The password is not right' },
  'not-found': { status: 404, title: 'Not here' },
  conflict: { status: 409, title: 'Something else is already there' },
  'link-spent': { status: 410, title: 'The link no longer works' },
  'too-large': { status: 413, title: 'Too large' },
  'wrong-type': { status: 415, title: 'Not a kind of content taken here' },
  invalid: { status: 422, title: 'Something needs another look' },
  'too-many': { status: 429, title: 'Too many tries' },
  fault: { status: 500, title: 'Something broke on our side' },
  away: { status: 503, title: 'Not to be reached just now' },
} as const satisfies Record<string, { status: number; title: string }>;

export type FailureCode = keyof typeof failures;

/** Facts that go out with a failure beside its words. Names must not clash with the members of RFC 9457. */
export interface FailureExtra {
  /** Seconds to wait before another try; also sent as `Retry-After`. */
  retryAfterS?: number;
  /** What is wrong, field by field, in words. */
  fields?: { path: string; message: string }[];
  [name: string]: unknown;
}

/**
 * A failure that a person can do something about. Thrown anywhere below a route and answered by the route wrapper as
 * problem+json.
 *
 * @param code    decides the status
 * @param detail  what happened and what to do, in plain words
 * @param extra   further facts for the screen
 */
export class AppError extends Error {
  override readonly name = 'AppError';

  constructor(
    readonly code: FailureCode,
    readonly detail: string,
    readonly extra: FailureExtra = {},
  ) {
    super(`${code}: ${detail}`);
  }

  get status(): number {
    return failures[this.code].status;
  }
}
