import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { primaryUuid, text, time, uuid } from './columns';

/** A photo of a build: the hash the phone knows it by, and the file it was stored as. */
export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
  declare id: CreationOptional<string>;
  declare buildId: string;
  declare sha256: string;
  declare fileId: string;
  declare accountId: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function definePhoto(sequelize: Sequelize): typeof Photo {
  return Photo.init(
    {
      id: primaryUuid(),
      buildId: uuid(),
      sha256: text(),
      fileId: uuid(),
      accountId: uuid(),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'photos', modelName: 'Photo' },
  );
}
