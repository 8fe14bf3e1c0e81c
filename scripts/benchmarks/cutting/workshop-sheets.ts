import type { SheetPart, SheetRequest } from '@/lib/domain/cutting/sheets/request';
import { seededRandom } from '@/lib/domain/cutting/seeded-random';
import { UNITS_PER_INCH } from '@/lib/domain/measure';

/**
 * Two hundred plywood jobs as a workshop has them. Written before the planner was tuned and not changed since: a changed
 * job would make earlier figures worthless.
 *
 * 48 x 96 in sheets, kerf 1/8 in, 10 to 60 parts of 3 to 15 sizes on sixteenths of an inch, 4 to 60 in long and 3 to 30 in
 * wide; half of the sizes keep the grain along their length.
 */
const JOB_COUNT = 200;

const SIXTEENTH = UNITS_PER_INCH / 16;

export interface WorkshopSheets {
  name: string;
  request: SheetRequest;
}

export function workshopSheets(): WorkshopSheets[] {
  return Array.from({ length: JOB_COUNT }, (_, n) => {
    const random = seededRandom(30_000 + n);
    const sizes = between(random, 3, 15);
    const pieces = Math.max(sizes, between(random, 10, 60));
    const parts = Array.from({ length: sizes }, (__, i): SheetPart => {
      const length = between(random, 4 * 16, 60 * 16) * SIXTEENTH;
      const width = between(random, 3 * 16, 30 * 16) * SIXTEENTH;
      return { id: `part ${i + 1}`, length, width, quantity: 1, grain: random() < 0.5 ? 'along' : 'any' };
    });
    for (let piece = sizes; piece < pieces; piece++) parts[between(random, 0, sizes - 1)]!.quantity++;
    return {
      name: `job ${n}`,
      request: {
        sheets: [{ id: 'plywood', length: 96 * UNITS_PER_INCH, width: 48 * UNITS_PER_INCH }],
        parts,
        kerf: UNITS_PER_INCH / 8,
      },
    };
  });
}

/** A whole number from `least` to `most`, both included. */
function between(random: () => number, least: number, most: number): number {
  return least + Math.floor(random() * (most - least + 1));
}
