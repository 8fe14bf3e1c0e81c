import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { integer, json, primaryUuid, text, time, uuid } from './columns';
import type { PlanDocument } from '@/lib/domain/plan/document';

/** One immutable state of a plan, named by the hash of its content. */
export class PlanRevision extends Model<InferAttributes<PlanRevision>, InferCreationAttributes<PlanRevision>> {
  declare id: CreationOptional<string>;
  declare planId: string;
  declare number: number;
  declare contentHash: string;
  declare document: PlanDocument;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function definePlanRevision(sequelize: Sequelize): typeof PlanRevision {
  return PlanRevision.init(
    {
      id: primaryUuid(),
      planId: uuid(),
      number: integer(),
      contentHash: text(),
      document: json(),
      createdAt: time(),
      updatedAt: time(),
    },
    { sequelize, tableName: 'plan_revisions', modelName: 'PlanRevision' },
  );
}
