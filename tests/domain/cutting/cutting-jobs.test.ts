import { describe, expect, it } from 'vitest';
import {
  checkBoardPlan,
  checkSheetPlan,
  cuttingJobs,
  cutOrder,
  planBoards,
  planSheets,
  wasteOf,
  type CuttingJob,
} from '@/lib/domain/cutting';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { resolveKeySizes } from '@/lib/domain/plan/key-sizes';
import { resolveParts } from '@/lib/domain/plan/resolve-parts';
import { inch, mm } from '@/plans/lengths';
import { demoPlan } from '../../support/plans';

function jobsOf(plan: PlanDocument, measured: Record<string, number> = {}): CuttingJob[] {
  const values = resolveKeySizes(plan, measured);
  if (!values.ok) throw new Error(values.message);
  return cuttingJobs(plan.stock, resolveParts(plan, values.values));
}

describe.each(['hall-bench', 'folding-trestles'] as const)('the cutting jobs of %s', (name) => {
  const plan = demoPlan(name);
  const jobs = jobsOf(plan);

  it('hold every piece that is cut, once', () => {
    const pieces = jobs.flatMap(({ request, unplaced }) => [
      ...(request.of === 'boards' ? request.boards.parts : request.sheets.parts),
      ...unplaced.map(({ partId, quantity }) => ({ id: partId, quantity })),
    ]);
    const cut = plan.parts.filter(({ madeFrom }) => !madeFrom);
    expect(pieces.map(({ id, quantity }) => `${id} ${quantity}`).sort()).toEqual(
      cut.map(({ id, quantity }) => `${id} ${quantity}`).sort(),
    );
  });

  it('have plans that can be cut, with a place for every part', () => {
    for (const { request, unplaced } of jobs) {
      const faults =
        request.of === 'boards'
          ? checkBoardPlan(request.boards, planBoards(request.boards))
          : checkSheetPlan(request.sheets, planSheets({ ...request.sheets, timeLimitMs: 200 }));
      expect(faults).toEqual([]);
      const plan =
        request.of === 'boards' ? planBoards(request.boards) : planSheets({ ...request.sheets, timeLimitMs: 200 });
      expect([...unplaced, ...plan.unplaced]).toEqual([]);
      expect(plan.cost).toBeGreaterThan(0);
    }
  });
});

describe('a cutting job', () => {
  it('keeps room for a part whose size is still to be measured, and lets it be cut once it is', () => {
    const plan = demoPlan('hall-bench');
    const before = jobsOf(plan).flatMap(({ estimates }) => estimates);
    const sizes = Object.fromEntries(
      plan.keySizes.filter(({ takeFromWork }) => takeFromWork).map(({ id, default: drawn }) => [id, drawn]),
    );
    expect(before.length).toBeGreaterThan(0);
    expect(jobsOf(plan, sizes).flatMap(({ estimates }) => estimates)).toEqual([]);
  });

  it('works the price of a board out of the plan’s own unit', () => {
    const stock = demoPlan('hall-bench').stock.find(({ id }) => id === 'oak-1x3')!;
    const priceOf = (price: unknown, length: number) => {
      const priced = { ...stock, lengthsSold: [length], price } as typeof stock;
      const [job] = jobsOf({ ...demoPlan('hall-bench'), stock: [priced] });
      const { request } = job!;
      return request.of === 'boards' ? request.boards.stock[0]!.price : request.sheets.sheets[0]!.price;
    };
    const usd = (minor: number) => ({ minor, currency: 'USD' });
    expect(priceOf({ per: 'foot', amount: usd(295) }, inch(96))).toBe(2_360);
    expect(priceOf({ per: 'piece', amount: usd(1_150) }, inch(48))).toBe(1_150);
    expect(priceOf({ per: 'metre', amount: usd(690) }, mm(2_500))).toBe(1_725);
    // 96 × 2 1/2 × 3/4 in is 180 cubic inches, 1.25 board feet.
    expect(priceOf({ per: 'board-foot', amount: usd(780) }, inch(96))).toBe(975);
  });

  it('refuses a part that is thicker than its stock, with the reason', () => {
    const plan = demoPlan('hall-bench');
    const thin = plan.stock.map((stock) => (stock.id === 'oak-1x3' ? { ...stock, thickness: inch(0, 1, 2) } : stock));
    const unplaced = jobsOf({ ...plan, stock: thin }).flatMap((job) => job.unplaced);
    expect(unplaced.length).toBeGreaterThan(0);
    expect(unplaced[0]!.reason).toMatch(/thicker than this stock/);
  });
});

describe('the order of cuts', () => {
  it('cuts a piece off before it is cut up, and sets the fence to the piece that comes off', () => {
    const plan = planSheets({
      sheets: [{ id: 'ply', length: mm(1_000), width: mm(500) }],
      parts: [
        { id: 'a', length: mm(600), width: mm(300), quantity: 1, grain: 'along' },
        { id: 'b', length: mm(300), width: mm(300), quantity: 1, grain: 'along' },
      ],
      kerf: mm(3),
      firstCut: 'along',
    });
    const [sheet] = plan.sheets;
    const order = cutOrder(sheet!.cuts);
    expect(order.map(({ number }) => number)).toEqual(order.map((_, i) => i + 1));
    expect(order[0]).toMatchObject({
      direction: 'along',
      setting: mm(300),
      region: { length: mm(1_000), width: mm(500) },
    });
    expect(order[1]).toMatchObject({ direction: 'across', setting: mm(600) });
    const area = (rows: readonly { length: number; width: number }[]) =>
      rows.reduce((sum, { length, width }) => sum + length * width, 0);
    const kerfs = order.reduce(
      (sum, { direction, region }) => sum + mm(3) * (direction === 'along' ? region.length : region.width),
      0,
    );
    expect(area(sheet!.placements) + area(sheet!.offcuts) + area(wasteOf(sheet!.cuts)) + kerfs).toBe(
      mm(1_000) * mm(500),
    );
  });
});
