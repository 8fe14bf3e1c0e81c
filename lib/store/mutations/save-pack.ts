import { emptyState } from '../../domain/build/fold';
import type { PackManifest } from '../../domain/build/wire';
import type { PlanDocument } from '../../domain/plan/document';
import type { AccountDatabase } from '../database';
import { durably, type NotSaved } from '../saved';

/**
 * Makes a build ready on this phone: its plan and facts in one transaction. Called when every file was verified. What is
 * already in the log here stays.
 */
export function savePack(db: AccountDatabase, manifest: PackManifest, plan: PlanDocument): Promise<void | NotSaved> {
  return durably(db, () =>
    db.transaction('rw', db.builds, db.plans, async () => {
      const before = await db.builds.get(manifest.buildId);
      await db.plans.put({ contentHash: manifest.contentHash, plan });
      await db.builds.put({
        id: manifest.buildId,
        name: manifest.buildName,
        role: manifest.role,
        planRevisionId: manifest.planRevisionId,
        contentHash: manifest.contentHash,
        crew: manifest.crew,
        cursor: before?.cursor ?? 0,
        epoch: before?.epoch ?? manifest.epoch,
        greatestStamp: before?.greatestStamp ?? null,
        state: before?.state ?? emptyState(),
        packReadyAt: db.clock(),
        packBytes: manifest.bytes,
        packFiles: manifest.files,
        lastUsedAt: before?.lastUsedAt ?? db.clock(),
      });
    }),
  );
}
