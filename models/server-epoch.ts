import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { integer, uuid } from './columns';

/** Changes when the database was restored, so that phones send again what was lost (rule S7). */
export class ServerEpoch extends Model<InferAttributes<ServerEpoch>, InferCreationAttributes<ServerEpoch>> {
  declare id: number;
  declare epoch: string;
}

export function defineServerEpoch(sequelize: Sequelize): typeof ServerEpoch {
  return ServerEpoch.init(
    {
      id: { ...integer(), primaryKey: true },
      epoch: uuid(),
    },
    { sequelize, tableName: 'server_epochs', modelName: 'ServerEpoch', timestamps: false },
  );
}
