import { beforeAll, describe, expect, it } from 'vitest';
import { migrate } from '@/lib/server/migrate';
import { useDatabase } from '../support/database';
import { fillEveryTable, rowsOf } from '../support/filled-database';

const database = useDatabase({ empty: true });
const id = (end: string) => `00000000-0000-7000-8000-${end.padStart(12, '0')}`;
const [author, builder, build, plan] = [id('a'), id('b'), id('b1'), id('d1')];
const OF_A_BUILD = ['builds', 'crew_members', 'log_entries', 'snapshots', 'photos'] as const;
const KEPT = ['accounts', 'plans', 'plan_revisions', 'plan_files', 'files', 'file_bytes'] as const;

const remove = (table: string, row: string) =>
  database().sequelize.query(`delete from ${table} where id = :row`, { replacements: { row } });

beforeAll(async () => {
  await migrate(database().sequelize);
  await fillEveryTable(database().sequelize);
});

describe('what a filled database lets go, and what it keeps', () => {
  it.each([
    ['an account that has a build', 'accounts', builder],
    ['an account that has a plan', 'accounts', author],
    ['a plan that has revisions', 'plans', plan],
    ['a file of a plan or of a photo', 'files', id('f1')],
  ])('%s stays', async (_name, table, row) => {
    await expect(remove(table, row)).rejects.toThrow(/foreign key constraint/);
  });

  it.each([
    ['update log_entries set position = 9', /never changed/],
    ['update plan_revisions set number = 9', /never changed/],
    ['delete from log_entries', /never deleted/],
    ['delete from plan_revisions', /never deleted/],
  ])('%s is refused', async (statement, words) => {
    const before = await rowsOf(database().sequelize, ['log_entries', 'plan_revisions']);
    await expect(database().sequelize.query(statement)).rejects.toThrow(words);
    expect(await rowsOf(database().sequelize, ['log_entries', 'plan_revisions'])).toEqual(before);
  });

  it('two entries of a build have never one position, and a build has never two owners', async () => {
    const { sequelize } = database();
    await expect(
      sequelize.query(
        `insert into log_entries select gen_random_uuid(), build_id, position, stamp, account_id, device_id, made_at, seen,
           kind, v, target, value, content_hash, received_at from log_entries limit 1`,
      ),
    ).rejects.toMatchObject({ parent: { constraint: 'log_entries_build_id_position_key' } });
    await sequelize.query('delete from crew_members where account_id = :author', { replacements: { author } });
    await expect(
      sequelize.query(`insert into crew_members values (:build, :author, 'owner', now(), null)`, {
        replacements: { build, author },
      }),
    ).rejects.toMatchObject({ parent: { constraint: 'one_owner_for_each_build' } });
  });

  it('a build goes with its crew, log, snapshot and photos, and takes nothing of the plan with it', async () => {
    const { sequelize } = database();
    const kept = await rowsOf(sequelize, KEPT);
    await remove('builds', build);
    const gone = await rowsOf(sequelize, OF_A_BUILD);
    for (const table of OF_A_BUILD) expect(gone[table], table).toEqual([]);
    expect(await rowsOf(sequelize, KEPT)).toEqual(kept);
  });

  it('an account with nothing of its own goes, with its sign-ins and letters', async () => {
    const { sequelize } = database();
    await sequelize.query(
      `insert into accounts (id, email, name, password_hash, created_at, updated_at) values
         (:row, 'd@holdfast.example', 'D', 'x', now(), now())`,
      { replacements: { row: id('d') } },
    );
    await sequelize.query(
      `insert into sessions (id, account_id, user_agent, last_seen_at, expires_at, created_at, updated_at) values
         (gen_random_uuid(), :row, '', now(), now(), now(), now())`,
      { replacements: { row: id('d') } },
    );
    await remove('accounts', id('d'));
    const { sessions } = await rowsOf(sequelize, ['sessions']);
    expect(sessions!.map((row) => (row as { account_id: string }).account_id)).not.toContain(id('d'));
  });
});
