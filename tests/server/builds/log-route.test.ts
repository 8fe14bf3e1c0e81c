import { v7 } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import * as route from '@/app/api/builds/[buildId]/log/route';
import { logAnswerSchema, type LogAnswer } from '@/lib/domain/build/wire';
import type { Account } from '@/lib/server/auth/read-session';
import { readBuildLog } from '@/lib/server/queries/build-log';
import { makeAccount, signedIn } from '../../support/accounts';
import { startedBuild } from '../../support/builders';
import { useDatabase } from '../../support/database';
import { noteEntry } from '../../support/raw-entries';
import { ownRequest, routeContext } from '../../support/request';

useDatabase();
const DAY = 86_400_000;
const phone = v7();

let owner: Account;
let buildId: string;
let cookie: string;
beforeEach(async () => {
  ({ owner, buildId } = await startedBuild());
  ({ cookie } = await signedIn(owner.id));
});

type Made = Partial<Parameters<typeof noteEntry>[0]>;
const note = (made: Made = {}) => noteEntry({ deviceId: phone, madeAt: Date.now(), ...made, buildId });

interface Frame {
  accountId?: string;
  deviceId?: string;
  cursor?: number;
  sentAt?: number;
  as?: string;
}

function post(entries: unknown[], { as = cookie, ...frame }: Frame = {}): Promise<Response> {
  const body = { deviceId: phone, accountId: owner.id, cursor: 0, sentAt: Date.now(), ...frame, entries };
  const request = ownRequest(`/api/builds/${buildId}/log`, { method: 'POST', cookie: as, body });
  return route.POST(request, routeContext({ buildId }));
}

async function push(entries: unknown[], frame?: Frame): Promise<LogAnswer> {
  const response = await post(entries, frame);
  expect(response.status).toBe(200);
  return logAnswerSchema.parse(await response.json());
}

async function ask(after: number | string): Promise<Response> {
  return route.GET(ownRequest(`/api/builds/${buildId}/log?after=${after}`, { cookie }), routeContext({ buildId }));
}

async function problem(response: Response): Promise<{ status: number; type: string | null; code: string }> {
  const { code } = (await response.json()) as { code: string };
  return { status: response.status, type: response.headers.get('content-type'), code };
}
const refusal = (status: number, code: string) => ({ status, code, type: 'application/problem+json' });

describe('a batch over the wire', () => {
  it('S2, S3: is answered in the format that phones judge by, and the same again by the same', async () => {
    const entries = [note(), note(), note()];
    const once = await push(entries);
    expect(once.accepted.map(({ id, position }) => [id, position])).toEqual(entries.map(({ id }, i) => [id, i + 1]));
    const twice = await push(entries, { cursor: once.cursor });
    expect(twice).toMatchObject({ accepted: once.accepted, refused: [], entries: [], epoch: once.epoch });
    expect(await readBuildLog(buildId)).toHaveLength(3);
  });

  it('S2: the same id twice in one batch is one entry, or refused where it says something else', async () => {
    const first = note();
    const answer = await push([first, first, { ...first, value: { text: 'other', stepId: null } }]);
    expect(answer.accepted.map(({ position }) => position)).toEqual([1, 1]);
    expect(answer.refused).toMatchObject([{ id: first.id, code: 'id-reused' }]);
    expect(await readBuildLog(buildId)).toHaveLength(1);
  });

  it('S5: a note of 1 MB between good ones is refused alone', async () => {
    const large = note({ text: 'x'.repeat(1_000_000) });
    const good = [note(), note()];
    const answer = await push([good[0], large, good[1]]);
    expect(answer.accepted.map(({ id }) => id)).toEqual(good.map(({ id }) => id));
    expect(answer.refused).toMatchObject([{ id: large.id, code: 'too-large' }]);
  });

  it.each<[string, Made]>([
    ['that has seen more than any log can hold', { seen: 3_000_000_000 }],
    ['whose id is in capitals', { id: v7().toUpperCase() }],
  ])('S5: an entry %s is refused alone, each time', async (_name, made) => {
    const odd = note(made);
    for (const good of [note(), note()]) {
      const answer = await push([odd, good]);
      expect(answer.refused).toMatchObject([{ id: odd.id, code: 'malformed' }]);
      expect(answer.accepted.map(({ id }) => id)).toEqual([good.id]);
    }
  });

  it('larger than a megabyte is refused unread, as problem+json, and nothing is stored', async () => {
    const response = await post([note(), note({ text: 'x'.repeat(1_100_000) })]);
    expect(await problem(response)).toEqual(refusal(413, 'too-large'));
    expect(await readBuildLog(buildId)).toEqual([]);
  });

  it('for another account than that of the sign-in is refused whole', async () => {
    const other = await makeAccount();
    expect(await problem(await post([note()], { accountId: other.id }))).toEqual(refusal(403, 'wrong-account'));
    const { cookie: theirs } = await signedIn(other.id);
    expect(await problem(await post([note()], { as: theirs }))).toEqual(refusal(403, 'wrong-account'));
    expect(await readBuildLog(buildId)).toEqual([]);
  });

  it('S5: entries of another phone than the one that sends are refused, its own taken', async () => {
    const [own, foreign] = [note(), note({ deviceId: v7() })];
    const answer = await push([foreign, own]);
    expect(answer.accepted.map(({ id }) => id)).toEqual([own.id]);
    expect(answer.refused).toMatchObject([{ id: foreign.id, code: 'malformed' }]);
  });

  it('S3: many at once from two phones stand once each, without a gap, and every answer fits what is kept', async () => {
    const batches = Array.from({ length: 24 }, (_, i) => {
      const deviceId = i % 2 === 0 ? phone : v7();
      return { deviceId, entries: [note({ deviceId }), note({ deviceId }), note({ deviceId })] };
    });
    const sent = batches.flatMap((batch) => [batch, batch]);
    const answers = await Promise.all(sent.map(({ deviceId, entries }) => push(entries, { deviceId })));
    const rows = await readBuildLog(buildId);
    expect(rows.map(({ position }) => position)).toEqual(Array.from({ length: 72 }, (_, i) => i + 1));
    expect(rows.map(({ id }) => id).sort()).toEqual(
      batches.flatMap(({ entries }) => entries.map(({ id }) => id)).sort(),
    );
    const kept = new Map(rows.map(({ id, position, stamp }) => [id, { id, position, stamp }]));
    for (const taken of answers.flatMap(({ accepted }) => accepted)) expect(taken).toEqual(kept.get(taken.id));
  });
});

