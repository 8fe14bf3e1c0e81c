import { compareStanding, type StandingEntry } from '../../domain/build/entry';
import type { PlanDocument } from '../../domain/plan/document';
import type { AccountDatabase } from '../database';
import type { BuildRow, EntryRow } from '../rows';

/** Builds on this phone, last used first. */
export function getBuilds(db: AccountDatabase): Promise<BuildRow[]> {
  return db.builds.orderBy('lastUsedAt').reverse().toArray();
}

export function getBuild(db: AccountDatabase, buildId: string): Promise<BuildRow | undefined> {
  return db.builds.get(buildId);
}

export async function getPlan(db: AccountDatabase, contentHash: string): Promise<PlanDocument | undefined> {
  return (await db.plans.get(contentHash))?.plan;
}

/** Every entry of a build in order of standing, refused ones left out. */
export async function getEntries(
  db: AccountDatabase,
  buildId: string,
): Promise<(StandingEntry & Pick<EntryRow, 'sync'>)[]> {
  const rows = await db.entries.where('buildId').equals(buildId).toArray();
  return rows.filter(({ sync }) => sync !== 'refused').sort(compareStanding);
}
