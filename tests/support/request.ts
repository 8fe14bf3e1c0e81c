const SITE = 'http://127.0.0.1:3000';

interface Own {
  method?: string;
  /** Sent as JSON. */
  body?: unknown;
  /** A Cookie header. */
  cookie?: string;
  headers?: Record<string, string>;
}

/** A request as one of our own pages sends it: with the proof of origin, JSON and the cookie. */
export function ownRequest(path: string, { method = 'GET', body, cookie, headers = {} }: Own = {}): Request {
  const changes = method !== 'GET' && method !== 'HEAD';
  return new Request(new URL(path, SITE), {
    method,
    headers: {
      host: '127.0.0.1:3000',
      'user-agent': 'Mozilla/5.0 (Android 16; Mobile; rv:140.0) Gecko/140.0 Firefox/140.0',
      ...(changes && {
        origin: SITE,
        'sec-fetch-site': 'same-origin',
        'x-holdfast': '1',
        'content-type': 'application/json',
      }),
      ...(cookie && { cookie }),
      ...headers,
    },
    ...(changes && body !== undefined && { body: JSON.stringify(body) }),
  });
}

/** The second argument of a route handler. */
export function routeContext<P extends Record<string, string | string[]>>(params: P): { params: Promise<P> } {
  return { params: Promise.resolve(params) };
}

/** What a browser would keep from an answer and send with the next request. */
export function keepCookies(response: Response, before = ''): string {
  const kept = new Map(before.split('; ').flatMap((pair) => (pair ? [splitPair(pair)] : [])));
  for (const cookie of response.headers.getSetCookie()) {
    const [pair = ''] = cookie.split(';');
    const [name, value] = splitPair(pair);
    if (value === '' || /expires=Thu, 01 Jan 1970|max-age=0/i.test(cookie)) kept.delete(name);
    else kept.set(name, value);
  }
  return [...kept].map(([name, value]) => `${name}=${value}`).join('; ');
}

function splitPair(pair: string): [string, string] {
  const equals = pair.indexOf('=');
  return [pair.slice(0, equals), pair.slice(equals + 1)];
}
