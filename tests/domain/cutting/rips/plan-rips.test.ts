import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  CuttingRequestError,
  planRips,
  straightening,
  type Cut,
  type RipPlan,
  type RipRequest,
} from '@/lib/domain/cutting';
import { inch } from '@/plans/lengths';

const KERF = inch(0, 1, 8);
const THIN = inch(0, 3, 32);
const board = { id: '1x8', length: inch(96), width: inch(7, 1, 4) };
const base: Omit<RipRequest, 'parts'> = {
  boards: [board],
  ripKerf: THIN,
  crosscutKerf: KERF,
  squareEnds: inch(0, 1, 2),
  easedEdge: inch(0, 1, 4),
  timeLimitMs: 60,
};

const mm = (min: number, max: number) => fc.integer({ min, max }).map((value) => value * 640);
const requests: fc.Arbitrary<RipRequest> = fc.record(
  {
    boards: fc
      .array(
        fc.record(
          {
            length: mm(600, 3_000),
            width: mm(80, 300),
            available: fc.integer({ min: 0, max: 3 }),
            price: fc.integer({ min: 0, max: 90 }),
          },
          { requiredKeys: ['length', 'width'] },
        ),
        { minLength: 1, maxLength: 3 },
      )
      .map((boards) => boards.map((each, i) => ({ ...each, id: `board-${i}` }))),
    parts: fc
      .array(fc.record({ length: mm(50, 2_000), width: mm(15, 250), quantity: fc.integer({ min: 0, max: 3 }) }), {
        maxLength: 5,
      })
      .map((parts) => parts.map((part, i) => ({ ...part, id: `part-${i}` }))),
    ripKerf: fc.constantFrom(0, THIN, KERF),
    crosscutKerf: fc.constantFrom(0, THIN, KERF),
    squareEnds: mm(0, 20),
    easedEdge: mm(0, 8),
    oversize: mm(0, 10),
    leastStrip: mm(0, 40),
    crook: fc.record({ by: mm(0, 15), over: mm(1_000, 3_000) }),
    keepOffcut: fc.constant({ length: 300 * 640, width: 30 * 640 }),
    timeLimitMs: fc.constant(20),
  },
  { requiredKeys: ['boards', 'parts', 'ripKerf', 'crosscutKerf', 'timeLimitMs'] },
);

describe('a plan for ripped lumber', () => {
  it('can be cut as it stands, for any list', () => {
    fc.assert(
      fc.property(requests, (request) => {
        const plan = planRips(request);
        expect(faultsOf(request, plan)).toEqual([]);
      }),
      { numRuns: 60 },
    );
  });

  it('loses the rip saw’s kerf across and the crosscut saw’s along', () => {
    const exact = { ...base, squareEnds: 0, easedEdge: 0 };
    const wide = board.width - THIN;
    const long = board.length - KERF;
    const parts = [{ id: 'rail', length: long / 2, width: wide / 2, quantity: 4 }];
    const plan = planRips({ ...exact, parts });
    expect(plan.boards).toHaveLength(1);
    expect(plan.proved).toBe(true);
    // A unit wider, and the fourth no longer has room.
    const over = planRips({ ...exact, parts: [{ ...parts[0]!, width: wide / 2 + 1 }] });
    expect(over.boards).toHaveLength(2);
  });

  it('takes a quarter of the crook from half the length: 1/2 in over 96 in is 1/8 in over 48', () => {
    const crook = { by: inch(0, 1, 2), over: inch(96) };
    expect(straightening({ crook }, inch(96))).toBe(inch(0, 1, 2));
    expect(straightening({ crook }, inch(48))).toBe(inch(0, 1, 8));
    expect(straightening({}, inch(96))).toBe(0);
  });

  it('crosscuts first where that saves a board', () => {
    const crook = { by: inch(0, 1, 2), over: inch(96) };
    // Two of 3 1/4 in, a kerf and the eased edges leave 5/32 in: enough for the crook of half a board, not of a whole one.
    const parts = [{ id: 'slat', length: inch(46), width: inch(3, 1, 4), quantity: 4 }];
    const plan = planRips({ ...base, crook, parts });
    expect(plan.order).toBe('crosscut-first');
    expect(plan.boards).toHaveLength(1);
    expect(plan.straighten).toBeLessThan(inch(0, 1, 8));
  });

  it('marks long rips that may pinch, and slivers that come off beside a part', () => {
    const parts = [{ id: 'rail', length: inch(90), width: inch(3, 1, 2), quantity: 1 }];
    const narrow = { ...board, width: inch(4, 1, 4) };
    const [made] = planRips({ ...base, boards: [narrow], leastStrip: inch(0, 1, 2), parts }).boards;
    expect(made!.rips).toMatchObject([{ mayPinch: true, leavesSliver: true }]);
    const short = planRips({
      ...base,
      boards: [{ ...board, length: inch(20) }],
      parts: [{ ...parts[0]!, length: inch(18) }],
    });
    expect(short.boards[0]!.rips.every(({ mayPinch }) => !mayPinch)).toBe(true);
  });

  it('says why a part cannot be had', () => {
    const reasonFor = (part: { length: number; width: number }, more: Partial<RipRequest> = {}) =>
      planRips({ ...base, ...more, parts: [{ id: 'rail', quantity: 2, ...part }] }).unplaced;
    const long = { length: inch(95, 1, 2), width: inch(2) };
    expect(reasonFor(long)).toMatchObject([{ quantity: 2, reason: expect.stringMatching(/^It is longer than every/) }]);
    const wide = { length: inch(20), width: inch(7) };
    expect(reasonFor(wide)).toMatchObject([{ reason: expect.stringMatching(/^It is wider than every/) }]);
    const thin = { length: inch(20), width: inch(0, 1, 4) };
    expect(reasonFor(thin, { leastStrip: inch(0, 3, 4) })).toMatchObject([
      { reason: expect.stringMatching(/^It is narrower than the narrowest strip/) },
    ]);
    const rail = { length: inch(90), width: inch(6) };
    expect(reasonFor(rail, { boards: [{ ...board, available: 1 }] })).toEqual([
      { partId: 'rail', quantity: 1, reason: expect.stringMatching(/used up/) as string },
    ]);
    expect(reasonFor(rail, { boards: [] })).toMatchObject([{ reason: expect.stringMatching(/no board/) }]);
  });

  it.each([
    ['a negative kerf', { crosscutKerf: -1 }, 'The crosscut kerf'],
    ['a rip kerf wider than the board', { ripKerf: inch(9) }, 'The kerf is as wide'],
    ['a part without width', { parts: [{ id: 'rail', length: 10, width: 0, quantity: 1 }] }, 'Part “rail”'],
    ['a crook over nothing', { crook: { by: 1, over: 0 } }, 'The crook needs'],
  ])('refuses %s in a sentence', (_, wrong, sentence) => {
    const parts = [{ id: 'rail', length: inch(20), width: inch(2), quantity: 1 }];
    expect(() => planRips({ ...base, parts, ...wrong })).toThrow(CuttingRequestError);
    expect(() => planRips({ ...base, parts, ...wrong })).toThrow(sentence);
  });
});

