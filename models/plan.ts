import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optional, primaryUuid, text, time, uuid } from './columns';

/** A plan of an author; its revisions hold the documents. */
export class Plan extends Model<InferAttributes<Plan>, InferCreationAttributes<Plan>> {
  declare id: CreationOptional<string>;
  declare ownerAccountId: string;
  declare planKey: string;
  declare title: string;
  declare visibility: 'private' | 'public';
  declare currentRevisionId: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function definePlan(sequelize: Sequelize): typeof Plan {
  return Plan.init(
    {
      id: primaryUuid(),
      ownerAccountId: uuid(),
      planKey: text(),
      title: text(),
      visibility: text(),
      currentRevisionId: optional(uuid()),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'plans', modelName: 'Plan' },
  );
}
