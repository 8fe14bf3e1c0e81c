import 'server-only';
import { Op } from 'sequelize';
import type { PlanDocument } from '@/lib/domain/plan/document';
import type { PlanRevision } from '@/models/plan-revision';
import { db } from '../db';
import { readFile } from '../files/store-file';

export interface PlanRow {
  id: string;
  title: string;
  summary: string;
  author: string;
  visibility: 'private' | 'public';
  isOwn: boolean;
  revisionId: string;
  revisionNumber: number;
  steps: number;
  parts: number;
  minutes: { min: number; max: number };
}

/** Plans that a person may build from: their own and the public ones, by title. */
export async function listPlans(accountId: string): Promise<PlanRow[]> {
  const { Plan, PlanRevision } = db().models;
  const plans = await Plan.findAll({
    where: { [Op.or]: [{ ownerAccountId: accountId }, { visibility: 'public' }], currentRevisionId: { [Op.ne]: null } },
    order: [['title', 'ASC']],
  });
  const revisions = await PlanRevision.findAll({ where: { id: plans.map((plan) => plan.currentRevisionId!) } });
  const byId = new Map(revisions.map((revision) => [revision.id, revision]));
  return plans.flatMap((plan) => {
    const revision = byId.get(plan.currentRevisionId!);
    if (!revision) return [];
    const { summary, author, steps, parts, hours } = revision.document;
    return [
      {
        id: plan.id,
        title: plan.title,
        summary,
        author,
        visibility: plan.visibility,
        isOwn: plan.ownerAccountId === accountId,
        revisionId: revision.id,
        revisionNumber: revision.number,
        steps: steps.length,
        parts: parts.length,
        minutes: hours,
      },
    ];
  });
}

/** A plan's present revision with who owns it, or null. */
export async function findCurrentRevision(
  planId: string,
): Promise<{ ownerAccountId: string; visibility: 'private' | 'public'; revision: PlanRevision } | null> {
  const { Plan, PlanRevision } = db().models;
  const plan = await Plan.findByPk(planId);
  const revision = plan?.currentRevisionId ? await PlanRevision.findByPk(plan.currentRevisionId) : null;
  return plan && revision ? { ownerAccountId: plan.ownerAccountId, visibility: plan.visibility, revision } : null;
}

/** The plan file of a revision: its document with the attachments' bytes put back in. */
export async function exportRevision(revision: PlanRevision): Promise<PlanDocument> {
  const { PlanFile, StoredFile } = db().models;
  const links = await PlanFile.findAll({ where: { revisionId: revision.id } });
  const contents = new Map<string, string>();
  for (const { attachmentId, fileId } of links) {
    const file = await StoredFile.findByPk(fileId, { rejectOnEmpty: true });
    contents.set(attachmentId, (await readFile(file)).toString('base64'));
  }
  const { document } = revision;
  return {
    ...document,
    attachments: document.attachments.map((facts) => ({ ...facts, content: contents.get(facts.id) })),
  };
}
