import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { integer, json, uuid } from './columns';
import type { BuildState } from '@/lib/domain/build/state';

/** The fold of a build up to a position, kept in the transaction that added the entries. */
export class Snapshot extends Model<InferAttributes<Snapshot>, InferCreationAttributes<Snapshot>> {
  declare buildId: string;
  declare position: number;
  declare state: BuildState;
}

export function defineSnapshot(sequelize: Sequelize): typeof Snapshot {
  return Snapshot.init(
    {
      buildId: { ...uuid(), primaryKey: true },
      position: integer(),
      state: json(),
    },
    { sequelize, tableName: 'snapshots', modelName: 'Snapshot', timestamps: false },
  );
}
