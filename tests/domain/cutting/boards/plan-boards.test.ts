import { describe, expect, it } from 'vitest';
import { checkBoardPlan, planBoards, type BoardPlan, type BoardRequest } from '@/lib/domain/cutting';
import { UNITS_PER_INCH } from '@/lib/domain/measure';

const inches = (value: number) => value * UNITS_PER_INCH;

function planned(request: BoardRequest): BoardPlan {
  const plan = planBoards(request);
  expect(checkBoardPlan(request, plan)).toEqual([]);
  return plan;
}

function oneBoard(request: Partial<BoardRequest>): BoardPlan {
  return planned({ stock: [{ id: 'board', length: 100 }], parts: [], kerf: 2, ...request });
}

describe('the kerf', () => {
  it('is lost between parts and not at an untouched end', () => {
    const parts = [{ id: 'a', length: 32, quantity: 3 }];
    expect(oneBoard({ parts }).boards).toHaveLength(1);
    expect(oneBoard({ parts, kerf: 3 }).boards).toHaveLength(2);
  });

  it('is not needed for a part as long as the board', () => {
    const { boards, cost, proved } = oneBoard({ parts: [{ id: 'a', length: 100, quantity: 2 }] });
    expect(boards).toHaveLength(2);
    expect(boards[0]).toEqual({ stockId: 'board', cuts: [{ partId: 'a', start: 0, end: 100 }], offcut: 0 });
    expect({ cost, proved }).toEqual({ cost: 200, proved: true });
  });

  it('of the last cut may run off the end', () => {
    const { boards } = oneBoard({ parts: [{ id: 'a', length: 99, quantity: 1 }] });
    expect(boards[0]!.offcut).toBe(0);
  });

  it('may be nothing', () => {
    expect(oneBoard({ parts: [{ id: 'a', length: 25, quantity: 4 }], kerf: 0 }).boards).toHaveLength(1);
  });
});

describe('the ends', () => {
  it('are trimmed with their own kerf, which shortens what can be used', () => {
    const ends = { trimStart: 5, trimEnd: 4 };
    const whole = oneBoard({ ...ends, parts: [{ id: 'a', length: 91, quantity: 1 }] });
    expect(whole.boards[0]!.cuts).toEqual([{ partId: 'a', start: 5, end: 96 }]);
    expect(oneBoard({ ...ends, parts: [{ id: 'a', length: 92, quantity: 1 }] }).unplaced).toEqual([
      { partId: 'a', quantity: 1, reason: expect.stringContaining('once its ends are trimmed') },
    ]);
  });
});

describe('a defect', () => {
  const stock = [{ id: 'board', length: 100, avoid: [{ start: 40, end: 45 }] }];

  it('has parts right up to it on both sides, since its own wood takes the kerf', () => {
    const parts = [
      { id: 'a', length: 40, quantity: 1 },
      { id: 'b', length: 55, quantity: 1 },
    ];
    const { boards, proved } = planned({ stock, parts, kerf: 2 });
    expect(boards).toHaveLength(1);
    expect(boards[0]!.cuts).toEqual([
      { partId: 'a', start: 0, end: 40 },
      { partId: 'b', start: 45, end: 100 },
    ]);
    expect(proved).toBe(true);
  });

  it('narrower than the blade costs what the blade is wider, and the longest clear stretch stays whole', () => {
    const narrow = [{ id: 'board', length: 100, avoid: [{ start: 40, end: 41 }] }];
    const request = (first: number, second: number): BoardRequest => ({
      stock: narrow,
      parts: [
        { id: 'a', length: first, quantity: 1 },
        { id: 'b', length: second, quantity: 1 },
      ],
      kerf: 2,
      timeLimitMs: 50,
    });
    expect(planned(request(39, 59)).boards).toHaveLength(1);
    expect(planned(request(40, 59)).boards).toHaveLength(2);
    expect(planned(request(40, 59)).proved).toBe(false);
  });

  it('ends the clear piece that is left', () => {
    const { boards } = planned({ stock, parts: [{ id: 'a', length: 20, quantity: 1 }], kerf: 2 });
    expect(boards[0]!.offcut).toBe(55);
  });
});

