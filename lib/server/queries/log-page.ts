import 'server-only';
import { Op } from 'sequelize';
import { PAGE_ENTRIES, type LogAnswer } from '@/lib/domain/build/wire';
import { db } from '../db';
import { readEpoch } from './server-epoch';

/** Entries after a position in order, at most a page, and the position to ask from next. */
export async function readLogPage(
  buildId: string,
  after: number,
): Promise<Pick<LogAnswer, 'entries' | 'cursor' | 'more'>> {
  const rows = await db().models.LogEntryRow.findAll({
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
  return { entries: page, cursor: page.at(-1)?.position ?? after, more: rows.length > PAGE_ENTRIES };
}

/** The answer to a phone that only asks. */
export async function readLogAnswer(buildId: string, after: number): Promise<LogAnswer> {
  const [page, epoch] = await Promise.all([readLogPage(buildId, after), readEpoch()]);
  return { format: 'holdfast-log', epoch, buildId, serverTime: Date.now(), accepted: [], refused: [], ...page };
}
