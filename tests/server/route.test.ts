import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { AppError, failures } from '@/lib/server/errors';
import { refused } from '@/lib/server/policies/verdict';
import { route } from '@/lib/server/route';
import { makeAccount, signedIn } from '../support/accounts';
import { useDatabase } from '../support/database';
import { ownRequest, routeContext } from '../support/request';

const database = useDatabase();
const nowhere = routeContext({});

async function problemOf(response: Response) {
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  return (await response.json()) as { code: string; status: number; detail: string; title: string; type: string };
}

describe('answers', () => {
  it('sends a value as JSON and nothing as 204, never to be cached', async () => {
    const value = await route({ auth: 'anyone' }, async () => ({ held: 12 }))(ownRequest('/api/x'), nowhere);
    expect(await value.json()).toEqual({ held: 12 });
    expect(value.headers.get('cache-control')).toBe('no-store');
    expect(value.headers.get('x-content-type-options')).toBe('nosniff');
    const nothing = await route({ auth: 'anyone' }, async () => undefined)(ownRequest('/api/x'), nowhere);
    expect(nothing.status).toBe(204);
    const own = await route({ auth: 'anyone' }, async () => new Response('x', { status: 201 }))(
      ownRequest('/api/x'),
      nowhere,
    );
    expect(own.status).toBe(201);
    expect(own.headers.get('cache-control')).toBe('no-store');
  });

  it('states a failure in the form of RFC 9457 with its code and extra facts', async () => {
    const get = route({ auth: 'anyone' }, async () => {
      throw new AppError('too-many', 'Wait.', { retryAfterS: 41.2, what: 'tries' });
    });
    const response = await get(ownRequest('/api/x'), nowhere);
    expect(response.status).toBe(429);
    expect(response.headers.get('retry-after')).toBe('42');
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(await problemOf(response)).toEqual({
      type: 'urn:holdfast:problem:too-many',
      title: failures['too-many'].title,
      status: 429,
      detail: 'Wait.',
      code: 'too-many',
      retryAfterS: 41.2,
      what: 'tries',
    });
  });

  it('tells nothing of what broke, and gives a number to ask by', async () => {
    const get = route({ auth: 'anyone' }, async () => {
      throw new Error('password of the database is hunter2');
    });
    const response = await get(ownRequest('/api/x'), nowhere);
    const text = await response.clone().text();
    expect(response.status).toBe(500);
    expect(text).not.toContain('hunter2');
    expect((await problemOf(response)).detail).toMatch(/[0-9a-f]{8}-[0-9a-f-]{27}/);
  });

  it('says that the database is away, and to come back', async () => {
    const get = route({ auth: 'anyone' }, async () => {
      throw Object.assign(new Error('connect ECONNREFUSED 127.0.0.1:2'), { code: 'ECONNREFUSED' });
    });
    const response = await get(ownRequest('/api/x'), nowhere);
    expect(response.status).toBe(503);
    expect(response.headers.get('retry-after')).toBe('30');
  });
});

describe('who asks', () => {
  const whoAmI = route({ auth: 'member' }, async ({ account }) => ({ email: account.email }));

  it('needs a sign-in where a member is asked for', async () => {
    const response = await whoAmI(ownRequest('/api/x'), nowhere);
    expect(response.status).toBe(401);
    expect((await problemOf(response)).code).toBe('sign-in-needed');
  });

  it('knows the account by the cookie, and stops knowing it when the sign-in was revoked', async () => {
    const account = await makeAccount();
    const { cookie, sessionId } = await signedIn(account.id);
    const response = await whoAmI(ownRequest('/api/x', { cookie: `other=1; ${cookie}` }), nowhere);
    expect(await response.json()).toEqual({ email: account.email });
    await database().models.Session.update({ revokedAt: new Date() }, { where: { id: sessionId } });
    expect((await whoAmI(ownRequest('/api/x', { cookie }), nowhere)).status).toBe(401);
  });

  it('does not know a sign-in that has run out, one of an unconfirmed account, or a cookie that was tampered with', async () => {
    const account = await makeAccount();
    const { cookie, sessionId } = await signedIn(account.id);
    expect((await whoAmI(ownRequest('/api/x', { cookie: `${cookie}x` }), nowhere)).status).toBe(401);
    await database().models.Session.update({ expiresAt: new Date(Date.now() - 1) }, { where: { id: sessionId } });
    expect((await whoAmI(ownRequest('/api/x', { cookie }), nowhere)).status).toBe(401);
    const unconfirmed = await signedIn((await makeAccount({ confirmed: false })).id);
    expect((await whoAmI(ownRequest('/api/x', { cookie: unconfirmed.cookie }), nowhere)).status).toBe(401);
  });

  it('asks the policy before the handler', async () => {
    const { cookie } = await signedIn((await makeAccount()).id);
    let ran = false;
    const get = route({ auth: 'member', policy: ({ account }) => refused(`Not you, ${account.name}.`) }, async () => {
      ran = true;
    });
    const response = await get(ownRequest('/api/x', { cookie }), nowhere);
    expect(response.status).toBe(403);
    expect((await problemOf(response)).detail).toBe('Not you, A builder.');
    expect(ran).toBe(false);
  });
});

