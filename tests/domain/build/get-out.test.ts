import { expect, it } from 'vitest';
import { foldEntries } from '@/lib/domain/build/fold';
import { getOut } from '@/lib/domain/build/get-out';
import { findStep } from '@/lib/domain/plan/find';
import { done, entry } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const out = (stepId: string, ...entries: Parameters<typeof foldEntries>[0]) =>
  getOut(plan, foldEntries(entries), findStep(plan, stepId)!);

it('names tools of the safest method, hardware with quantities, clamps and parts', () => {
  const { tools, items, clamps, parts } = out('glue-carcass');
  expect(out('cut-dados').tools).toEqual(expect.arrayContaining(['Router', 'Dado jig']));
  expect(new Set(tools).size).toBe(tools.length);
  expect(items).toContainEqual(expect.objectContaining({ id: 'screw-2', quantity: 8 }));
  expect(clamps).toBe(findStep(plan, 'glue-carcass')!.glueUp!.clamps.count);
  expect(parts.map(({ label, pieces, cut }) => [label, pieces, cut])).toContainEqual(['A', 2, 0]);
});

it('says how many pieces are cut, and takes a part that is glued up for made when its step is done', () => {
  const cut = entry('piece-marked', { partId: 'side', piece: 2 }, { mark: 'cut' });
  expect(out('glue-carcass', cut).parts.find(({ partId }) => partId === 'side')).toMatchObject({ pieces: 2, cut: 1 });
  expect(out('flatten-lid').parts.find(({ partId }) => partId === 'lid')).toMatchObject({ pieces: 1, cut: 0 });
  const made = done('glue-lid');
  expect(out('flatten-lid', ...made).parts.find(({ partId }) => partId === 'lid')).toMatchObject({ cut: 1 });
});
