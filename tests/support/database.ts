import { randomBytes } from 'node:crypto';
import { afterAll, beforeAll } from 'vitest';
import { openDatabase, type Database } from '@/lib/server/db';
import { tellServer, templateName, urlOf } from './postgres-global';

const shared = globalThis as typeof globalThis & { holdfastDatabase?: Database };

/**
 * A database of this test file's own, dropped afterwards. The code under test finds it through `db()`.
 *
 * @param options.empty  leave it without a schema, for tests of migrations
 */
export function useDatabase({ empty = false }: { empty?: boolean } = {}): () => Database {
  const name = `holdfast_test_${randomBytes(6).toString('hex')}`;
  let database: Database | undefined;
  beforeAll(async () => {
    await tellServer(`create database ${name}${empty ? '' : ` template ${templateName()}`}`);
    process.env.DATABASE_URL = urlOf(name);
    database = openDatabase(urlOf(name), 10);
    shared.holdfastDatabase = database;
  });
  afterAll(async () => {
    await database?.sequelize.close();
    delete shared.holdfastDatabase;
    await tellServer(`drop database if exists ${name} with (force)`);
  });
  return () => {
    if (!database) throw new Error('the database is there from beforeAll on');
    return database;
  };
}
