import 'server-only';
import { createHash } from 'node:crypto';
import { canonicalText } from '@/lib/domain/plan/canonical-text';
import type { PlanDocument } from '@/lib/domain/plan/document';
import type { PlanProblem } from '@/lib/domain/plan/plan-problem';
import { readPlan } from '@/lib/domain/plan/read-plan';
import type { PlanFile } from '@/models/plan-file';
import type { StoredFile } from '@/models/stored-file';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { sha256, storeFile } from '../files/store-file';
import { imageKind } from '@/lib/domain/build/image-kind';

export interface ImportedPlan {
  planId: string;
  revisionId: string;
  number: number;
  contentHash: string;
  /** False when this very content was there already. */
  isNew: boolean;
}

/** SHA-256 of the canonical text: the name of a revision. */
export function contentHashOf(plan: PlanDocument): string {
  return createHash('sha256').update(canonicalText(plan)).digest('hex');
}

/**
 * Takes the bytes of a plan file in, as {@link importPlan} does its text.
 *
 * @throws AppError `invalid` with `problems`, also where the bytes are no text
 */
export function importPlanFile(account: Account, bytes: Uint8Array): Promise<ImportedPlan> {
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    throw invalidPlan([{ path: '', expected: 'JSON text in UTF-8', message: 'The file is not text in UTF-8.' }]);
  }
  return importPlan(account, text);
}

/**
 * Takes a plan file in: a new plan of this person, or a new revision of the plan of theirs with the same id. Content that
 * is there already gives the revision it has.
 *
 * @throws AppError `invalid` with `problems`, each with its path and what was expected
 */
export async function importPlan(
  account: Account,
  input: unknown,
  { visibility = 'private' }: { visibility?: 'private' | 'public' } = {},
): Promise<ImportedPlan> {
  const read = readPlan(input);
  if (!read.ok) throw invalidPlan(read.problems);
  const { plan, files } = await takeFilesOut(account, read.plan);
  const contentHash = contentHashOf(plan);
  const { Plan, PlanRevision, PlanFile, Account } = db().models;

  return db().sequelize.transaction(async (transaction) => {
    // One import of a person at a time, so that numbers of revisions do not meet.
    await Account.findByPk(account.id, { transaction, lock: transaction.LOCK.UPDATE });
    const [row] = await Plan.findOrCreate({
      where: { ownerAccountId: account.id, planKey: plan.id },
      defaults: { ownerAccountId: account.id, planKey: plan.id, title: plan.title, visibility },
      transaction,
    });
    const same = await PlanRevision.findOne({ where: { planId: row.id, contentHash }, transaction });
    if (same) return { planId: row.id, revisionId: same.id, number: same.number, contentHash, isNew: false };
    const last =
      (await PlanRevision.max<number, InstanceType<typeof PlanRevision>>('number', {
        where: { planId: row.id },
        transaction,
      })) ?? 0;
    const revision = await PlanRevision.create(
      { planId: row.id, number: last + 1, contentHash, document: plan },
      { transaction },
    );
    await PlanFile.bulkCreate(
      files.map(({ attachmentId, fileId }) => ({ revisionId: revision.id, attachmentId, fileId })),
      { transaction },
    );
    await row.update({ currentRevisionId: revision.id, title: plan.title }, { transaction });
    return { planId: row.id, revisionId: revision.id, number: revision.number, contentHash, isNew: true };
  });
}

async function takeFilesOut(
  account: Account,
  plan: PlanDocument,
): Promise<{ plan: PlanDocument; files: { attachmentId: string; fileId: string }[] }> {
  const problems: PlanProblem[] = [];
  const files: { attachmentId: string; fileId: string }[] = [];
  for (const [i, { content, ...facts }] of plan.attachments.entries()) {
    const known = content ? null : await findOwnFile(account.id, facts.sha256);
    const bytes = content ? Buffer.from(content, 'base64') : null;
    const path = `attachments[${i}].content`;
    if (!bytes && !known) {
      problems.push({
        path,
        expected: 'the bytes of the attachment in base64',
        message: `The bytes of "${facts.title}" are not in the file.`,
      });
    } else if (bytes && (sha256(bytes) !== facts.sha256 || bytes.byteLength !== facts.bytes)) {
      problems.push({
        path,
        expected: 'bytes with the sha256 and length that are said',
        message: `The bytes of "${facts.title}" are not those it names.`,
      });
    } else if (bytes && !looksLike(bytes, facts.mediaType)) {
      problems.push({ path, expected: facts.mediaType, message: `The bytes of "${facts.title}" are of another kind.` });
    }
    if (problems.length === 0) {
      const file = bytes ? await storeFile(bytes, { mediaType: facts.mediaType }) : known!;
      files.push({ attachmentId: facts.id, fileId: file.id });
    }
  }
  if (problems.length > 0) throw invalidPlan(problems);
  return { plan: { ...plan, attachments: plan.attachments.map(({ content: _content, ...facts }) => facts) }, files };
}

/** A file that a plan of this person's already has. Others' files are not to be had by naming their hash. */
async function findOwnFile(accountId: string, hash: string): Promise<StoredFile | null> {
  const { Plan, PlanFile, PlanRevision, StoredFile } = db().models;
  const link = (await PlanFile.findOne({
    include: [
      { model: StoredFile, as: 'file', where: { sha256: hash } },
      {
        model: PlanRevision,
        as: 'revision',
        required: true,
        attributes: [],
        include: [{ model: Plan, as: 'plan', attributes: [], where: { ownerAccountId: accountId } }],
      },
    ],
  })) as (PlanFile & { file: StoredFile }) | null;
  return link && link.file;
}

function looksLike(bytes: Uint8Array, mediaType: string): boolean {
  if (mediaType.startsWith('image/')) return imageKind(bytes) === mediaType;
  const start = Buffer.from(bytes.subarray(0, 5)).toString('latin1');
  return mediaType === 'application/pdf' ? start === '%PDF-' : start.startsWith('glTF');
}

function invalidPlan(problems: PlanProblem[]): AppError {
  const detail =
    problems.length === 1
      ? 'One thing in the plan needs mending before it can be taken in. Nothing was stored.'
      : `${problems.length} things in the plan need mending before it can be taken in. Nothing was stored.`;
  return new AppError('invalid', detail, { problems });
}
