import { describe, expect, it } from 'vitest';
import { planBoards } from '@/lib/domain/cutting';
import { exactBoards } from '@/scripts/benchmarks/cutting/exact-boards';
import { oneLengthLists, severalLengthsLists } from '@/scripts/benchmarks/cutting/workshop-lists';

/** Lists that the solver answers in about a second; all five hundred are in the benchmark. */
const QUICK = [1, 3, 6, 10, 12, 14];

describe('the optimum of a general-purpose solver over all cutting patterns', () => {
  it.each([...QUICK.map((n) => oneLengthLists()[n]!), ...QUICK.map((n) => severalLengthsLists()[n]!)])(
    'is ours too, and ours is proved: $name',
    async ({ request }) => {
      const plan = planBoards({ ...request, timeLimitMs: 10_000 });
      const exact = await exactBoards(request, 20);
      expect(exact?.isOptimal).toBe(true);
      expect(plan.cost).toBe(exact!.cost);
      expect(plan.proved).toBe(true);
    },
  );
});
