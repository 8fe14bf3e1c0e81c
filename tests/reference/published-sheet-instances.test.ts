import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { checkSheetPlan, planSheets } from '@/lib/domain/cutting';
import { PUBLISHED_SHEETS, publishedSheets } from './published-sheets';

const source = readFileSync('tests/reference/data/cut2d/SOURCE.md', 'utf8');
const shortList = /Short list used by the test: ([^.]+)\./.exec(source.replaceAll(/\s+/g, ' '))![1]!.split(', ');
/** Sheets over the best known that are let pass in the little time of a test; the benchmark says what a second brings. */
const SLACK = 1;

/**
 * Berkey and Wang 1987, Martello and Vigo 1998, against the best known numbers of sheets for three stages (packingsolver's
 * tables 3nho and 3nhr; best known, not all proven).
 */
describe('published instances of two-dimensional packing', () => {
  it('are the ones that were carried over, unchanged', () => {
    const hash = createHash('sha256').update(readFileSync(PUBLISHED_SHEETS)).digest('hex');
    expect(source).toContain(`sha256 of \`instances.csv\`: \`${hash}\``);
    expect(publishedSheets(false)).toHaveLength(300);
    expect(shortList).toHaveLength(40);
    for (const { pieces, request } of publishedSheets(true))
      expect(request.parts.reduce((sum, { quantity }) => sum + quantity, 0)).toBe(pieces);
  });

  for (const turnable of [false, true]) {
    const listed = publishedSheets(turnable).filter(({ name }) => shortList.includes(name));
    it.each(listed)(`$name ${turnable ? 'turned as it fits' : 'as it lies'}: about $bestKnown sheets`, (instance) => {
      const request = { ...instance.request, timeLimitMs: 150 };
      const plan = planSheets(request);
      expect(checkSheetPlan(request, plan)).toEqual([]);
      expect(plan.lowerBound).toBeLessThanOrEqual(instance.bestKnown);
      expect(plan.cost).toBeLessThanOrEqual(instance.bestKnown + SLACK);
      if (plan.proved) expect(plan.cost).toBeLessThanOrEqual(instance.bestKnown);
    });
  }
});
