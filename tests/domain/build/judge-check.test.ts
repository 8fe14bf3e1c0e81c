import { describe, expect, it } from 'vitest';
import { judgeCheck } from '@/lib/domain/build/judge-check';
import type { PlanCheck } from '@/lib/domain/plan/document';
import { findStep } from '@/lib/domain/plan/find';
import { resolveKeySizes } from '@/lib/domain/plan/key-sizes';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const valuesWith = (measured: Record<string, number>) => {
  const resolved = resolveKeySizes(plan, measured);
  if (!resolved.ok) throw new Error(resolved.message);
  return resolved.values;
};
const check = (stepId: string, checkId: string) => findStep(plan, stepId)!.checks.find(({ id }) => id === checkId)!;
const judge = (which: PlanCheck, readings: number[], measured: Record<string, number> = {}) =>
  judgeCheck(which, readings, valuesWith(measured), plan);

describe('a length against its tolerance', () => {
  // 14 3/4 in side depth, within 1/64 in: 239 776 ± 254.
  const width = check('rip-carcass', 'side-width');
  it.each([
    [239_776, 'within', 0],
    [240_030, 'within', 254],
    [239_522, 'within', -254],
    [240_031, 'outside', 255],
    [239_521, 'outside', -255],
  ] as const)('%i is %s, off by %i', (reading, verdict, off) => {
    expect(judge(width, [reading])).toMatchObject({ verdict, off });
  });

  it('says which way it is out', () => {
    expect(judge(width, [300_000]).words).toBe('Too large');
    expect(judge(width, [200_000]).words).toBe('Too small');
  });

  it('follows the sizes taken from the work, and says where they are not taken yet', () => {
    const inner: PlanCheck = { ...width, judge: { kind: 'length', target: '=inner-length', plus: 254, minus: 254 } };
    expect(judge(inner, [659_384]).words).toContain('as drawn');
    expect(judge(inner, [659_000], { 'ply-thickness': 11_876 })).toEqual({
      verdict: 'within',
      off: 0,
      words: 'Within the tolerance',
    });
  });

  it('without a reading, or with no size to hold it against, is incomplete', () => {
    expect(judge(width, []).verdict).toBe('incomplete');
    const lost: PlanCheck = { ...width, judge: { kind: 'length', target: '=no-such-size', plus: 1, minus: 1 } };
    expect(judge(lost, [1])).toMatchObject({ verdict: 'incomplete' });
  });
});

describe('two lengths that must agree', () => {
  const square = check('glue-carcass', 'wet-square');
  it('two diagonals within tolerance are square; else the longer one is named, to be pushed together', () => {
    expect(judge(square, [700_000, 701_016])).toMatchObject({ verdict: 'within', off: 1_016 });
    expect(judge(square, [700_000, 701_017])).toMatchObject({
      verdict: 'outside',
      off: 1_017,
      words: 'Diagonal from lower right is longer: push its ends towards each other',
    });
    expect(judge(square, [702_000, 700_000]).words).toContain('Diagonal from lower left is longer');
  });

  it('two sides that differ are not pushed anywhere', () => {
    const sides = check('crosscut-sides', 'sides-equal');
    expect(judge(sides, [256_032, 256_300]).words).toBe('Right side is longer');
  });

  it('needs both readings', () => {
    expect(judge(square, [700_000])).toMatchObject({ verdict: 'incomplete' });
  });
});
