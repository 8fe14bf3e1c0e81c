import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { afterAll, beforeAll } from 'vitest';
import { openDatabase, type Database } from '@/lib/server/db';
import { TEMPLATE, testServerUrl, urlOf } from './postgres-global';

const shared = globalThis as typeof globalThis & { holdfastDatabase?: Database };

async function admin(statement: string): Promise<void> {
  const client = new Client({ connectionString: testServerUrl() });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

/**
 * A database of this test file's own, dropped afterwards. The code under test finds it through `db()`.
 *
 * @param options.empty  leave it without a schema, for tests of migrations
 */
export function useDatabase({ empty = false }: { empty?: boolean } = {}): () => Database {
  const name = `holdfast_test_${randomBytes(6).toString('hex')}`;
  let database: Database | undefined;
  beforeAll(async () => {
    await admin(`create database ${name}${empty ? '' : ` template ${TEMPLATE}`}`);
    process.env.DATABASE_URL = urlOf(name);
    database = openDatabase(urlOf(name), 10);
    shared.holdfastDatabase = database;
  });
  afterAll(async () => {
    await database?.sequelize.close();
    delete shared.holdfastDatabase;
    await admin(`drop database if exists ${name} with (force)`);
  });
  return () => {
    if (!database) throw new Error('the database is there from beforeAll on');
    return database;
  };
}
