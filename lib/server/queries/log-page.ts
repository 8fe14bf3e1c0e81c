import 'server-only';
import { Op } from 'sequelize';
import { v7 } from 'uuid';
import { PAGE_ENTRIES, type LogAnswer } from '@/lib/domain/build/wire';
import { db } from '../db';
import { readEpoch } from './server-epoch';

/**
 * Entries after a position in order, at most a page, the position to ask from next, and the epoch.
 *
 * A phone that asks from past the end has seen what is no longer here: the database came back from a backup. It is told
 * an epoch that was never used, by which it starts over and sends again what was lost (S7), even before the operator has
 * given the database a new one.
 *
 * @param options.withEntries  false for one who may no longer read them: none, and the cursor stays
 */
export async function readLogPage(
  buildId: string,
  after: number,
  { withEntries = true } = {},
): Promise<Pick<LogAnswer, 'entries' | 'cursor' | 'more' | 'epoch'>> {
  const { Build, LogEntryRow } = db().models;
  const [build, epoch] = await Promise.all([
    Build.findByPk(buildId, { attributes: ['lastPosition'], rejectOnEmpty: true }),
    readEpoch(),
  ]);
  if (!withEntries) return { entries: [], cursor: after, more: false, epoch };
  if (after > build.lastPosition) return { entries: [], cursor: 0, more: true, epoch: v7() };
  const rows = await LogEntryRow.findAll({
    where: { buildId, position: { [Op.gt]: after } },
    order: [['position', 'ASC']],
    limit: PAGE_ENTRIES + 1,
  });
  const page = rows
    .slice(0, PAGE_ENTRIES)
    .map(({ id, deviceId, accountId, madeAt, seen, kind, v, target, value, stamp, position }) => ({
      id,
      buildId,
      deviceId,
      accountId,
      madeAt,
      seen,
      kind,
      v,
      target,
      value,
      stamp,
      position,
    }));
  return { entries: page, cursor: page.at(-1)?.position ?? after, more: rows.length > PAGE_ENTRIES, epoch };
}

/** The answer to a phone that only asks. */
export async function readLogAnswer(buildId: string, after: number): Promise<LogAnswer> {
  const page = await readLogPage(buildId, after);
  return { format: 'holdfast-log', buildId, serverTime: Date.now(), accepted: [], refused: [], ...page };
}
