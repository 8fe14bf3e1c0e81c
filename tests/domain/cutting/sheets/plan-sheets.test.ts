import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  checkSheetPlan,
  planSheets,
  CuttingRequestError,
  type SheetPart,
  type SheetRequest,
} from '@/lib/domain/cutting';
import { inch } from '@/plans/lengths';

const MM = 640;
const size = fc.integer({ min: 20, max: 900 }).map((mm) => mm * MM);
const part = (id: string) =>
  fc.record({
    id: fc.constant(id),
    length: size,
    width: size,
    quantity: fc.integer({ min: 1, max: 3 }),
    grain: fc.constantFrom('along' as const, 'across' as const, 'any' as const),
    matched: fc.option(fc.constantFrom('doors', 'fronts'), { nil: undefined, freq: 4 }),
  });
const requests: fc.Arbitrary<SheetRequest> = fc.record(
  {
    sheets: fc
      .array(
        fc.record(
          {
            length: fc.integer({ min: 600, max: 2_500 }).map((mm) => mm * MM),
            width: fc.integer({ min: 400, max: 1_300 }).map((mm) => mm * MM),
            available: fc.integer({ min: 1, max: 4 }),
            price: fc.integer({ min: 1, max: 90 }),
            grain: fc.boolean(),
          },
          { requiredKeys: ['length', 'width'] },
        ),
        { minLength: 1, maxLength: 3 },
      )
      .map((sheets) => sheets.map((sheet, i) => ({ ...sheet, id: `sheet-${i}` }))),
    parts: fc
      .integer({ min: 1, max: 7 })
      .chain((count) => fc.tuple(...Array.from({ length: count }, (_, i) => part(`part-${i}`)))) as fc.Arbitrary<
      SheetPart[]
    >,
    kerf: fc.constantFrom(0, 2_032, 3 * MM),
    trim: fc.constantFrom(0, 1_000, 10 * MM),
    stages: fc.constantFrom(2 as const, 3 as const, 4 as const),
    firstCut: fc.constantFrom('along' as const, 'across' as const, 'either' as const),
    keepOffcut: fc.option(fc.constant({ length: 300 * MM, width: 100 * MM }), { nil: undefined }),
    seed: fc.integer({ min: 0, max: 99 }),
    timeLimitMs: fc.constant(25),
  },
  { requiredKeys: ['sheets', 'parts', 'kerf', 'timeLimitMs'] },
);

describe('a plan for sheets', () => {
  it('can be cut as it stands, for any list', () => {
    fc.assert(
      fc.property(requests, (request) => {
        const plan = planSheets(request);
        expect(checkSheetPlan(request, plan)).toEqual([]);
        for (const { reason } of plan.unplaced) expect(reason).toMatch(/^[A-Z].*\.$/);
      }),
      { numRuns: 250 },
    );
  });

  it('is the same again whenever it ended by proof', () => {
    fc.assert(
      fc.property(requests, (request) => {
        const plan = planSheets({ ...request, timeLimitMs: 400 });
        if (plan.proved && plan.unplaced.length === 0)
          expect(planSheets({ ...request, timeLimitMs: 400 })).toEqual(plan);
      }),
      { numRuns: 25 },
    );
  });

  it('takes a part that equals the sheet without a cut', () => {
    const sheet = { id: 'ply', length: inch(96), width: inch(48) };
    const plan = planSheets({
      sheets: [sheet],
      parts: [{ id: 'top', length: inch(96), width: inch(48), quantity: 1 }],
      kerf: inch(0, 1, 8),
    });
    expect(plan.sheets[0]!.cuts).toMatchObject({ kind: 'part', partId: 'top' });
    expect(plan).toMatchObject({ cost: inch(96) * inch(48), proved: true, unplaced: [] });
  });

  it('loses a kerf at each cut, and lets the last run off the edge', () => {
    const sheet = { id: 'ply', length: inch(96), width: inch(48) };
    const strips = (width: number, quantity: number) =>
      planSheets({
        sheets: [sheet],
        parts: [{ id: 'strip', length: inch(96), width, quantity, grain: 'along' }],
        kerf: inch(0, 1, 8),
      }).sheets.length;
    // 4 × 11 29/32 + 3 × 1/8 = 48 exactly; a 1/32 more each no longer goes.
    expect(strips(inch(11, 29, 32), 4)).toBe(1);
    expect(strips(inch(11, 30, 32), 4)).toBe(2);
  });

  it('keeps grain: a part that wants it is never turned, however well it would fit', () => {
    const request: SheetRequest = {
      sheets: [{ id: 'ply', length: 1_000 * MM, width: 500 * MM, grain: true }],
      parts: [{ id: 'side', length: 500 * MM, width: 1_000 * MM, quantity: 1, grain: 'along' }],
      kerf: 0,
    };
    expect(planSheets(request).unplaced).toMatchObject(
      [{ partId: 'side', reason: /turned against the grain/ }].map((row) => ({
        partId: row.partId,
        reason: expect.stringMatching(row.reason) as unknown,
      })),
    );
    expect(planSheets({ ...request, sheets: [{ ...request.sheets[0]!, grain: false }] }).unplaced).toEqual([]);
  });

  it('lays matched pieces side by side in order, from one sheet', () => {
    const fronts = ['left', 'middle', 'right'].map((id) => ({
      id,
      length: 400 * MM,
      width: 200 * MM,
      quantity: 1,
      grain: 'along' as const,
      matched: 'fronts',
    }));
    const request: SheetRequest = {
      sheets: [{ id: 'ply', length: 1_300 * MM, width: 600 * MM, grain: true }],
      parts: [{ id: 'shelf', length: 700 * MM, width: 300 * MM, quantity: 3, grain: 'along' }, ...fronts],
      kerf: 3 * MM,
      timeLimitMs: 100,
    };
    const plan = planSheets(request);
    expect(checkSheetPlan(request, plan)).toEqual([]);
    const placed = plan.sheets.flatMap(({ placements }) => placements.filter(({ partId }) => partId !== 'shelf'));
    const byX = [...placed].sort((a, b) => a.x - b.x);
    expect(byX.map(({ partId }) => partId)).toEqual(['left', 'middle', 'right']);
    expect(new Set(byX.map(({ y }) => y)).size).toBe(1);
  });

  it('uses what is cheapest, not what is largest', () => {
    const plan = planSheets({
      sheets: [
        { id: 'full', length: 2_440 * MM, width: 1_220 * MM, price: 6_000 },
        { id: 'half', length: 1_220 * MM, width: 1_220 * MM, price: 2_500 },
      ],
      parts: [{ id: 'panel', length: 1_200 * MM, width: 1_200 * MM, quantity: 3 }],
      kerf: 3 * MM,
    });
    expect(plan).toMatchObject({ cost: 7_500, proved: true });
    expect(plan.sheets.map(({ sheetId }) => sheetId)).toEqual(['half', 'half', 'half']);
  });

  it('says when sheets run out, and plans what they hold', () => {
    const plan = planSheets({
      sheets: [{ id: 'rack', length: 1_000 * MM, width: 500 * MM, available: 1 }],
      parts: [{ id: 'panel', length: 480 * MM, width: 480 * MM, quantity: 5 }],
      kerf: 3 * MM,
    });
    expect(plan.sheets[0]!.placements).toHaveLength(2);
    expect(plan.unplaced).toEqual([
      { partId: 'panel', quantity: 3, reason: expect.stringMatching(/used up/) as unknown },
    ]);
  });
});

