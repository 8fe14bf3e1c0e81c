import { readFileSync } from 'node:fs';
import type { BoardRequest } from '@/lib/domain/cutting';

export const PUBLISHED_BOARDS = 'tests/reference/data/bpp1d/instances.csv';

export interface PublishedBoards {
  name: string;
  /** Boards in the best known plan, proven optimal. */
  bestKnown: number;
  request: BoardRequest;
}

/** Published bin packing instances as board requests: one length of stock, no kerf. See SOURCE.md beside the file. */
export function publishedBoards(): PublishedBoards[] {
  const [, ...rows] = readFileSync(PUBLISHED_BOARDS, 'utf8').trim().split('\n');
  return rows.map((row) => {
    const [family, , instance, , capacity, , bestKnown, sizes] = row.split(',');
    const parts = sizes!.split(' ').map((size) => {
      const [length, quantity = '1'] = size.split('x');
      return { id: length!, length: Number(length), quantity: Number(quantity) };
    });
    return {
      name: `${family} ${instance}`,
      bestKnown: Number(bestKnown),
      request: { stock: [{ id: 'board', length: Number(capacity) }], parts, kerf: 0 },
    };
  });
}
