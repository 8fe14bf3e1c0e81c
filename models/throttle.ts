import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { integer, text, time } from './columns';

/** How often something was tried in the present window, by what is throttled. */
export class Throttle extends Model<InferAttributes<Throttle>, InferCreationAttributes<Throttle>> {
  declare key: string;
  declare count: number;
  declare windowEndsAt: Date;
}

export function defineThrottle(sequelize: Sequelize): typeof Throttle {
  return Throttle.init(
    {
      key: { ...text(), primaryKey: true },
      count: integer(),
      windowEndsAt: time(),
    },
    { sequelize, tableName: 'throttles', modelName: 'Throttle', timestamps: false },
  );
}
