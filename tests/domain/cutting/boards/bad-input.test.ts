import { describe, expect, it } from 'vitest';
import { checkBoardPlan, CuttingRequestError, planBoards, type BoardRequest } from '@/lib/domain/cutting';
import { seededRandom } from '@/lib/domain/cutting/seeded-random';

const sound: BoardRequest = {
  stock: [{ id: 'board', length: 1_000 }],
  parts: [{ id: 'leg', length: 300, quantity: 4 }],
  kerf: 3,
};
const [leg] = sound.parts;
const [board] = sound.stock;

describe('a request that makes no sense is refused with a sentence', () => {
  it.each<[string, Partial<BoardRequest>, RegExp]>([
    ['a part of no length', { parts: [{ ...leg!, length: 0 }] }, /Part “leg” needs a length above zero/],
    ['a part of less than nothing', { parts: [{ ...leg!, length: -5 }] }, /Part “leg” needs a length above zero/],
    ['a length that is no number', { parts: [{ ...leg!, length: NaN }] }, /Part “leg” needs a length above zero/],
    ['a length that is not whole', { parts: [{ ...leg!, length: 1.5 }] }, /Part “leg” needs a length above zero/],
    ['a quantity below zero', { parts: [{ ...leg!, quantity: -1 }] }, /Part “leg” needs a whole number of pieces/],
    ['half a piece', { parts: [{ ...leg!, quantity: 0.5 }] }, /Part “leg” needs a whole number of pieces/],
    ['nothing reserved', { parts: [{ ...leg!, reserve: 0 }] }, /length kept for part “leg” needs a length above zero/],
    ['one name for two parts', { parts: [leg!, leg!] }, /Two parts are both called “leg”/],
    ['a board of no length', { stock: [{ ...board!, length: 0 }] }, /Board “board” needs a length above zero/],
    ['a price below zero', { stock: [{ ...board!, price: -1 }] }, /Board “board” needs a price/],
    ['less than none available', { stock: [{ ...board!, available: -1 }] }, /Board “board” needs a whole number/],
    ['a defect off the board', { stock: [{ ...board!, avoid: [{ start: 900, end: 1_100 }] }] }, /lie on the board/],
    ['a defect that ends first', { stock: [{ ...board!, avoid: [{ start: 9, end: 8 }] }] }, /must end after it starts/],
    ['a kerf below zero', { kerf: -1 }, /The kerf must be zero or more/],
    ['a kerf as wide as the board', { kerf: 1_000 }, /The kerf is as wide as the longest board/],
    ['a trim below zero', { trimEnd: -1 }, /The trim at the end of a board must be zero or more/],
    ['a time limit that is no number', { timeLimitMs: NaN }, /The time limit/],
    ['a million and one pieces', { parts: [{ ...leg!, quantity: 1_000_001 }] }, /more than a million pieces/],
  ])('%s', (_, change, sentence) => {
    const plan = () => planBoards({ ...sound, ...change });
    expect(plan).toThrow(CuttingRequestError);
    expect(plan).toThrow(sentence);
  });
});

describe('a part that has no place comes back with the reason', () => {
  it.each<[string, Partial<BoardRequest>, RegExp]>([
    ['longer than any stock', { parts: [{ ...leg!, length: 1_001 }] }, /longer than every board/],
    ['no stock at all', { stock: [] }, /no board to cut it from/],
    ['none of it available', { stock: [{ ...board!, available: 0 }] }, /no board to cut it from/],
    ['trims that leave nothing', { trimStart: 600, trimEnd: 600 }, /once its ends are trimmed/],
  ])('%s', (_, change, reason) => {
    const request = { ...sound, ...change };
    const plan = planBoards(request);
    expect(checkBoardPlan(request, plan)).toEqual([]);
    expect(plan.boards).toEqual([]);
    expect(plan.unplaced).toEqual([{ partId: 'leg', quantity: 4, reason: expect.stringMatching(reason) }]);
  });

  it('and the others are planned all the same', () => {
    const request = { ...sound, parts: [...sound.parts, { id: 'beam', length: 2_000, quantity: 1 }] };
    const plan = planBoards(request);
    expect(plan.boards).toHaveLength(2);
    expect(plan.unplaced).toHaveLength(1);
  });
});

it('nothing to cut costs nothing', () => {
  expect(planBoards({ ...sound, parts: [{ ...leg!, quantity: 0 }] })).toEqual({
    boards: [],
    unplaced: [],
    cost: 0,
    lowerBound: 0,
    proved: true,
  });
});

describe('ten thousand parts are answered within the time limit', () => {
  const random = seededRandom(3);
  const many = Array.from({ length: 10_000 }, (_, i) => ({
    id: `p${i}`,
    length: 130_000 + Math.floor(random() * 700_000),
    quantity: 1,
  }));
  it.each<[string, BoardRequest]>([
    ['all different', { stock: [{ id: 's', length: 1_560_576 }], parts: many, kerf: 2_032 }],
    [
      'of a few lengths',
      {
        stock: [
          { id: 's', length: 1_560_576 },
          { id: 'l', length: 3_121_152 },
        ],
        parts: many.slice(0, 10).map((part) => ({ ...part, quantity: 1_000 })),
        kerf: 2_032,
      },
    ],
    [
      'many to a board',
      {
        stock: [{ id: 's', length: 90_000_000 % 64_000_000 }],
        parts: many.map((part, i) => ({ ...part, length: 1_000 + i })),
        kerf: 7,
      },
    ],
  ])('%s', (_, request) => {
    const start = performance.now();
    const plan = planBoards({ ...request, timeLimitMs: 1_000 });
    // Not a measure of speed, since the machine may be busy: a run that ignores its limit takes minutes here.
    expect(performance.now() - start).toBeLessThan(20_000);
    expect(checkBoardPlan(request, plan)).toEqual([]);
    expect(plan.unplaced).toEqual([]);
    expect(plan.cost / plan.lowerBound).toBeLessThan(1.05);
  });
});
