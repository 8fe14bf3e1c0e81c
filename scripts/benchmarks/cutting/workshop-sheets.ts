import type { SheetPart, SheetRequest } from '@/lib/domain/cutting';
import { seededRandom } from '@/lib/domain/cutting/seeded-random';
import { UNITS_PER_INCH } from '@/lib/domain/measure';

export const SHEET_JOB_COUNT = 200;

const SIXTEENTH = UNITS_PER_INCH / 16;

/**
 * Two hundred plywood jobs as a workshop has them: sheets of 96 by 48 in with grain, 4 to 14 parts of one to eight pieces,
 * half of the parts bound to the grain, kerf 1/8 in. Written before the planner was tuned and not changed since.
 */
export function sheetJobs(): { name: string; request: SheetRequest }[] {
  return Array.from({ length: SHEET_JOB_COUNT }, (_, n) => {
    const random = seededRandom(30_000 + n);
    const between = (least: number, most: number) => least + Math.floor(random() * (most - least + 1));
    const parts = Array.from({ length: between(4, 14) }, (__, i): SheetPart => ({
      id: `part ${i + 1}`,
      length: between(6 * 16, 60 * 16) * SIXTEENTH,
      width: between(3 * 16, 30 * 16) * SIXTEENTH,
      quantity: between(1, 8),
      grain: i % 2 === 0 ? 'along' : 'any',
    }));
    return {
      name: `job ${n}`,
      request: {
        sheets: [{ id: 'plywood', length: 96 * UNITS_PER_INCH, width: 48 * UNITS_PER_INCH, price: 1, grain: true }],
        parts,
        kerf: UNITS_PER_INCH / 8,
      },
    };
  });
}
