import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LinearProgram } from '@/lib/domain/cutting/boards/linear-program';

const never = () => false;

interface Model {
  rightHand: number[];
  columns: { cost: number; entries: number[]; upper: number }[];
}

const models: fc.Arbitrary<Model> = fc.integer({ min: 1, max: 4 }).chain((rows) =>
  fc.record({
    rightHand: fc.array(fc.nat(12), { minLength: rows, maxLength: rows }),
    columns: fc.array(
      fc.record({
        cost: fc.integer({ min: 1, max: 9 }),
        entries: fc.array(fc.nat(4), { minLength: rows, maxLength: rows }),
        upper: fc.integer({ min: 0, max: 6 }),
      }),
      { minLength: 1, maxLength: 6 },
    ),
  }),
);

function build({ rightHand, columns }: Model): { lp: LinearProgram; first: number } {
  const penalties = rightHand.map(() => 1_000);
  const lp = new LinearProgram(rightHand, penalties, 10);
  const first = lp.columns;
  const rows = rightHand.map((_, r) => r);
  for (const { cost, entries, upper } of columns) lp.addColumn(cost, rows, entries, 0, upper);
  return { lp, first };
}

/** Feasible, and equal to the bound that its own duals give: optimal by weak duality, without another solver. */
function expectOptimal({ rightHand, columns }: Model, lp: LinearProgram, first: number): void {
  const scale = 1e-6 * 1_000;
  rightHand.forEach((need, r) => {
    const had = columns.reduce((sum, { entries }, j) => sum + entries[r]! * lp.valueOf(first + j), lp.valueOf(r));
    expect(had).toBeGreaterThanOrEqual(need - scale);
  });
  columns.forEach((_, j) => {
    expect(lp.valueOf(first + j)).toBeGreaterThanOrEqual(lp.lowerOf(first + j) - 1e-6);
    expect(lp.valueOf(first + j)).toBeLessThanOrEqual(lp.upperOf(first + j) + 1e-6);
  });
  let bound = rightHand.reduce((sum, need, r) => sum + need * lp.duals[r]!, 0);
  for (let j = 0; j < columns.length; j++) {
    const reduced = lp.reducedCost(first + j);
    bound += reduced * (reduced > 0 ? lp.lowerOf(first + j) : lp.upperOf(first + j));
  }
  for (const dual of lp.duals) {
    expect(dual).toBeGreaterThanOrEqual(-scale);
    expect(dual).toBeLessThanOrEqual(1_000 + scale);
  }
  expect(Math.abs(lp.value - bound)).toBeLessThan(scale);
}

describe('the linear programme', () => {
  it('ends at the optimum from scratch', () => {
    fc.assert(
      fc.property(models, (model) => {
        const { lp, first } = build(model);
        expect(lp.improve(never)).toBe(true);
        expectOptimal(model, lp, first);
      }),
      { numRuns: 300 },
    );
  });

  it('ends at the optimum again whenever bounds move or a column comes', () => {
    const changes = fc.array(fc.tuple(fc.nat(5), fc.nat(3), fc.nat(3)), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(models, changes, (model, moves) => {
        const { lp, first } = build(model);
        lp.improve(never);
        for (const [column, lower, extra] of moves) {
          lp.setBounds(first + (column % model.columns.length), lower, lower + extra);
          expect(lp.solve(never)).toBe(true);
          expectOptimal(model, lp, first);
        }
        const late = { cost: 1, entries: model.rightHand.map(() => 2), upper: 5 };
        model.columns.push(late);
        lp.addColumn(
          late.cost,
          model.rightHand.map((_, r) => r),
          late.entries,
          0,
          late.upper,
        );
        expect(lp.improve(never)).toBe(true);
        expectOptimal(model, lp, first);
      }),
      { numRuns: 300 },
    );
  });
});
