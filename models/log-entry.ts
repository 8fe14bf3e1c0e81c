import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { integer, json, milliseconds, text, time, uuid } from './columns';

/** One entry of a build log, as accepted. Never changed, never deleted while its build stands. */
export class LogEntryRow extends Model<InferAttributes<LogEntryRow>, InferCreationAttributes<LogEntryRow>> {
  declare id: string;
  declare buildId: string;
  declare position: number;
  declare stamp: number;
  declare accountId: string;
  declare deviceId: string;
  declare madeAt: number;
  declare seen: number;
  declare kind: string;
  declare v: number;
  declare target: unknown;
  declare value: unknown;
  declare contentHash: string;
  declare receivedAt: Date;
}

export function defineLogEntryRow(sequelize: Sequelize): typeof LogEntryRow {
  return LogEntryRow.init(
    {
      id: { ...uuid(), primaryKey: true },
      buildId: uuid(),
      position: integer(),
      stamp: milliseconds('stamp'),
      accountId: uuid(),
      deviceId: uuid(),
      madeAt: milliseconds('madeAt'),
      seen: integer(),
      kind: text(),
      v: integer(),
      target: json(),
      value: json(),
      contentHash: text(),
      receivedAt: time(),
    },
    { sequelize, tableName: 'log_entries', modelName: 'LogEntryRow', timestamps: false },
  );
}