describe('S4: the stamp', () => {
  const stampOf = async (made: Made, frame?: Frame) => (await push([note(made)], frame)).accepted[0]!.stamp;

  it('of an entry that waited for a signal is the time when it was made', async () => {
    const now = Date.now();
    const stamp = await stampOf({ madeAt: now - 5 * 3_600_000 }, { sentAt: now });
    expect(Math.abs(stamp - (now - 5 * 3_600_000))).toBeLessThan(5_000);
  });

  it.each([9, -9])('of a phone whose clock is %i days off is corrected by as much', async (days) => {
    const now = Date.now();
    const stamp = await stampOf({ madeAt: now + days * DAY - 60_000 }, { sentAt: now + days * DAY });
    expect(Math.abs(stamp - (now - 60_000))).toBeLessThan(5_000);
  });

  it('is not later than receipt', async () => {
    const stamp = await stampOf({ madeAt: Date.now() + 9 * DAY });
    expect(stamp).toBeLessThanOrEqual(Date.now());
    expect(stamp).toBeGreaterThan(Date.now() - 5_000);
  });

  it('of days ago stays, but is not earlier than the phone’s entry before it', async () => {
    const now = Date.now();
    const [early, late] = (await push([note({ madeAt: now - DAY }), note({ madeAt: now - 3 * DAY })], { sentAt: now }))
      .accepted;
    expect(Math.abs(early!.stamp - (now - DAY))).toBeLessThan(5_000);
    expect(late!.stamp).toBe(early!.stamp);
    expect(await stampOf({ madeAt: now - 4 * DAY }, { sentAt: now })).toBe(early!.stamp);
  });

  it('is not earlier than anything seen, and of what was not seen it knows nothing', async () => {
    const first = await stampOf({});
    const [unseen, seen] = [v7(), v7()];
    const madeAt = Date.now() - DAY;
    expect(await stampOf({ deviceId: unseen, madeAt, seen: 0 }, { deviceId: unseen })).toBeLessThan(first);
    expect(await stampOf({ deviceId: seen, madeAt, seen: 1 }, { deviceId: seen })).toBe(first);
  });

  it('never breaks on a clock that no phone can have: the batch is refused in words', async () => {
    for (const sentAt of [1e300, -1e300, 1e19]) {
      expect(await problem(await post([note()], { sentAt }))).toEqual(refusal(422, 'invalid'));
    }
    expect((await push([note({ madeAt: -8.64e15 })], { sentAt: 8.64e15 })).accepted).toHaveLength(1);
  });
});

describe('asking for what others added', () => {
  it('S3: gives what stands after the cursor, in order, and then nothing', async () => {
    await push([note(), note(), note()]);
    const rest = logAnswerSchema.parse(await (await ask(1)).json());
    expect(rest.entries.map(({ position }) => position)).toEqual([2, 3]);
    expect(rest).toMatchObject({ cursor: 3, more: false, accepted: [], refused: [] });
    expect(logAnswerSchema.parse(await (await ask(rest.cursor)).json())).toMatchObject({ entries: [], cursor: 3 });
  });

  it.each(['-1', '1.5', 'x', '1e30'])('after %s is refused in words', async (after) => {
    expect(await problem(await ask(after))).toEqual(refusal(400, 'malformed'));
  });
});
