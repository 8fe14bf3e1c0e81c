import { describe, expect, it } from 'vitest';
import { touchesOf } from '@/lib/domain/build/touches';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');

describe('what a departure touches', () => {
  it('a key size reaches the parts that follow from it and the later steps that use them', () => {
    const { parts, steps } = touchesOf(plan, { stepId: 'measure-carcass', keySizeIds: ['body-measured'] });
    expect(parts).toEqual(expect.arrayContaining(['top-rail', 'bottom-rail', 'front-panel']));
    expect(parts).not.toContain('lid');
    expect(steps).toEqual(expect.arrayContaining(['cut-frame', 'cut-panels']));
    expect(steps).not.toContain('choose-boards');
  });

  it('a size worked out from it counts too, and so do checks against it', () => {
    const { steps } = touchesOf(plan, { keySizeIds: ['seat-depth'] });
    // The width of a side is checked against side-depth, which is worked out from seat-depth.
    expect(steps).toContain('rip-carcass');
    const { steps: checked } = touchesOf(plan, { keySizeIds: ['bottom-rise'] });
    expect(checked).toContain('layout-sides');
  });

  it('a part reaches what is made from it, and the hardware of the steps that use it', () => {
    const { parts, steps, items } = touchesOf(plan, { stepId: 'rip-seat', partIds: ['seat-board'] });
    expect(parts).toEqual(['seat-board', 'lid']);
    expect(steps).toEqual(expect.arrayContaining(['glue-halves', 'flatten-lid', 'hang-lid']));
    expect(steps).not.toContain('cut-dados');
    expect(items).toContain('glue');
  });

  it('a step reaches what waits for it and uses what it makes, never what came before', () => {
    const { steps, parts } = touchesOf(plan, { stepId: 'glue-lid' });
    expect(parts).toEqual(['lid']);
    expect(steps).toContain('flatten-lid');
    expect(steps).not.toContain('glue-halves');
    expect(steps).not.toContain('glue-lid');
  });

  it('nothing touches nothing', () => {
    expect(touchesOf(plan, {})).toEqual({ steps: [], parts: [], items: [] });
  });
});
