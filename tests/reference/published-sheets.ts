import { readFileSync } from 'node:fs';
import type { SheetRequest } from '@/lib/domain/cutting';

export const PUBLISHED_SHEETS = 'tests/reference/data/cut2d/instances.csv';

export interface PublishedSheets {
  name: string;
  pieces: number;
  /** Sheets in the best known plan of three stages. */
  bestKnown: number;
  request: SheetRequest;
}

/**
 * Published two-dimensional bin packing instances as sheet requests: one size of sheet at the price of one, no kerf, three
 * stages, first cut along. See SOURCE.md beside the file.
 *
 * @param turnable  pieces may be turned by a quarter; else they lie as they are
 */
export function publishedSheets(turnable: boolean): PublishedSheets[] {
  const [, ...rows] = readFileSync(PUBLISHED_SHEETS, 'utf8').trim().split('\n');
  return rows.map((row) => {
    const [name, pieces, length, width, bestOriented, bestTurnable, sizes] = row.split(',');
    const parts = sizes!.split(' ').map((size, index) => {
      const [sides, quantity = '1'] = size.split('*');
      const [partLength, partWidth] = sides!.split('x').map(Number);
      return {
        id: String(index),
        length: partLength!,
        width: partWidth!,
        quantity: Number(quantity),
        grain: turnable ? ('any' as const) : ('along' as const),
      };
    });
    return {
      name: name!,
      pieces: Number(pieces),
      bestKnown: Number(turnable ? bestTurnable : bestOriented),
      request: {
        sheets: [{ id: 'sheet', length: Number(length), width: Number(width), price: 1 }],
        parts,
        kerf: 0,
        stages: 3,
        firstCut: 'along',
      },
    };
  });
}