describe('what comes in', () => {
  const body = z.strictObject({ what: z.string().min(1, 'Say what.') });
  const post = route({ auth: 'anyone', body, maxBytes: 1_000 }, async ({ body: { what } }) => ({ what }));
  const send = (text: string, headers: Record<string, string> = {}) => {
    const base = ownRequest('/api/x', { method: 'POST' });
    return post(
      new Request(base, { body: text, headers: { ...Object.fromEntries(base.headers), ...headers } }),
      nowhere,
    );
  };

  it('parses the body, and names each field that is wrong', async () => {
    expect(await (await send('{"what":"a seat"}')).json()).toEqual({ what: 'a seat' });
    const response = await send('{"what":"","extra":1}');
    expect(response.status).toBe(422);
    const problem = (await response.json()) as { fields: unknown };
    expect(problem.fields).toContainEqual({ path: 'what', message: 'Say what.' });
  });

  it('says that JSON is not readable', async () => {
    for (const text of ['{"what":', '', 'what=1', '\u{feff}{']) {
      expect((await problemOf(await send(text))).code).toBe('malformed');
    }
  });

  it('refuses what is too large, by its declared and by its real size', async () => {
    const long = JSON.stringify({ what: 'x'.repeat(1_000) });
    expect((await send(long)).status).toBe(413);
    const streamed = new ReadableStream<Uint8Array>({
      pull(controller) {
        controller.enqueue(new TextEncoder().encode(' '.repeat(400)));
      },
    });
    const base = ownRequest('/api/x', { method: 'POST' });
    const endless = new Request(base, { body: streamed, duplex: 'half' } as RequestInit);
    expect((await post(endless, nowhere)).status).toBe(413);
  });

  it('parses path and search, a repeated name as a list', async () => {
    const get = route(
      {
        auth: 'anyone',
        params: z.object({ id: z.uuid() }),
        query: z.object({ after: z.coerce.number().int(), tag: z.array(z.string()).optional() }),
      },
      async ({ params, query }) => ({ params, query }),
    );
    const id = '0198f0a0-0000-7000-8000-000000000001';
    const response = await get(ownRequest('/api/x?after=3&tag=a&tag=b'), routeContext({ id }));
    expect(await response.json()).toEqual({ params: { id }, query: { after: 3, tag: ['a', 'b'] } });
    expect((await get(ownRequest('/api/x?after=3'), routeContext({ id: 'x' }))).status).toBe(400);
    expect((await get(ownRequest('/api/x?after=z'), routeContext({ id }))).status).toBe(400);
  });

  it('takes raw bytes of the named kinds, and gives them unread', async () => {
    const put = route({ auth: 'anyone', kind: 'bytes', maxBytes: 10 }, async ({ bytes }) => ({ size: bytes.length }));
    const base = ownRequest('/api/x', { method: 'PUT', headers: { 'content-type': 'image/jpeg' } });
    expect(await (await put(new Request(base, { body: new Uint8Array(7) }), nowhere)).json()).toEqual({ size: 7 });
    const large = ownRequest('/api/x', { method: 'PUT', headers: { 'content-type': 'image/jpeg' } });
    expect((await put(new Request(large, { body: new Uint8Array(11) }), nowhere)).status).toBe(413);
    const svg = ownRequest('/api/x', { method: 'PUT', headers: { 'content-type': 'image/svg+xml' } });
    expect((await put(new Request(svg, { body: '<svg/>' }), nowhere)).status).toBe(415);
  });
});
