import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FillingTable } from '@/lib/domain/cutting/boards/best-filling';

const items = fc.array(fc.tuple(fc.integer({ min: 1, max: 30 }), fc.nat(50), fc.nat(3)), {
  minLength: 1,
  maxLength: 5,
});

/** Tries every count of every width. */
function bestValue(rows: [width: number, worth: number, limit: number][], room: number): number {
  const [first, ...others] = rows;
  if (!first) return 0;
  const [width, worth, limit] = first;
  let best = 0;
  for (let count = 0; count <= limit && count * width <= room; count++)
    best = Math.max(best, count * worth + bestValue(others, room - count * width));
  return best;
}

describe.each([
  ['by table', 90],
  // A room past the largest table, in proportion: the bounded search answers.
  ['by search', 90_000_000],
])('the best filling %s', (_, maxRoom) => {
  const scale = maxRoom / 90;
  it('is worth what trying everything finds, within limits and room', () => {
    fc.assert(
      fc.property(items, fc.integer({ min: 0, max: 90 }), (rows, room) => {
        const widths = rows.map(([width]) => width * scale);
        const table = new FillingTable(widths, maxRoom);
        const fill = table.fill(
          rows.map(([, worth]) => worth),
          rows.map(([, , limit]) => limit),
        );
        const { counts, value, atMost } = fill(room * scale);
        expect(value).toBe(bestValue(rows, room));
        expect(atMost).toBe(value);
        expect(counts.reduce((sum, count, i) => sum + count * rows[i]![1], 0)).toBe(value);
        expect(counts.reduce((sum, count, i) => sum + count * widths[i]!, 0)).toBeLessThanOrEqual(room * scale);
        counts.forEach((count, i) => expect(count).toBeLessThanOrEqual(rows[i]![2]));
      }),
      { numRuns: 150 },
    );
  });
});

it('a search that is cut short still says what no filling can pass', () => {
  const widths = Array.from({ length: 60 }, (_, i) => 1_000_003 + 2 * i);
  const table = new FillingTable(widths, 60_000_000);
  const { value, atMost } = table.fill(
    widths,
    widths.map(() => 3),
  )(29_999_999);
  expect(atMost).toBeGreaterThanOrEqual(value);
  expect(atMost).toBeLessThanOrEqual(30_000_000);
});
