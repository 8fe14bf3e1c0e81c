import { v7 } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import type { LogPush } from '@/lib/domain/build/wire';
import { appendLog } from '@/lib/server/commands/append-log';
import type { Account } from '@/lib/server/auth/read-session';
import { readBuildLog } from '@/lib/server/queries/build-log';
import { makeAccount } from '../../support/accounts';
import { startedBuild } from '../../support/builders';
import { useDatabase } from '../../support/database';
import { noteEntry } from '../../support/raw-entries';

const database = useDatabase();
const NOW = 1_800_000_000_000;

let owner: Account;
let buildId: string;
const phone = v7();

beforeEach(async () => {
  ({ owner, buildId } = await startedBuild());
});

const note = ({ of = buildId, ...made }: Partial<Parameters<typeof noteEntry>[0]> & { of?: string } = {}) =>
  noteEntry({ deviceId: phone, madeAt: NOW, ...made, buildId: of });

const push = (entries: LogPush['entries'], { account = owner, deviceId = phone, cursor = 0, at = NOW } = {}) =>
  appendLog(buildId, account, { deviceId, accountId: account.id, cursor, sentAt: at, entries }, at);

const plain = (value: unknown) => JSON.parse(JSON.stringify(value)) as unknown;

describe('the log on the server', () => {
  it('S3: gives positions without a gap, and others’ entries after the cursor', async () => {
    const first = await push([note(), note()]);
    expect(first.accepted.map(({ position }) => position)).toEqual([1, 2]);
    const answer = await push(
      [note({ deviceId: v7() })].map((entry) => ({ ...entry, deviceId: phone })),
      { cursor: 1 },
    );
    expect(answer.entries.map(({ position }) => position)).toEqual([2, 3]);
    expect(answer.cursor).toBe(3);
  });

  it('S2: a repeat gets the stored answer, and nothing doubles', async () => {
    const entries = [note(), note()];
    const once = await push(entries);
    const twice = await push(entries, { at: NOW + 60_000 });
    expect(twice.accepted).toEqual(once.accepted);
    expect(await readBuildLog(buildId)).toHaveLength(2);
  });

  it('S2: the same id with other content is refused', async () => {
    const id = v7();
    await push([note({ id })]);
    const answer = await push([note({ id, text: 'something else' })]);
    expect(answer.refused).toMatchObject([{ id, code: 'id-reused' }]);
  });

  it('S5: bad entries among good ones are refused by id and code, the good ones stay', async () => {
    const bad = {
      malformed: { ...note(), value: { colour: 'red' } },
      unknown: note({ kind: 'moon-phase' }),
      newer: note({ v: 9 }),
      large: note({ text: 'x'.repeat(1_000_000) }),
      elsewhere: note({ of: v7() }),
    };
    const good = [note(), note()];
    const answer = await push([good[0]!, ...Object.values(bad), good[1]!]);
    expect(answer.accepted.map(({ id }) => id)).toEqual(good.map(({ id }) => id));
    expect(Object.fromEntries(answer.refused.map(({ id, code }) => [id, code]))).toEqual({
      [bad.malformed.id]: 'malformed',
      [bad.unknown.id]: 'unknown-kind',
      [bad.newer.id]: 'newer-version',
      [bad.large.id]: 'too-large',
      [bad.elsewhere.id]: 'wrong-build',
    });
  });

  it('S4: a clock days ahead is held to receipt, one days behind to what the phone had seen', async () => {
    const [ahead] = (await push([note({ madeAt: NOW + 9 * 86_400_000 })])).accepted;
    expect(ahead!.stamp).toBe(NOW);
    const other = v7();
    const behind = await push([note({ deviceId: other, madeAt: 5, seen: 1 })], { deviceId: other, at: NOW + 10 });
    expect(behind.accepted[0]!.stamp).toBe(NOW);
  });

  it('refuses a removed helper entry by entry, and an onlooker, with the reason', async () => {
    const helper = await makeAccount();
    const { CrewMember } = database().models;
    const member = await CrewMember.create({ buildId, accountId: helper.id, role: 'helper', joinedAt: new Date() });
    expect((await push([note()], { account: helper })).accepted).toHaveLength(1);
    await member.update({ role: 'onlooker' });
    expect((await push([note()], { account: helper })).refused).toMatchObject([{ code: 'not-allowed' }]);
    await member.update({ removedAt: new Date() });
    expect((await push([note()], { account: helper })).refused).toMatchObject([
      { code: 'not-allowed', message: expect.stringContaining('no longer') },
    ]);
  });

  it('refuses a phone that speaks for another account', async () => {
    const other = await makeAccount();
    await expect(
      appendLog(
        buildId,
        other,
        { deviceId: phone, accountId: owner.id, cursor: 0, sentAt: NOW, entries: [note()] },
        NOW,
      ),
    ).rejects.toMatchObject({ code: 'wrong-account' });
    expect(await readBuildLog(buildId)).toHaveLength(0);
  });

  it('S3: two phones at once get one gapless order, and the snapshot is the fold of all of it', async () => {
    const phones = [v7(), v7()];
    await Promise.all(
      Array.from({ length: 20 }, (_, i) => {
        const deviceId = phones[i % 2]!;
        return push([note({ deviceId, text: `a ${i}` }), note({ deviceId, text: `b ${i}` })], { deviceId });
      }),
    );
    const rows = await readBuildLog(buildId);
    expect(rows.map(({ position }) => position)).toEqual(Array.from({ length: 40 }, (_, i) => i + 1));
    const snapshot = await database().models.Snapshot.findByPk(buildId, { rejectOnEmpty: true });
    expect(plain(snapshot.state)).toEqual(plain(foldEntries(rows as StandingEntry[])));
  });

  it('is written once: the database itself refuses a change', async () => {
    await push([note()]);
    await expect(database().sequelize.query('update log_entries set position = 99')).rejects.toThrow(/never changed/);
  });
});
