import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optional, primaryUuid, text, time } from './columns';

/** A person: member, author or operator. */
export class Account extends Model<InferAttributes<Account>, InferCreationAttributes<Account>> {
  declare id: CreationOptional<string>;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare role: 'member' | 'author' | 'operator';
  declare emailConfirmedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineAccount(sequelize: Sequelize): typeof Account {
  return Account.init(
    {
      id: primaryUuid(),
      email: text(),
      name: text(),
      passwordHash: text(),
      role: text(),
      emailConfirmedAt: optional(time()),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'accounts', modelName: 'Account' },
  );
}
