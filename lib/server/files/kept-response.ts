import 'server-only';

/**
 * An answer whose content never changes under its hash. The browser may keep it, and must ask before each use: so the
 * membership is checked at every look, and what was seen before is not sent again.
 *
 * @param hash  names the content; becomes its entity tag
 * @param read  the content, asked for only when it has to be sent
 */
export async function keptResponse(
  request: Request,
  hash: string,
  headers: Record<string, string>,
  read: () => Promise<Uint8Array<ArrayBuffer> | string>,
): Promise<Response> {
  const etag = `"${hash}"`;
  const keeping = { etag, 'cache-control': 'private, no-cache', vary: 'cookie' };
  if (request.headers.get('if-none-match') === etag) return new Response(null, { status: 304, headers: keeping });
  return new Response(await read(), { headers: { ...headers, ...keeping } });
}
