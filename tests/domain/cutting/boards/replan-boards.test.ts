import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkBoardPlan, planBoards, remainderOf, replanBoards, type BoardRequest } from '@/lib/domain/cutting';

const request: BoardRequest = {
  stock: [{ id: 'eight foot', length: 96, price: 900 }],
  parts: [
    { id: 'leg', length: 30, quantity: 4 },
    { id: 'rail', length: 40, quantity: 2 },
  ],
  kerf: 1,
};

describe('replanning at the bench', () => {
  it('leaves what is cut alone and plans only the rest, a spoilt piece again', () => {
    const plan = planBoards(request);
    const begun = [{ ...plan.boards[0]!, cuts: plan.boards[0]!.cuts.slice(0, 1) }];
    const { begun: kept, rest } = replanBoards({ request, begun, stock: request.stock });
    expect(kept).toBe(begun);
    const [made] = begun[0]!.cuts;
    const planned = rest.boards.flatMap(({ cuts }) => cuts);
    expect(planned).toHaveLength(5);
    expect(planned.filter(({ partId }) => partId === made!.partId)).toHaveLength(
      request.parts.find(({ id }) => id === made!.partId)!.quantity - 1,
    );
  });

  it('uses the remainder of a begun board before money is spent', () => {
    const begun = [{ stockId: 'eight foot', cuts: [{ partId: 'leg', start: 0, end: 30 }], offcut: 65 }];
    const left = remainderOf(request, request.stock[0]!, begun[0]!.cuts);
    expect(left).toEqual({ id: 'eight foot, what is left', length: 65, available: 1, price: 0 });
    const fewer = { ...request, parts: [request.parts[0]!, { ...request.parts[1]!, quantity: 1 }] };
    expect(replanBoards({ request: fewer, begun, stock: request.stock }).rest.cost).toBe(1_800);
    const { rest } = replanBoards({ request: fewer, begun, stock: [...request.stock, left!] });
    expect(rest.boards.some(({ stockId }) => stockId === left!.id)).toBe(true);
    expect(rest.cost).toBe(900);
  });

  it('a remainder carries its defects along, and there is none of a board cut to its end', () => {
    const board = {
      id: 'b',
      length: 96,
      avoid: [
        { start: 20, end: 40 },
        { start: 80, end: 82 },
      ],
    };
    expect(remainderOf(request, board, [{ partId: 'leg', start: 0, end: 30 }])).toEqual({
      id: 'b, what is left',
      length: 65,
      available: 1,
      avoid: [
        { start: 0, end: 9 },
        { start: 49, end: 51 },
      ],
    });
    expect(remainderOf(request, board, [{ partId: 'leg', start: 66, end: 96 }])).toBeUndefined();
  });

  it('more pieces than were asked for are not asked for again, and a foreign piece is refused by name', () => {
    const leg = { partId: 'leg', start: 0, end: 30 };
    const many = [{ stockId: 'eight foot', cuts: Array.from({ length: 5 }, () => leg), offcut: 0 }];
    const { rest } = replanBoards({ request, begun: many, stock: request.stock });
    expect(rest.boards.flatMap(({ cuts }) => cuts).every(({ partId }) => partId === 'rail')).toBe(true);
    const foreign = [{ stockId: 'eight foot', cuts: [{ partId: 'seat', start: 0, end: 30 }], offcut: 0 }];
    expect(() => replanBoards({ request, begun: foreign, stock: request.stock })).toThrow(/“seat” is cut/);
  });

  it('whatever has been cut, the cuts made and the cuts planned are exactly the pieces asked for', () => {
    const plan = planBoards(request);
    fc.assert(
      fc.property(fc.array(fc.nat(4), { minLength: plan.boards.length, maxLength: plan.boards.length }), (done) => {
        const begun = plan.boards.map((board, b) => ({ ...board, cuts: board.cuts.slice(0, done[b]) }));
        const before = structuredClone(begun);
        const { begun: kept, rest } = replanBoards({ request, begun, stock: request.stock });
        expect(kept).toEqual(before);
        const all = [...kept, ...rest.boards].flatMap(({ cuts }) => cuts.map(({ partId }) => partId));
        for (const { id, quantity } of request.parts)
          expect(all.filter((partId) => partId === id)).toHaveLength(quantity);
        const left = request.parts.map((part) => ({
          ...part,
          quantity: part.quantity - kept.flatMap(({ cuts }) => cuts).filter(({ partId }) => partId === part.id).length,
        }));
        expect(checkBoardPlan({ ...request, parts: left }, rest)).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });
});
