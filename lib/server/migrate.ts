import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { QueryInterface, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';

/** A migration changes the schema forward and keeps the data. */
export interface Migration {
  up: (queryInterface: QueryInterface) => Promise<void>;
}

const folder = path.join(process.cwd(), 'migrations');
const NAME = /^\d{14}-[a-z]+(-[a-z0-9]+)+\.ts$/;

/** Files of the migrations in the order in which they run. */
export function migrationFiles(): string[] {
  return readdirSync(folder)
    .filter((name) => NAME.test(name))
    .sort();
}

/**
 * Brings a database to the present schema, or to the state after the migration named `to`.
 *
 * Several servers may start at once: an advisory lock lets one run and the others find the work done.
 *
 * @returns names of the migrations that were run, in order
 */
export async function migrate(sequelize: Sequelize, { to }: { to?: string } = {}): Promise<string[]> {
  const umzug = new Umzug<QueryInterface>({
    migrations: migrationFiles().map((name) => ({
      name,
      up: async ({ context }: { context: QueryInterface }) => {
        const migration = (await import(pathToFileURL(path.join(folder, name)).href)) as Migration;
        await migration.up(context);
      },
    })),
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, tableName: 'schema_migrations' }),
    logger: undefined,
  });
  return sequelize.transaction(async (transaction) => {
    await sequelize.query('select pg_advisory_xact_lock(727274)', { transaction });
    const done = await umzug.up(to ? { to } : {});
    return done.map(({ name }) => name);
  });
}
