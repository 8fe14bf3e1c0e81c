import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import { text, uuid } from './columns';

/** An attachment of a revision. */
export class PlanFile extends Model<InferAttributes<PlanFile>, InferCreationAttributes<PlanFile>> {
  declare revisionId: string;
  declare attachmentId: string;
  declare fileId: string;
}

export function definePlanFile(sequelize: Sequelize): typeof PlanFile {
  return PlanFile.init(
    {
      revisionId: { ...uuid(), primaryKey: true },
      attachmentId: { ...text(), primaryKey: true },
      fileId: uuid(),
    },
    { sequelize, tableName: 'plan_files', modelName: 'PlanFile', timestamps: false },
  );
}
