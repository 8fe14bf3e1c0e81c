import { AppError } from '../errors';

/** Sent by our own pages with every request that changes something; a form on another site cannot send it. */
export const PROOF_HEADER = 'x-holdfast';

const refusal =
  'This request did not come from a Holdfast page, so nothing was done. Reload the page and try again from there.';

/**
 * Refuses a request that may have been sent by another site on a signed-in person's behalf.
 *
 * A request that changes something must carry our own header, and the browser's word that it comes from our origin:
 * `Sec-Fetch-Site: same-origin`, or an `Origin` that is ours. Where both are sent both must agree; `Origin: null` is
 * foreign. Ours is the host that the request was sent to, or the configured public address.
 *
 * @param publicUrl  address of the site as people type it, for the case of a proxy that rewrites Host
 * @throws AppError `foreign-request`
 */
export function refuseForeign(request: Request, publicUrl: string): void {
  const { headers } = request;
  const origin = headers.get('origin');
  const site = headers.get('sec-fetch-site');
  const proven =
    headers.get(PROOF_HEADER) === '1' &&
    (origin !== null || site !== null) &&
    (site === null || site === 'same-origin') &&
    (origin === null || isOurs(origin, headers.get('host'), publicUrl));
  if (!proven) throw new AppError('foreign-request', refusal);
}

function isOurs(origin: string, host: string | null, publicUrl: string): boolean {
  if (!URL.canParse(origin)) return false;
  const sender = new URL(origin);
  return sender.origin === new URL(publicUrl).origin || (sender.protocol.startsWith('http') && sender.host === host);
}
