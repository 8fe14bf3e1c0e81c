import { afterEach, describe, expect, it, vi } from 'vitest';
import { endOwedSignOut, signIn } from '@/components/account/sign-in-out';
import {
  deviceDatabase,
  enterAccount,
  getCurrentAccount,
  isSignOutOwed,
  saveSignOutOwed,
} from '@/lib/store/device-database';

const first = { accountId: '0198f0a0-0000-7000-8000-0000000000a1', name: 'Toni', email: 'toni@holdfast.example' };
const second = { accountId: '0198f0a0-0000-7000-8000-0000000000a2', name: 'Ira', email: 'ira@holdfast.example' };

/** A server on which `second` is signed in; what was asked of it, in order. */
function serverOf({ signal = true, me = true } = {}): string[] {
  const asked: string[] = [];
  vi.stubGlobal('fetch', async (path: string) => {
    if (!signal) throw new TypeError('network');
    asked.push(path);
    if (path.endsWith('/csrf')) return Response.json({ csrfToken: 'x' });
    if (path === '/api/me') return me ? Response.json(second) : new Response('<html></html>');
    return new Response(null, { status: 204 });
  });
  return asked;
}

afterEach(async () => {
  vi.unstubAllGlobals();
  await deviceDatabase().facts.clear();
  await deviceDatabase().accounts.clear();
});

describe('a sign-out with no signal', () => {
  it('is made up for once there is one, and only once', async () => {
    await saveSignOutOwed(true);
    serverOf({ signal: false });
    expect(await endOwedSignOut()).toBe('owed');
    const asked = serverOf();
    expect(await endOwedSignOut()).toBe('ended');
    expect(asked).toContain('/api/auth/signout');
    expect(await endOwedSignOut()).toBe('none');
  });

  it('never ends the sign-in that took its place', async () => {
    await saveSignOutOwed(true);
    const asked = serverOf();
    expect(await signIn({ email: second.email, password: 'a-bench-and-four-feet' })).toMatchObject({ ok: true });
    expect(await isSignOutOwed()).toBe(false);
    expect(await endOwedSignOut()).toBe('none');
    expect(asked).not.toContain('/api/auth/signout');
  });
});

describe('a sign-in', () => {
  it('makes the bench that account’s at once', async () => {
    await enterAccount(first, 1);
    serverOf();
    await signIn({ email: second.email, password: 'a-bench-and-four-feet' });
    expect(await getCurrentAccount()).toMatchObject(second);
  });

  it('leaves the bench as it is when nobody says who that is', async () => {
    await enterAccount(first, 1);
    serverOf({ me: false });
    expect(await signIn({ email: second.email, password: 'a-bench-and-four-feet' })).toMatchObject({ ok: true });
    expect(await getCurrentAccount()).toMatchObject(first);
  });
});
