import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optional, text, time, uuid } from './columns';

/** Who is on a build. A removed member keeps the row, so that what they did keeps its name. */
export class CrewMember extends Model<InferAttributes<CrewMember>, InferCreationAttributes<CrewMember>> {
  declare buildId: string;
  declare accountId: string;
  declare role: 'owner' | 'helper' | 'onlooker';
  declare joinedAt: Date;
  declare removedAt: CreationOptional<Date | null>;
}

export function defineCrewMember(sequelize: Sequelize): typeof CrewMember {
  return CrewMember.init(
    {
      buildId: { ...uuid(), primaryKey: true },
      accountId: { ...uuid(), primaryKey: true },
      role: text(),
      joinedAt: time(),
      removedAt: optional(time()),
    },
    { sequelize, tableName: 'crew_members', modelName: 'CrewMember', timestamps: false },
  );
}