describe('a senseless request for sheets', () => {
  const good: SheetRequest = {
    sheets: [{ id: 'ply', length: 1_000 * MM, width: 500 * MM }],
    parts: [{ id: 'panel', length: 100 * MM, width: 100 * MM, quantity: 1 }],
    kerf: 0,
    timeLimitMs: 200,
  };
  const withPart = (changes: Partial<SheetPart>): SheetRequest => ({
    ...good,
    parts: [{ ...good.parts[0]!, ...changes }],
  });

  it.each([
    ['a size of zero', withPart({ width: 0 }), /Part “panel” needs a length and a width above zero/],
    ['a negative size', withPart({ length: -5 }), /above zero/],
    ['a size that is none', withPart({ length: NaN }), /above zero/],
    ['a negative quantity', withPart({ quantity: -1 }), /whole number of pieces/],
    ['a negative kerf', { ...good, kerf: -1 }, /kerf must be zero or more/],
    ['a kerf wider than the sheet', { ...good, kerf: 600 * MM }, /as wide as the widest sheet/],
    ['two parts of one name', { ...good, parts: [good.parts[0]!, good.parts[0]!] }, /both called “panel”/],
    ['five stages', { ...good, stages: 5 as 4 }, /stages must be 2, 3 or 4/],
  ])('with %s is refused in a sentence', (_, request, message) => {
    expect(() => planSheets(request)).toThrow(CuttingRequestError);
    expect(() => planSheets(request)).toThrow(message);
  });

  it.each([
    ['larger than every sheet', withPart({ length: 2_000 * MM, width: 700 * MM }), /larger than every sheet/],
    ['with no sheet to cut it from', { ...good, sheets: [] }, /no sheet to cut it from/],
    [
      'of a group that wants the grain two ways',
      {
        ...good,
        parts: [
          { ...good.parts[0]!, grain: 'along' as const, matched: 'pair' },
          { ...good.parts[0]!, id: 'other', grain: 'across' as const, matched: 'pair' },
        ],
      },
      /want the grain in different ways/,
    ],
  ])('a part %s is left out, with the reason', (_, request, reason) => {
    const plan = planSheets(request);
    expect(checkSheetPlan(request, plan)).toEqual([]);
    expect(plan.unplaced[0]!.reason).toMatch(reason);
  });

  it('of 10 000 parts is answered within its time', () => {
    const parts = Array.from({ length: 500 }, (_, i) => ({
      id: `p${i}`,
      length: (80 + ((i * 37) % 700)) * MM,
      width: (60 + ((i * 53) % 400)) * MM,
      quantity: 20,
    }));
    const request: SheetRequest = {
      sheets: [{ id: 'ply', length: 2_440 * MM, width: 1_220 * MM }],
      parts,
      kerf: 3 * MM,
      timeLimitMs: 2_000,
    };
    const from = performance.now();
    const plan = planSheets(request);
    // Not a measure of speed: a run that ignores its limit takes minutes here.
    expect(performance.now() - from).toBeLessThan(20_000);
    expect(checkSheetPlan(request, plan)).toEqual([]);
    expect(plan.unplaced).toEqual([]);
  });
});
