import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkBoardPlan, planBoards, type BoardRequest } from '@/lib/domain/cutting';
import { leastCost } from './brute-force';

const avoidOn = (length: number, shortest: number) =>
  fc.array(
    fc
      .tuple(fc.integer({ min: 0, max: length - 1 }), fc.integer({ min: shortest, max: shortest + 12 }))
      .map(([start, wide]) => ({ start, end: Math.min(length, start + wide) }))
      .filter(({ start, end }) => end - start >= shortest),
    { maxLength: 2 },
  );

interface Shape {
  pieces: number;
  lengths: number;
  defects: 'none' | 'wide' | 'any';
}

function requests({ pieces, lengths, defects }: Shape): fc.Arbitrary<BoardRequest> {
  return fc
    .record({
      kerf: fc.integer({ min: 0, max: 6 }),
      trimStart: fc.integer({ min: 0, max: 5 }),
      trimEnd: fc.integer({ min: 0, max: 5 }),
      keepOffcut: fc.integer({ min: 0, max: 30 }),
      seed: fc.integer({ min: 0, max: 9 }),
      isPriced: fc.boolean(),
    })
    .chain(({ isPriced, ...fixed }) => {
      const stock = fc.integer({ min: 30, max: 120 }).chain((length) =>
        fc.record(
          {
            length: fc.constant(length),
            available: fc.integer({ min: 0, max: 3 }),
            ...(isPriced ? { price: fc.integer({ min: 0, max: 40 }) } : {}),
            ...(defects === 'none' ? {} : { avoid: avoidOn(length, defects === 'wide' ? Math.max(1, fixed.kerf) : 1) }),
          },
          { requiredKeys: ['length'] },
        ),
      );
      const part = fc.record(
        {
          length: fc.integer({ min: 1, max: 90 }),
          quantity: fc.integer({ min: 1, max: Math.max(1, Math.floor(pieces / lengths)) }),
          reserve: fc.integer({ min: 1, max: 90 }),
        },
        { requiredKeys: ['length', 'quantity'] },
      );
      return fc.record({
        stock: fc
          .array(stock, { minLength: 1, maxLength: 3 })
          .map((rows) => rows.map((row, i) => ({ id: `s${i}`, ...row }))),
        parts: fc
          .array(part, { minLength: 1, maxLength: lengths })
          .map((rows) => rows.map((row, i) => ({ id: `p${i}`, ...row }))),
        ...Object.fromEntries(Object.entries(fixed).map(([name, value]) => [name, fc.constant(value)])),
        timeLimitMs: fc.constant(150),
      }) as unknown as fc.Arbitrary<BoardRequest>;
    });
}

describe('any request', () => {
  it('gets a plan that can be cut: inside the stock, kerf everywhere, defects kept out, every piece accounted for', () => {
    fc.assert(
      fc.property(requests({ pieces: 24, lengths: 6, defects: 'any' }), (request) => {
        expect(checkBoardPlan(request, planBoards(request))).toEqual([]);
      }),
      { numRuns: 250 },
    );
  });

  it('has its cuts laid out longest first in each clear stretch, and what is reserved after what is cut', () => {
    fc.assert(
      fc.property(requests({ pieces: 20, lengths: 5, defects: 'none' }), (request) => {
        const reserves = new Set(request.parts.filter((part) => part.reserve !== undefined).map(({ id }) => id));
        for (const { cuts } of planBoards(request).boards) {
          const keys = cuts.map((cut) => (reserves.has(cut.partId) ? 0 : 1_000) + cut.end - cut.start);
          expect(keys).toEqual([...keys].sort((a, b) => b - a));
        }
      }),
      { numRuns: 100 },
    );
  });
});

describe('a small request', () => {
  it('costs what trying everything finds, and the bound is never above it', () => {
    let compared = 0;
    fc.assert(
      fc.property(requests({ pieces: 6, lengths: 5, defects: 'wide' }), (request) => {
        const plan = planBoards(request);
        const least = leastCost(request);
        if (least === Infinity) {
          expect(plan.unplaced).not.toEqual([]);
          return;
        }
        compared++;
        expect(plan.unplaced).toEqual([]);
        expect(plan.cost).toBe(least);
        expect(plan.lowerBound).toBeLessThanOrEqual(least);
      }),
      { numRuns: 250 },
    );
    expect(compared).toBeGreaterThan(60);
  });

  it('is never called proved above the least cost, defects narrower than the kerf included', () => {
    fc.assert(
      fc.property(requests({ pieces: 6, lengths: 5, defects: 'any' }), (request) => {
        const plan = planBoards(request);
        if (plan.unplaced.length > 0) return;
        const least = leastCost(request);
        expect(plan.lowerBound).toBeLessThanOrEqual(least);
        if (plan.proved) expect(plan.cost).toBe(least);
      }),
      { numRuns: 150 },
    );
  });
});

it('the same request and seed give the same plan when it ends by proof', () => {
  fc.assert(
    fc.property(requests({ pieces: 24, lengths: 6, defects: 'wide' }), (request) => {
      const plan = planBoards({ ...request, timeLimitMs: 400 });
      if (plan.proved) expect(planBoards({ ...request, timeLimitMs: 5_000 })).toEqual(plan);
    }),
    { numRuns: 60 },
  );
});
