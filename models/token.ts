import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optional, primaryUuid, text, time, uuid } from './columns';

/** A single-use link sent by e-mail. Only the hash of its secret is kept. */
export class Token extends Model<InferAttributes<Token>, InferCreationAttributes<Token>> {
  declare id: CreationOptional<string>;
  declare accountId: string;
  declare purpose: 'confirm-email' | 'reset-password' | 'change-email';
  declare tokenHash: string;
  declare email: CreationOptional<string | null>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineToken(sequelize: Sequelize): typeof Token {
  return Token.init(
    {
      id: primaryUuid(),
      accountId: uuid(),
      purpose: text(),
      tokenHash: text(),
      email: optional(text()),
      expiresAt: time(),
      usedAt: optional(time()),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'tokens', modelName: 'Token' },
  );
}