/** Looks at a plan anew, knowing nothing of how it was made. */
function faultsOf(request: RipRequest, plan: RipPlan): string[] {
  const faults: string[] = [];
  const counts = new Map<string, number>();
  const { squareEnds = 0, easedEdge = 0, oversize = 0 } = request;
  for (const { boardId, usable, cuts, placements } of plan.boards) {
    const stock = request.boards.find(({ id }) => id === boardId)!;
    if (usable.x !== squareEnds || usable.length !== stock.length - 2 * squareEnds) faults.push('ends are not squared');
    if (usable.y + usable.width > stock.width - easedEdge || usable.y < easedEdge) faults.push('an eased edge is left');
    const found: string[] = [];
    const visit = (cut: Cut): void => {
      if (cut.kind === 'part') {
        const part = request.parts.find(({ id }) => id === cut.partId)!;
        if (cut.turned || cut.length !== part.length || cut.width !== part.width + oversize)
          faults.push('a part’s size');
        found.push(`${cut.partId} ${cut.x} ${cut.y}`);
      }
      if (cut.kind !== 'cut') return;
      const isRip = cut.direction === 'along';
      const [start, size] = isRip ? [cut.y, cut.width] : [cut.x, cut.length];
      const end = cut.at + (isRip ? request.ripKerf : request.crosscutKerf);
      const [side, extent] = isRip ? (['y', 'width'] as const) : (['x', 'length'] as const);
      const across = isRip ? 'length' : 'width';
      if (cut.first?.[side] !== start || cut.first[extent] !== cut.at - start) faults.push('a cut’s near piece');
      if (cut.first?.[across] !== cut[across]) faults.push('a cut from edge to edge');
      if (cut.rest && (cut.rest[side] !== end || cut.rest[extent] !== start + size - end)) faults.push('a kerf');
      if (!cut.rest && start + size > end) faults.push('wood lost behind a cut');
      if (cut.first) visit(cut.first);
      if (cut.rest) visit(cut.rest);
    };
    visit(cuts);
    if (
      JSON.stringify({ ...usable }) !== JSON.stringify({ x: cuts.x, y: cuts.y, length: cuts.length, width: cuts.width })
    )
      faults.push('the cuts do not begin with the usable piece');
    const placed = placements.map(({ partId, x, y }) => `${partId} ${x} ${y}`);
    if (found.sort().join() !== placed.sort().join()) faults.push('placements are not what the cuts make');
    for (const { partId } of placements) counts.set(partId, (counts.get(partId) ?? 0) + 1);
  }
  for (const { partId, quantity } of plan.unplaced) counts.set(partId, (counts.get(partId) ?? 0) + quantity);
  for (const { id, quantity } of request.parts) if ((counts.get(id) ?? 0) !== quantity) faults.push(`number of ${id}`);
  const isPriced = request.boards.some(({ price }) => price !== undefined);
  const costs = plan.boards.map(({ boardId }) => {
    const { length, width, price = 0 } = request.boards.find(({ id }) => id === boardId)!;
    return isPriced ? price : length * width;
  });
  if (costs.reduce((sum, cost) => sum + cost, 0) !== plan.cost) faults.push('cost');
  for (const { id, available = Infinity } of request.boards)
    if (plan.boards.filter(({ boardId }) => boardId === id).length > available)
      faults.push(`more of ${id} than there are`);
  if (plan.lowerBound > plan.cost) faults.push('bound over cost');
  return faults;
}
