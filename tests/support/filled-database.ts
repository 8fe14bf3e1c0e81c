import { QueryTypes, type Sequelize } from 'sequelize';

/** Tables of the first migration, each of which {@link fillEveryTable} puts something into. */
export const FIRST_TABLES = [
  'accounts',
  'sessions',
  'tokens',
  'throttles',
  'files',
  'file_bytes',
  'plans',
  'plan_revisions',
  'plan_files',
  'builds',
  'crew_members',
  'log_entries',
  'snapshots',
  'photos',
  'server_epochs',
] as const;

/**
 * Puts rows into the schema as the first migration left it. Plain SQL: models follow the present schema, and this is a
 * database of that day.
 */
export async function fillEveryTable(sequelize: Sequelize): Promise<void> {
  const hash = (digit: string) => digit.repeat(64);
  await sequelize.query(`
    insert into accounts (id, email, name, password_hash, role, email_confirmed_at, created_at, updated_at) values
      ('00000000-0000-7000-8000-00000000000a', 'a@holdfast.example', 'Ash', 'x', 'author', now(), now(), now()),
      ('00000000-0000-7000-8000-00000000000b', 'b@holdfast.example', 'Beech', 'x', 'member', null, now(), now());
    insert into sessions (id, account_id, user_agent, last_seen_at, expires_at, revoked_at, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000c1', '00000000-0000-7000-8000-00000000000a', '', now(), now(), now(), now(), now());
    insert into tokens (id, account_id, purpose, token_hash, email, expires_at, used_at, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000c2', '00000000-0000-7000-8000-00000000000a', 'change-email', '${hash('1')}', 'c@holdfast.example', now(), null, now(), now());
    insert into throttles values ('sign-in/a', 3, now());
    insert into files (id, sha256, bytes, media_type, width, height, storage, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000f1', '${hash('2')}', 3, 'image/png', 1, 1, 'database', now(), now()),
      ('00000000-0000-7000-8000-0000000000f2', '${hash('3')}', 9, 'application/pdf', null, null, 'bucket', now(), now());
    insert into file_bytes values ('00000000-0000-7000-8000-0000000000f1', '\\x010203');
    insert into plans (id, owner_account_id, plan_key, title, visibility, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000d1', '00000000-0000-7000-8000-00000000000a', 'stool', 'Stool', 'public', now(), now());
    insert into plan_revisions (id, plan_id, number, content_hash, document, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000d2', '00000000-0000-7000-8000-0000000000d1', 1, '${hash('4')}', '{"format":"holdfast-plan"}', now(), now());
    update plans set current_revision_id = '00000000-0000-7000-8000-0000000000d2';
    insert into plan_files values ('00000000-0000-7000-8000-0000000000d2', 'elevations', '00000000-0000-7000-8000-0000000000f1');
    insert into builds (id, name, plan_revision_id, created_by, started_at, last_position, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000b1', 'Stool', '00000000-0000-7000-8000-0000000000d2', '00000000-0000-7000-8000-00000000000b', now(), 1, now(), now());
    insert into crew_members values
      ('00000000-0000-7000-8000-0000000000b1', '00000000-0000-7000-8000-00000000000b', 'owner', now(), null),
      ('00000000-0000-7000-8000-0000000000b1', '00000000-0000-7000-8000-00000000000a', 'helper', now(), now());
    insert into log_entries (id, build_id, position, stamp, account_id, device_id, made_at, seen, kind, v, target, value, content_hash, received_at) values
      ('00000000-0000-7000-8000-0000000000e1', '00000000-0000-7000-8000-0000000000b1', 1, 1800000000000, '00000000-0000-7000-8000-00000000000b',
       '00000000-0000-7000-8000-0000000000e2', 1800000000000, 0, 'step-marked', 1, '{"stepId":"cut"}', '{"mark":"done"}', '${hash('5')}', now());
    insert into snapshots values ('00000000-0000-7000-8000-0000000000b1', 1, '{"steps":{}}');
    insert into photos (id, build_id, sha256, file_id, account_id, created_at, updated_at) values
      ('00000000-0000-7000-8000-0000000000a1', '00000000-0000-7000-8000-0000000000b1', '${hash('6')}', '00000000-0000-7000-8000-0000000000f1',
       '00000000-0000-7000-8000-00000000000b', now(), now());
  `);
}

/** Every row of these tables, in a fixed order. */
export async function rowsOf(sequelize: Sequelize, tables: readonly string[]): Promise<Record<string, unknown[]>> {
  const rows: Record<string, unknown[]> = {};
  for (const table of tables) {
    rows[table] = await sequelize.query(`select * from ${table} t order by t::text`, { type: QueryTypes.SELECT });
  }
  return rows;
}
