import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { judgeKeySize } from '@/lib/domain/plan/judge-key-size';
import { evaluateSize, resolveKeySizes, wordsOf, type KeySizeValues } from '@/lib/domain/plan/key-sizes';
import { readPlan } from '@/lib/domain/plan/read-plan';
import { resolveParts } from '@/lib/domain/plan/resolve-parts';
import { bootTray } from '@/plans/boot-tray/index';
import { inch, mm } from '@/plans/lengths';

const read = readPlan(JSON.parse(JSON.stringify(bootTray)));
if (!read.ok) throw new Error('the example plan is not readable');
const plan: PlanDocument = read.plan;

function valuesWith(measured: Record<string, number> = {}): KeySizeValues {
  const resolved = resolveKeySizes(plan, measured);
  if (!resolved.ok) throw new Error(resolved.message);
  return resolved.values;
}

const sizeOf = (formula: string, measured: Record<string, number> = {}) =>
  evaluateSize(formula, valuesWith(measured), plan);

describe('a formula', () => {
  it.each([
    ['=tray-length', mm(600)],
    ['=tray-length - 2 * 20 mm', mm(560)],
    ['=(tray-length + 40 mm) / 2', mm(320)],
    ['=tray-length / 600 * 35', mm(35)],
    ['=-20 mm + tray-length', mm(580)],
    ['=3/4in', inch(0, 3, 4)],
    ['=1 in + 1/128in', inch(1, 1, 128)],
    ['=min(tray-length, 500 mm)', mm(500)],
    ['=max(tray-length, 500 mm, 2 m)', mm(2000)],
    ['=roundup(tray-length, 250 mm)', mm(750)],
    ['=roundup(tray-length, 200 mm)', mm(600)],
    ['=sqrt(300 mm * 300 mm + 400 mm * 400 mm)', mm(500)],
    ['=tan(45) * 100 mm', mm(100)],
    ['=count(long-side) * 20 mm', mm(40)],
  ])('%s comes to %i', (formula, length) => {
    expect(sizeOf(formula)).toMatchObject({ ok: true, length });
  });

  it.each([
    ['=tray-length * 20 mm', /no length/],
    ['=count(long-side)', /plain number/],
    ['=tray-length + 20', /give the number a unit/],
    ['=20 mm / 0', /divides by zero/],
    ['=side-length - 3 mm', /no key size "side-length"/],
    ['=tray-length-base-length', /a minus between two sizes has a space/],
    ['=sqrt(0 mm * 1 mm - 4 mm * 4 mm)', /square root of a negative/],
    ['=tan(90) * 1 mm', /below 89\.9/],
    ['=roundup(tray-length, 0 mm)', /step above zero/],
    ['=count(lid) * 1 mm', /id of a part/],
    ['=(tray-length', /"\)" is missing/],
    ['=tray-length 2', /not expected/],
    ['=floor(tray-length)', /"floor" is not one of/],
    [`=${'('.repeat(60)}1 mm${')'.repeat(60)}`, /deeper than 30/],
  ])('%s is refused', (formula, message) => {
    const result = sizeOf(formula);
    expect(result.ok).toBe(false);
    expect(result.ok ? '' : result.message).toMatch(message);
  });

  it('works out the same as exact arithmetic, for any lengths', () => {
    const length = fc.integer({ min: 1, max: 64_000_00 });
    fc.assert(
      fc.property(length, fc.integer({ min: 0, max: 40 }), length, (tray, times, less) => {
        const result = sizeOf(`=tray-length + ${times} * ply-thickness`, {
          'tray-length': tray,
          'ply-thickness': less,
        });
        expect(result).toMatchObject({ ok: true, length: tray + times * less });
      }),
    );
  });

  it('is put in words with the names of its sizes', () => {
    expect(wordsOf('=tray-length - 2 * 20 mm', plan)).toBe('Length over all − 2 × 20 mm');
  });
});

describe('key sizes', () => {
  it('are as drawn until they are measured, and what depends on them is an estimate', () => {
    const values = valuesWith();
    expect(values['ply-thickness']).toMatchObject({ from: 'default', estimate: true, length: mm(12) });
    expect(values['base-length']).toMatchObject({ from: 'formula', estimate: false, length: mm(560) });
    const base = resolveParts(plan, values).find(({ part }) => part.id === 'base');
    expect(base).toMatchObject({ estimate: true, uses: ['base-length', 'ply-thickness'] });
  });

  it('once measured rule the parts that depend on them', () => {
    const base = resolveParts(plan, valuesWith({ 'ply-thickness': mm(11.7), 'tray-length': mm(700) })).at(0);
    expect(base).toMatchObject({ thickness: mm(11.7), length: mm(660), estimate: false });
  });

  it('measured as nothing, or too short for a part, stay as drawn with the problem said', () => {
    expect(valuesWith({ 'ply-thickness': 0 })['ply-thickness']).toMatchObject({ length: mm(12), estimate: true });
    const short = valuesWith({ 'tray-length': mm(30) })['base-length'];
    expect(short).toMatchObject({ length: mm(560), estimate: true });
    expect(short?.problem).toMatch(/Length of the base has no length/);
  });

  it('are judged before they are kept', () => {
    expect(judgeKeySize(plan, {}, 'tray-length', mm(600))).toEqual({ ok: true, outsideRange: null });
    expect(judgeKeySize(plan, {}, 'tray-length', mm(1000))).toMatchObject({ ok: true, outsideRange: { max: mm(900) } });
    expect(judgeKeySize(plan, {}, 'tray-length', mm(30))).toMatchObject({ ok: false, code: 'leaves-no-size' });
    expect(judgeKeySize(plan, {}, 'lid', mm(30))).toMatchObject({ ok: false, code: 'unknown-key-size' });
  });
});
