import { Client } from 'pg';
import { openDatabase } from '@/lib/server/db';
import { migrate } from '@/lib/server/migrate';

/** Database that the files of one run are copied from, so that each starts migrated without running the migrations. */
export const TEMPLATE = 'holdfast_test_template';

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

export default async function setup(): Promise<void> {
  const admin = new Client({ connectionString: testServerUrl() });
  await admin.connect();
  await admin.query(`drop database if exists ${TEMPLATE} with (force)`);
  await admin.query(`create database ${TEMPLATE}`);
  await admin.end();
  const { sequelize } = openDatabase(urlOf(TEMPLATE), 2);
  await migrate(sequelize);
  await sequelize.close();
}
