import { beforeAll, describe, expect, it } from 'vitest';
import { migrate, migrationFiles } from '@/lib/server/migrate';
import { useDatabase } from '../support/database';
import { fillEveryTable, FIRST_TABLES, rowsOf } from '../support/filled-database';

const database = useDatabase({ empty: true });
const [first, ...later] = migrationFiles();

describe('a database with something in every table', () => {
  let before: Record<string, unknown[]>;
  beforeAll(async () => {
    await migrate(database().sequelize, { to: first });
    await fillEveryTable(database().sequelize);
    before = await rowsOf(database().sequelize, FIRST_TABLES);
  });

  it('is filled', () => {
    for (const table of FIRST_TABLES) expect(before[table]!.length, table).toBeGreaterThan(0);
  });

  it.each(later)('keeps all of it through %s', async (name) => {
    await migrate(database().sequelize, { to: name });
    const after = await rowsOf(database().sequelize, FIRST_TABLES);
    for (const table of FIRST_TABLES) expect(after[table], table).toMatchObject(before[table]!);
  });
});
