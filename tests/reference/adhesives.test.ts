import { describe, expect, it } from 'vitest';
import { adhesiveClasses } from '@/lib/domain/glue/adhesives';

/**
 * Source: shop handbook of wood adhesives by generic class, recalled from the usual data sheets of many makers: *from
 * memory*, as the figures themselves say. Open and total assembly and clamp in minutes, full cure in hours, least °C.
 */
const rows: [
  id: string,
  open: [number, number],
  total: [number, number],
  clamp: [number, number],
  cureH: [number, number],
  leastC: number,
][] = [
  ['pva-interior', [4, 8], [8, 15], [30, 60], [24, 24], 10],
  ['pva-water-resistant', [4, 8], [8, 15], [30, 60], [24, 24], 10],
  ['pva-waterproof-crosslinking', [8, 10], [15, 25], [30, 60], [24, 24], 8],
  ['pva-slow', [10, 15], [20, 30], [60, 90], [24, 24], 10],
  ['polyurethane-moisture-cure', [15, 20], [20, 40], [45, 240], [6, 24], 10],
  ['epoxy-fast', [3, 5], [4, 8], [15, 30], [16, 24], 10],
  ['epoxy-slow', [20, 60], [30, 90], [360, 720], [72, 168], 10],
  ['hide-hot', [0.5, 2], [1, 3], [30, 120], [12, 24], 21],
  ['hide-liquid', [10, 15], [20, 30], [30, 60], [24, 24], 10],
  ['urea-formaldehyde', [10, 20], [20, 40], [360, 960], [24, 168], 20],
  ['resorcinol', [10, 15], [40, 60], [600, 960], [24, 168], 21],
  ['cyanoacrylate', [0.1, 1], [0.2, 2], [0.2, 2], [8, 24], 5],
  ['contact-cement', [15, 60], [15, 120], [0, 1], [24, 72], 18],
];

describe('adhesive classes against the handbook', () => {
  it.each(rows)('%s', (id, open, total, clamp, cureH, leastC) => {
    const row = adhesiveClasses.find((known) => known.id === id)!;
    expect(row.openMin).toEqual(open);
    expect(row.totalAssemblyMin).toEqual(total);
    expect(row.clampMin).toEqual(clamp);
    expect(row.fullCureMin).toEqual(cureH.map((hours) => hours * 60));
    expect(row.leastTemperatureC).toBe(leastC);
    expect(row.confidence).toBe('memory');
  });

  it('has no class that is not checked', () => {
    expect(adhesiveClasses.map(({ id }) => id)).toEqual(rows.map(([id]) => id));
  });
});
