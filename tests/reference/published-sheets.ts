import { readFileSync } from 'node:fs';
import type { SheetPart, SheetRequest } from '@/lib/domain/cutting/sheets/request';

export const PUBLISHED_SHEETS = 'tests/reference/data/cut2d/instances.csv';

export interface PublishedSheets {
  name: string;
  /** Among the forty that every test run checks. */
  isInSubset: boolean;
  /** Parts may be turned. */
  isTurnable: boolean;
  /** Sheets in the best known plan of three stages. */
  bestKnown: number;
  /** No plan has fewer sheets, whatever the rule of cutting; computed by another program. */
  bound: number;
  request: SheetRequest;
}

/** Published bin packing instances as sheet requests: one size of sheet, no kerf. See SOURCE.md beside the file. */
export function publishedSheets(isTurnable: boolean): PublishedSheets[] {
  const [, ...rows] = readFileSync(PUBLISHED_SHEETS, 'utf8').trim().split('\n');
  return rows.map((row) => {
    const [name, subset, length, width, boundOriented, oriented, , boundTurnable, turnable, , sizes] = row.split(',');
    const counts = new Map<string, number>();
    for (const size of sizes!.split(' ')) counts.set(size, (counts.get(size) ?? 0) + 1);
    const parts = [...counts].map(([size, quantity]): SheetPart => {
      const [partLength, partWidth] = size.split('x').map(Number);
      return { id: size, length: partLength!, width: partWidth!, quantity, grain: isTurnable ? 'any' : 'along' };
    });
    return {
      name: name!,
      isInSubset: subset === '1',
      isTurnable,
      bestKnown: Number(isTurnable ? turnable : oriented),
      bound: Number(isTurnable ? boundTurnable : boundOriented),
      request: { sheets: [{ id: 'sheet', length: Number(length), width: Number(width) }], parts, kerf: 0, stages: 3 },
    };
  });
}
