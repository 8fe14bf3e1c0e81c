import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { checkBoardPlan, planBoards } from '@/lib/domain/cutting';
import { PUBLISHED_BOARDS, publishedBoards } from './published-boards';

/** The few that take seconds or are not closed by our bound are left to the benchmark. */
const SLOW = /Hard28|TEST0022|TEST0005|HARD|u250|t120/;

/**
 * Published bin packing instances with optima proven by BPPLIB (Delorme, Iori, Martello, Optimization Letters 12, 2018):
 * Falkenauer 1996, Schwerin and Waescher 1997, Waescher and Gau 1996, Scholl, Klein and Juergens 1997.
 */
describe('published bin packing instances', () => {
  it('are the ones that were carried over, unchanged', () => {
    const source = readFileSync('tests/reference/data/bpp1d/SOURCE.md', 'utf8');
    const hash = createHash('sha256').update(readFileSync(PUBLISHED_BOARDS)).digest('hex');
    expect(source).toContain(`sha256 of \`instances.csv\`: \`${hash}\``);
    expect(publishedBoards()).toHaveLength(42);
  });

  it.each(publishedBoards().filter(({ name }) => !SLOW.test(name)))('$name: $bestKnown boards, proved', (instance) => {
    const plan = planBoards({ ...instance.request, timeLimitMs: 10_000 });
    expect(checkBoardPlan(instance.request, plan)).toEqual([]);
    expect(plan.boards).toHaveLength(instance.bestKnown);
    expect(plan.proved).toBe(true);
  });
});
