import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { uuid } from './columns';

/** Bytes of a file kept in the database. */
export class FileBytes extends Model<InferAttributes<FileBytes>, InferCreationAttributes<FileBytes>> {
  declare fileId: string;
  declare content: Buffer;
}

export function defineFileBytes(sequelize: Sequelize): typeof FileBytes {
  return FileBytes.init(
    {
      fileId: { ...uuid(), primaryKey: true },
      content: { type: DataTypes.BLOB, allowNull: false },
    },
    { sequelize, tableName: 'file_bytes', modelName: 'FileBytes', timestamps: false },
  );
}
