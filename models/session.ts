import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optional, primaryUuid, text, time, uuid } from './columns';

/** One sign-in on one browser; listed to its person and revocable. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<string>;
  declare accountId: string;
  declare userAgent: string;
  declare lastSeenAt: Date;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineSession(sequelize: Sequelize): typeof Session {
  return Session.init(
    {
      id: primaryUuid(),
      accountId: uuid(),
      userAgent: text(),
      lastSeenAt: time(),
      expiresAt: time(),
      revokedAt: optional(time()),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'sessions', modelName: 'Session' },
  );
}
