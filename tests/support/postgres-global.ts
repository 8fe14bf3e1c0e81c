import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { openDatabase } from '@/lib/server/db';
import { migrate } from '@/lib/server/migrate';

export function testServerUrl(): string {
  const url = process.env.TEST_DATABASE_URL;
  if (!url)
    throw new Error('TEST_DATABASE_URL is not set. Run the tests with `npm test`, which starts a PostgreSQL for them.');
  return url;
}

export function urlOf(database: string): string {
  const url = new URL(testServerUrl());
  url.pathname = `/${database}`;
  return url.href;
}

/** Database that the files of this run are copied from, so that each starts migrated without running the migrations. */
export function templateName(): string {
  const name = process.env.TEST_TEMPLATE;
  if (!name) throw new Error('the template of this run has no name: global set-up did not run');
  return name;
}

/** Says one thing to the server of the tests. */
export async function tellServer(statement: string): Promise<void> {
  const client = new Client({ connectionString: testServerUrl() });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

/** Makes the template under a name of this run's own, and gives what takes it away again. */
export default async function setup(): Promise<() => Promise<void>> {
  const template = `holdfast_template_${randomBytes(6).toString('hex')}`;
  process.env.TEST_TEMPLATE = template;
  await tellServer(`create database ${template}`);
  const { sequelize } = openDatabase(urlOf(template), 2);
  await migrate(sequelize);
  await sequelize.close();
  return () => tellServer(`drop database if exists ${template} with (force)`);
}
