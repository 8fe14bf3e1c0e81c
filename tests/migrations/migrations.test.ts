import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { migrate, migrationFiles } from '@/lib/server/migrate';
import { useDatabase } from '../support/database';

const database = useDatabase({ empty: true });

/** Columns, constraints and indexes as PostgreSQL tells them, one a line. */
async function schema(): Promise<string> {
  const [rows] = await database().sequelize.query(`
    select line from (
      select format('%s.%s %s%s', table_name, column_name, data_type, case is_nullable when 'NO' then ' not null' else '' end) as line
        from information_schema.columns where table_schema = 'public'
      union all
      select format('%s constraint %s', conrelid::regclass, pg_get_constraintdef(oid))
        from pg_constraint where connamespace = 'public'::regnamespace
      union all
      select indexdef from pg_indexes where schemaname = 'public'
      union all
      select format('trigger %s on %s', tgname, tgrelid::regclass) from pg_trigger where not tgisinternal
    ) lines where line not like '%schema_migrations%' order by line collate "C"`);
  return (rows as { line: string }[]).map(({ line }) => line).join('\n') + '\n';
}

describe('migrations', () => {
  it('are named for when and what', () => {
    expect(migrationFiles().length).toBeGreaterThan(0);
    const stamps = migrationFiles().map((name) => name.slice(0, 14));
    expect(new Set(stamps).size).toBe(stamps.length);
  });

  it('lead to the schema that is committed, and a second run changes nothing', async () => {
    expect(await migrate(database().sequelize)).toEqual(migrationFiles());
    await expect(await schema()).toMatchFileSnapshot(path.resolve('migrations/schema.txt'));
    expect(await migrate(database().sequelize)).toEqual([]);
  });

  it('give no retired name to anything again', async () => {
    const retired = readFileSync('migrations/retired-names.txt', 'utf8')
      .split('\n')
      .filter((line) => line !== '' && !line.startsWith('#'));
    const lines = (await schema()).split('\n');
    const used = new Set(lines.flatMap((line) => /^(\w+)\.\w+(?= )/.exec(line)?.slice(0, 2) ?? []));
    expect(used).toContain('accounts.email');
    expect(used).toContain('accounts');
    expect(retired.filter((name) => used.has(name))).toEqual([]);
  });

  it('give every foreign key an index that begins with it and leaves no row out', async () => {
    const [bare] = await database().sequelize.query(`
      select c.conrelid::regclass || ' ' || pg_get_constraintdef(c.oid) as key from pg_constraint c
      where c.contype = 'f' and c.connamespace = 'public'::regnamespace and not exists (
        select from pg_index i
        where i.indrelid = c.conrelid and i.indpred is null
          and (i.indkey::int2[])[0:cardinality(c.conkey) - 1] = c.conkey)`);
    expect(bare).toEqual([]);
  });

  it('hold the rules that the database can hold', async () => {
    const { sequelize } = database();
    const account = (email: string, role = 'member') =>
      sequelize.query(
        `insert into accounts (id, email, name, password_hash, role, created_at, updated_at)
         values (gen_random_uuid(), '${email}', 'A', 'x', '${role}', now(), now())`,
      );
    await account('a@holdfast.example');
    await expect(account('a@holdfast.example')).rejects.toThrow();
    await expect(account('B@holdfast.example')).rejects.toThrow();
    await expect(account('c@holdfast.example', 'king')).rejects.toThrow();
    await expect(sequelize.query(`insert into server_epochs values (2, gen_random_uuid())`)).rejects.toThrow();
  });
});
