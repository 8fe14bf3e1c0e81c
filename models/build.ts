import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { integer, optional, primaryUuid, text, time, uuid } from './columns';

/** One build of one revision; its record is the log. */
export class Build extends Model<InferAttributes<Build>, InferCreationAttributes<Build>> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare planRevisionId: string;
  declare createdBy: string;
  declare startedAt: Date;
  declare closedAt: CreationOptional<Date | null>;
  declare lastPosition: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineBuild(sequelize: Sequelize): typeof Build {
  return Build.init(
    {
      id: primaryUuid(),
      name: text(),
      planRevisionId: uuid(),
      createdBy: uuid(),
      startedAt: time(),
      closedAt: optional(time()),
      lastPosition: integer(),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'builds', modelName: 'Build' },
  );
}
