import 'server-only';
import { Sequelize } from 'sequelize';
import { defineModels, type Models } from '@/models';
import { env } from './env';

export interface Database {
  sequelize: Sequelize;
  models: Models;
}

/** Opens a pool on a database. Nothing is sent until the first query. */
export function openDatabase(url: string, poolSize = 10): Database {
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: poolSize, min: 0, idle: 10_000, acquire: 20_000 },
    dialectOptions: { application_name: 'holdfast' },
    define: { underscored: true, timestamps: true },
  });
  return { sequelize, models: defineModels(sequelize) };
}

const shared = globalThis as typeof globalThis & { holdfastDatabase?: Database };

/** This server's database: one pool, kept over reloads of modules in development. */
export function db(): Database {
  shared.holdfastDatabase ??= openDatabase(env().DATABASE_URL);
  return shared.holdfastDatabase;
}
