import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { integer, optional, primaryUuid, text, time } from './columns';

/** What is known of stored bytes; the bytes are in the database or in the bucket. */
export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
  declare id: CreationOptional<string>;
  declare sha256: string;
  declare bytes: number;
  declare mediaType: string;
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare storage: 'database' | 'bucket';
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineStoredFile(sequelize: Sequelize): typeof StoredFile {
  return StoredFile.init(
    {
      id: primaryUuid(),
      sha256: text(),
      bytes: integer(),
      mediaType: text(),
      width: optional(integer()),
      height: optional(integer()),
      storage: text(),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'files', modelName: 'StoredFile' },
  );
}
