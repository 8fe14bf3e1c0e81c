import { v7 } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import type { Account } from '@/lib/server/auth/read-session';
import { appendLog } from '@/lib/server/commands/append-log';
import { renewEpoch } from '@/lib/server/commands/renew-epoch';
import { readBuildLog } from '@/lib/server/queries/build-log';
import { readLogAnswer } from '@/lib/server/queries/log-page';
import { makeAccount } from '../../support/accounts';
import { joinCrew, startedBuild } from '../../support/builders';
import { useDatabase } from '../../support/database';
import { noteEntry } from '../../support/raw-entries';

const database = useDatabase();
const NOW = 1_800_000_000_000;
const phone = v7();

let owner: Account;
let buildId: string;
beforeEach(async () => {
  ({ owner, buildId } = await startedBuild());
  await push(owner, [noteEntry({ buildId, deviceId: phone, text: 'the owner’s own' })]);
});

const push = (account: Account, entries: ReturnType<typeof noteEntry>[], { cursor = 0, to = buildId } = {}) =>
  appendLog(to, account, { deviceId: phone, accountId: account.id, cursor, sentAt: NOW, entries }, NOW);

describe('who reads by sending', () => {
  it('nobody who was never of the crew, not even with an empty batch', async () => {
    const stranger = await makeAccount();
    await expect(push(stranger, [])).rejects.toMatchObject({ code: 'not-found' });
    const own = noteEntry({ buildId, deviceId: phone });
    await expect(push(stranger, [own])).rejects.toMatchObject({ code: 'not-found' });
    expect(await readBuildLog(buildId)).toHaveLength(1);
  });

  it('a removed helper is told so for each entry, has the answers to what was taken before, and reads nothing', async () => {
    const helper = await makeAccount();
    const member = await joinCrew(buildId, helper, 'helper');
    const before = noteEntry({ buildId, deviceId: phone, text: 'while I was of the crew' });
    const { accepted } = await push(helper, [before]);
    await member.update({ removedAt: new Date() });
    const late = noteEntry({ buildId, deviceId: phone, text: 'too late' });
    const answer = await push(helper, [before, late]);
    expect(answer.accepted).toEqual(accepted);
    expect(answer.refused).toMatchObject([{ id: late.id, code: 'not-allowed' }]);
    expect(answer).toMatchObject({ entries: [], cursor: 0, more: false });
  });

  it('an onlooker reads with an empty batch, and adds nothing', async () => {
    const onlooker = await makeAccount();
    await joinCrew(buildId, onlooker, 'onlooker');
    expect((await push(onlooker, [])).entries).toHaveLength(1);
    const answer = await push(onlooker, [noteEntry({ buildId, deviceId: phone })]);
    expect(answer.refused).toMatchObject([{ code: 'not-allowed', message: expect.stringContaining('look on') }]);
  });
});

describe('what no entry may do to the rest', () => {
  it('S5: half an emoji and a null character are taken in without them, and a repeat is known', async () => {
    const odd = noteEntry({ buildId, deviceId: phone, text: 'glue \ud83d on \0 it' });
    const first = await push(owner, [odd]);
    expect(first.accepted).toHaveLength(1);
    expect(first.entries.at(-1)).toMatchObject({ value: { text: 'glue \ufffd on \ufffd it' } });
    expect((await push(owner, [odd])).accepted).toEqual(first.accepted);
  });

  it('S2: one id sent to two builds at once is in one of them', async () => {
    const other = await startedBuild(owner);
    for (let round = 0; round < 5; round += 1) {
      const id = v7();
      const answers = await Promise.all(
        [buildId, other.buildId].map((to) => push(owner, [noteEntry({ id, buildId: to, deviceId: phone })], { to })),
      );
      expect(answers.flatMap(({ accepted }) => accepted)).toHaveLength(1);
      expect(answers.flatMap(({ refused }) => refused)).toMatchObject([{ id, code: 'id-reused' }]);
    }
  });

  it('a batch past its limit is refused whole', async () => {
    const many = Array.from({ length: 101 }, () => noteEntry({ buildId, deviceId: phone }));
    await expect(push(owner, many)).rejects.toMatchObject({ code: 'too-large' });
    expect(await readBuildLog(buildId)).toHaveLength(1);
  });
});

describe('paging', () => {
  it('gives 500 at a time and says that more wait', async () => {
    for (let batch = 0; batch < 6; batch += 1) {
      await push(
        owner,
        Array.from({ length: 100 }, () => noteEntry({ buildId, deviceId: phone })),
        { cursor: 1_000 },
      );
    }
    const first = await readLogAnswer(buildId, 0);
    expect(first).toMatchObject({ cursor: 500, more: true });
    expect(first.entries).toHaveLength(500);
    const second = await readLogAnswer(buildId, first.cursor);
    expect(second).toMatchObject({ cursor: 601, more: false });
    expect(second.entries.map(({ position }) => position)).toEqual(Array.from({ length: 101 }, (_, i) => 501 + i));
  });
});

describe('S7: a database that came back from a backup', () => {
  it('has a new epoch once the operator says so, the same in every answer until then', async () => {
    const before = (await push(owner, [])).epoch;
    expect((await readLogAnswer(buildId, 0)).epoch).toBe(before);
    const renewed = await renewEpoch();
    expect(renewed).not.toBe(before);
    expect((await push(owner, [])).epoch).toBe(renewed);
  });

  it('is noticed by a phone that had seen more than there is, which starts over', async () => {
    const { epoch } = await readLogAnswer(buildId, 1);
    const answer = await push(owner, [], { cursor: 7 });
    expect(answer.epoch).not.toBe(epoch);
    expect(answer).toMatchObject({ entries: [], more: true });
    expect((await push(owner, [], { cursor: 0 })).epoch).toBe(epoch);
  });
});

it('keeps the log and the revision of a build for as long as it stands, and lets a whole build go', async () => {
  const { sequelize, models } = database();
  for (const table of ['log_entries', 'plan_revisions']) {
    await expect(sequelize.query(`delete from ${table}`)).rejects.toThrow(/never deleted/);
    await expect(sequelize.query(`truncate ${table} cascade`)).rejects.toThrow(/never deleted/);
  }
  await models.Build.destroy({ where: { id: buildId } });
  expect(await readBuildLog(buildId)).toHaveLength(0);
});
