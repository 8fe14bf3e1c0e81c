import { describe, expect, it } from 'vitest';
import { DELETE as endOne } from '@/app/api/accounts/sessions/[id]/route';
import { DELETE as endOthers, GET as list } from '@/app/api/accounts/sessions/route';
import { call } from '../../support/account-calls';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { ownRequest } from '../../support/request';

useDatabase();
const listed = async (cookie: string) => {
  const { status, body } = await call(list, ownRequest('/api/accounts/sessions', { cookie }));
  return status === 200 ? (body?.sessions as { id: string; device: string; current: boolean }[]) : null;
};
const end = (cookie: string, id: string) =>
  call(endOne, ownRequest(`/api/accounts/sessions/${id}`, { method: 'DELETE', cookie }), { id });

describe('sign-ins', () => {
  it('are listed with the device in words, this one marked, and nobody else’s among them', async () => {
    const account = await makeAccount();
    const stranger = await makeAccount();
    const phone = await signedIn(account.id, 'Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) Safari/604.1');
    const computer = await signedIn(account.id);
    await signedIn(stranger.id);
    const sessions = await listed(computer.cookie);
    expect(sessions?.map(({ device, current }) => [device, current])).toEqual([
      ['Firefox on a Linux computer', true],
      ['Safari on an iPhone', false],
    ]);
    expect(sessions?.map(({ id }) => id)).toEqual([computer.sessionId, phone.sessionId]);
  });

  it('can be ended one by one, once', async () => {
    const account = await makeAccount();
    const here = await signedIn(account.id);
    const lost = await signedIn(account.id);
    expect(await end(here.cookie, lost.sessionId)).toMatchObject({ status: 200, body: { ended: 1 } });
    expect(await listed(lost.cookie)).toBeNull();
    expect(await listed(here.cookie)).toHaveLength(1);
    expect((await end(here.cookie, lost.sessionId)).status).toBe(404);
  });

  it('can be ended all but this one', async () => {
    const account = await makeAccount();
    const here = await signedIn(account.id);
    const others = [await signedIn(account.id), await signedIn(account.id)];
    const answer = await call(endOthers, ownRequest('/api/x', { method: 'DELETE', cookie: here.cookie }));
    expect(answer).toMatchObject({ status: 200, body: { ended: 2 } });
    for (const other of others) expect(await listed(other.cookie)).toBeNull();
    expect(await listed(here.cookie)).toHaveLength(1);
  });

  it('of another account are not there', async () => {
    const here = await signedIn((await makeAccount()).id);
    const theirs = await signedIn((await makeAccount()).id);
    expect((await end(here.cookie, theirs.sessionId)).status).toBe(404);
    expect(await listed(theirs.cookie)).toHaveLength(1);
    expect((await end(here.cookie, 'not-an-id')).status).toBe(400);
  });
});