describe('a part not measured yet', () => {
  it('is kept at its reserved length, after what is cut and next to the offcut', () => {
    const { boards } = oneBoard({
      parts: [
        { id: 'later', length: 20, quantity: 1, reserve: 50 },
        { id: 'now', length: 30, quantity: 1 },
      ],
    });
    expect(boards).toEqual([
      {
        stockId: 'board',
        cuts: [
          { partId: 'now', start: 0, end: 30 },
          { partId: 'later', start: 32, end: 82 },
        ],
        offcut: 16,
      },
    ]);
  });
});

describe('stock', () => {
  it('that is owned goes before stock that must be bought', () => {
    const { boards, cost } = planned({
      stock: [
        { id: 'yard', length: 96, price: 800 },
        { id: 'rack', length: 50, available: 1 },
      ],
      parts: [{ id: 'a', length: 45, quantity: 3 }],
      kerf: 1,
    });
    expect(boards.map(({ stockId }) => stockId).sort()).toEqual(['rack', 'yard']);
    expect(cost).toBe(800);
  });

  it('is chosen by money, not by length, when it has prices', () => {
    const parts = [{ id: 'a', length: inches(40), quantity: 4 }];
    const lengths = [
      { id: '8 ft', length: inches(96), price: 700 },
      { id: '16 ft', length: inches(192), price: 1_500 },
    ];
    const { boards, cost, proved } = planned({ stock: lengths, parts, kerf: inches(0.125) });
    expect(boards.map(({ stockId }) => stockId)).toEqual(['8 ft', '8 ft']);
    expect({ cost, proved }).toEqual({ cost: 1_400, proved: true });
  });

  it('that runs out leaves parts over, with the reason, as few as it can', () => {
    const { boards, unplaced, proved } = planned({
      stock: [{ id: 'rack', length: 100, available: 2 }],
      parts: [{ id: 'a', length: 40, quantity: 7 }],
      kerf: 2,
    });
    expect(boards).toHaveLength(2);
    expect(unplaced).toEqual([{ partId: 'a', quantity: 3, reason: expect.stringContaining('used up') }]);
    expect(proved).toBe(false);
  });
});

describe('what is left over', () => {
  it('comes in one large piece rather than two small ones', () => {
    const { boards } = planned({
      stock: [{ id: 'board', length: 100 }],
      parts: [
        { id: 'a', length: 60, quantity: 2 },
        { id: 'b', length: 30, quantity: 1 },
        { id: 'c', length: 10, quantity: 1 },
      ],
      kerf: 0,
    });
    expect(boards.map(({ offcut }) => offcut).sort((a, b) => a - b)).toEqual([0, 40]);
  });

  it('is not worth keeping below the length that is', () => {
    const parts = [
      { id: 'a', length: 55, quantity: 2 },
      { id: 'b', length: 20, quantity: 2 },
    ];
    const { boards } = planned({ stock: [{ id: 'board', length: 100 }], parts, kerf: 0, keepOffcut: 30 });
    expect(Math.max(...boards.map(({ offcut }) => offcut))).toBe(45);
  });
});

it('boards of one pattern come one after the other, equal parts side by side', () => {
  const { boards } = planned({
    stock: [{ id: 'board', length: 100 }],
    parts: [
      { id: 'a', length: 50, quantity: 4 },
      { id: 'b', length: 30, quantity: 4 },
      { id: 'c', length: 18, quantity: 4 },
    ],
    kerf: 1,
    timeLimitMs: 200,
  });
  const patterns = boards.map(({ cuts }) => cuts.map(({ partId }) => partId).join());
  expect(patterns.filter((pattern, i) => i === 0 || pattern !== patterns[i - 1])).toEqual([...new Set(patterns)]);
});

it('a caller hears of better plans and can stop the search with the best so far', () => {
  const heard: number[] = [];
  let asked = 0;
  const request: BoardRequest = {
    stock: [{ id: 'board', length: 1_000 }],
    parts: Array.from({ length: 60 }, (_, i) => ({ id: `p${i}`, length: 190 + 7 * i, quantity: 2 })),
    kerf: 3,
    timeLimitMs: 60_000,
  };
  const plan = planBoards(request, { onProgress: ({ cost }) => heard.push(cost), shouldStop: () => ++asked > 200 });
  expect(checkBoardPlan(request, plan)).toEqual([]);
  expect(heard.length).toBeGreaterThan(0);
  expect(heard).toEqual([...heard].sort((a, b) => b - a));
  expect(plan.cost).toBe(heard.at(-1));
});
