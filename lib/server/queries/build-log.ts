import 'server-only';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { db } from '../db';

/** Newest entries that the desk shows of one build. */
const MOST_SHOWN = 2_000;

/** The log of a build, newest entries last. */
export async function readBuildLog(buildId: string): Promise<StandingEntry[]> {
  const rows = await db().models.LogEntryRow.findAll({
    where: { buildId },
    order: [['position', 'DESC']],
    limit: MOST_SHOWN,
  });
  return rows.reverse().map((row) => {
    const { id, deviceId, accountId, madeAt, seen, kind, v, target, value, stamp, position } = row;
    // Judged when it was taken in; the table never changes.
    return { id, buildId, deviceId, accountId, madeAt, seen, kind, v, target, value, stamp, position } as StandingEntry;
  });
}
