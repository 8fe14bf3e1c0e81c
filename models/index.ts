import type { Sequelize } from 'sequelize';
import { defineAccount } from './account';
import { defineBuild } from './build';
import { defineCrewMember } from './crew-member';
import { defineFileBytes } from './file-bytes';
import { defineLogEntryRow } from './log-entry';
import { definePhoto } from './photo';
import { definePlan } from './plan';
import { definePlanFile } from './plan-file';
import { definePlanRevision } from './plan-revision';
import { defineServerEpoch } from './server-epoch';
import { defineSession } from './session';
import { defineSnapshot } from './snapshot';
import { defineStoredFile } from './stored-file';
import { defineThrottle } from './throttle';
import { defineToken } from './token';

/** Binds every model to a connection, with the associations that queries follow. */
export function defineModels(sequelize: Sequelize) {
  const models = {
    Account: defineAccount(sequelize),
    Session: defineSession(sequelize),
    Token: defineToken(sequelize),
    Throttle: defineThrottle(sequelize),
    Plan: definePlan(sequelize),
    PlanRevision: definePlanRevision(sequelize),
    PlanFile: definePlanFile(sequelize),
    Build: defineBuild(sequelize),
    CrewMember: defineCrewMember(sequelize),
    LogEntryRow: defineLogEntryRow(sequelize),
    Snapshot: defineSnapshot(sequelize),
    StoredFile: defineStoredFile(sequelize),
    FileBytes: defineFileBytes(sequelize),
    Photo: definePhoto(sequelize),
    ServerEpoch: defineServerEpoch(sequelize),
  };
  const {
    Account,
    Session,
    Token,
    Plan,
    PlanRevision,
    PlanFile,
    Build,
    CrewMember,
    LogEntryRow,
    Snapshot,
    StoredFile,
    FileBytes,
    Photo,
  } = models;

  Account.hasMany(Session, { foreignKey: 'accountId', as: 'sessions' });
  Session.belongsTo(Account, { foreignKey: 'accountId', as: 'account' });
  Account.hasMany(Token, { foreignKey: 'accountId', as: 'tokens' });
  Token.belongsTo(Account, { foreignKey: 'accountId', as: 'account' });
  Plan.belongsTo(Account, { foreignKey: 'ownerAccountId', as: 'owner' });
  Plan.hasMany(PlanRevision, { foreignKey: 'planId', as: 'revisions' });
  Plan.belongsTo(PlanRevision, { foreignKey: 'currentRevisionId', as: 'currentRevision', constraints: false });
  PlanRevision.belongsTo(Plan, { foreignKey: 'planId', as: 'plan' });
  PlanRevision.hasMany(PlanFile, { foreignKey: 'revisionId', as: 'files' });
  PlanFile.belongsTo(PlanRevision, { foreignKey: 'revisionId', as: 'revision' });
  PlanFile.belongsTo(StoredFile, { foreignKey: 'fileId', as: 'file' });
  Build.belongsTo(PlanRevision, { foreignKey: 'planRevisionId', as: 'revision' });
  Build.hasMany(CrewMember, { foreignKey: 'buildId', as: 'crew' });
  CrewMember.belongsTo(Build, { foreignKey: 'buildId', as: 'build' });
  CrewMember.belongsTo(Account, { foreignKey: 'accountId', as: 'account' });
  Build.hasMany(LogEntryRow, { foreignKey: 'buildId', as: 'entries' });
  Build.hasOne(Snapshot, { foreignKey: 'buildId', as: 'snapshot' });
  Build.hasMany(Photo, { foreignKey: 'buildId', as: 'photos' });
  Photo.belongsTo(StoredFile, { foreignKey: 'fileId', as: 'file' });
  StoredFile.hasOne(FileBytes, { foreignKey: 'fileId', as: 'content' });
  return models;
}

export type Models = ReturnType<typeof defineModels>;
