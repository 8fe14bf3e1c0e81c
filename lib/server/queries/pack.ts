import 'server-only';
import { createHash } from 'node:crypto';
import { canonicalText } from '@/lib/domain/plan/canonical-text';
import type { PackFile, PackManifest } from '@/lib/domain/build/wire';
import type { StoredFile } from '@/models/stored-file';
import { db } from '../db';
import type { CrewRole } from '../policies/build';
import { findBuild, listCrew } from './builds';
import { readEpoch } from './server-epoch';

/** Canonical text of a build's plan: its SHA-256 is the content hash of the revision, so the phone can verify it. */
export async function readPackPlan(buildId: string, contentHash: string): Promise<string | null> {
  const found = await findBuild(buildId);
  return found && found.revision.contentHash === contentHash ? canonicalText(found.plan) : null;
}

/** Attachment of a build's plan by hash, or null. */
export async function findPackFile(buildId: string, sha256: string): Promise<StoredFile | null> {
  const found = await findBuild(buildId);
  if (!found) return null;
  const { PlanFile, StoredFile } = db().models;
  const file = await StoredFile.findOne({ where: { sha256 } });
  const link = file && (await PlanFile.findOne({ where: { revisionId: found.revision.id, fileId: file.id } }));
  return link ? file : null;
}

/** What a build needs with no signal: each file with its address, hash and size. Null when there is no such build. */
export async function readPackManifest(
  buildId: string,
  accountId: string,
  role: CrewRole,
  now: number,
): Promise<PackManifest | null> {
  const found = await findBuild(buildId);
  if (!found) return null;
  const { build, revision, plan } = found;
  const text = Buffer.from(canonicalText(plan));
  const planFile: PackFile = {
    kind: 'plan',
    title: plan.title,
    url: `/api/builds/${buildId}/pack/plan/${revision.contentHash}`,
    sha256: createHash('sha256').update(text).digest('hex'),
    bytes: text.byteLength,
    mediaType: 'application/json',
  };
  const attachments = plan.attachments.map(({ kind, title, sha256, bytes, mediaType }): PackFile => ({
    kind,
    title,
    url: `/api/builds/${buildId}/pack/files/${sha256}`,
    sha256,
    bytes,
    mediaType,
  }));
  const files = [planFile, ...attachments];
  return {
    format: 'holdfast-pack',
    version: 1,
    buildId,
    buildName: build.name,
    accountId,
    role,
    planRevisionId: revision.id,
    contentHash: revision.contentHash,
    builtAt: now,
    epoch: await readEpoch(),
    files,
    bytes: files.reduce((sum, file) => sum + file.bytes, 0),
    crew: await listCrew(buildId),
  };
}
