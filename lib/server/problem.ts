import { AppError, failures } from './errors';

/** The media type of RFC 9457, by which a phone knows that a failure is ours and not a Wi-Fi sign-in page's. */
export const PROBLEM_TYPE = 'application/problem+json';

/**
 * A failure as an HTTP answer in the form of RFC 9457: type, title, status, detail, then `code` and the extra facts.
 * Never cached; carries `Retry-After` when the failure says how long to wait.
 */
export function problemResponse(error: AppError): Response {
  const { status, title } = failures[error.code];
  const headers = new Headers({ 'content-type': PROBLEM_TYPE, 'cache-control': 'no-store' });
  if (error.extra.retryAfterS !== undefined) headers.set('retry-after', String(Math.ceil(error.extra.retryAfterS)));
  const body = {
    ...error.extra,
    type: `urn:holdfast:problem:${error.code}`,
    title,
    status,
    detail: error.detail,
    code: error.code,
  };
  return new Response(JSON.stringify(body), { status, headers });
}
