import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { nothing, send } from '@/components/account/send';

const answer = z.object({ sent: z.literal(true) });
const answering = (body: string | null, init: ResponseInit) => {
  const fetching = vi.fn<typeof fetch>(async () => new Response(body, init));
  vi.stubGlobal('fetch', fetching);
  return fetching;
};

afterEach(() => vi.unstubAllGlobals());

describe('send', () => {
  it('carries the proof that it comes from our own page, and JSON', async () => {
    const fetching = answering('{"sent":true}', { status: 200 });
    expect(await send('POST', '/api/accounts/letter', answer, { email: 'a@example.org' })).toEqual({
      ok: true,
      value: { sent: true },
    });
    const [path, init] = fetching.mock.calls[0] ?? [];
    expect(path).toBe('/api/accounts/letter');
    expect(init).toMatchObject({
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-holdfast': '1' },
      body: '{"email":"a@example.org"}',
    });
  });

  it('reads an answer with nothing in it', async () => {
    answering(null, { status: 204 });
    expect(await send('POST', '/x', nothing)).toEqual({ ok: true, value: undefined });
  });

  it('gives the words, the code and the fields of a failure', async () => {
    const problem = { code: 'invalid', detail: 'Say what.', fields: [{ path: 'email', message: 'Say which.' }] };
    answering(JSON.stringify({ ...problem, type: 'x', title: 'y', status: 422 }), { status: 422 });
    expect(await send('POST', '/x', answer)).toEqual({ ok: false, ...problem });
  });

  it('takes the page of a Wi-Fi that wants a sign-in for no answer of ours, with status 200 or any other', async () => {
    for (const status of [200, 302, 403, 511]) {
      answering('<html>Welcome to the café</html>', { status });
      expect(await send('POST', '/x', answer)).toMatchObject({ ok: false, code: 'not-ours' });
    }
    answering('{"sent":"perhaps"}', { status: 200 });
    expect(await send('POST', '/x', answer)).toMatchObject({ ok: false, code: 'not-ours' });
  });

  it('says that no answer came', async () => {
    vi.stubGlobal('fetch', async () => {
      throw new TypeError('Failed to fetch');
    });
    expect(await send('POST', '/x', answer)).toMatchObject({ ok: false, code: 'no-signal' });
  });
});
