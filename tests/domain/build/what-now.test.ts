import { describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import { progressOf } from '@/lib/domain/build/progress';
import { whatNow } from '@/lib/domain/build/what-now';
import type { PlanDocument, PlanStep } from '@/lib/domain/plan/document';
import { done, entry, gluing, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const MINUTE = 60_000;
const now = (entries: StandingEntry[], at = 0, of: PlanDocument = plan) => whatNow(of, foldEntries(entries), at);

describe('what now', () => {
  it('offers only what nothing stands in the way of, from the first to the last tick', () => {
    let entries: StandingEntry[] = [
      entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: null }, { length: 11_684 }),
      entry('key-size-set', { keySizeId: 'thin-ply', stockPiece: null }, { length: 3_556 }),
      entry('key-size-set', { keySizeId: 'body-measured', stockPiece: null }, { length: 682_752 }),
    ];
    let clock = 0;
    let steps = 0;
    for (let next = now(entries); !next.finished; next = now(entries, clock)) {
      expect(next.here).not.toBeNull();
      expect(next.ready.every(({ stepId }) => next.statuses[stepId]!.locks.length === 0)).toBe(true);
      const here = plan.steps.find(({ id }) => id === next.here)!;
      if (here.glueUp) {
        const times = { 'first-glue': clock, 'clamps-on': clock + MINUTE, 'clamps-off': clock + 60 * MINUTE };
        entries = [...entries, ...gluing(here.id, times, { timerId: uuidOf(0x500 + steps) })];
      }
      clock += 2 * 24 * 60 * MINUTE;
      entries = [
        ...entries,
        entry('step-marked', { stepId: here.id }, { mark: 'done' }, { madeAt: clock, stamp: clock }),
      ];
      steps += 1;
      expect(steps).toBeLessThanOrEqual(plan.steps.length);
    }
    expect(steps).toBe(plan.steps.length);
    expect(now(entries, clock)).toMatchObject({ here: null, ready: [], locked: [], getOut: null });
    expect(progressOf(plan, foldEntries(entries), clock)).toMatchObject({
      stepsDone: plan.steps.length,
      minutesLeft: { min: 0, max: 0 },
    });
  });

  it('begins with the first step of the plan, and says why', () => {
    const { here, ready } = now([]);
    expect(here).toBe('choose-boards');
    expect(ready[0]).toMatchObject({ stepId: 'choose-boards', why: 'Goes on with Prepare' });
  });

  it('names what is locked, and by what', () => {
    const { locked, ready } = now([]);
    expect(locked.map(({ stepId }) => stepId)).toContain('rough-cut-seat');
    expect(locked.every(({ locks }) => locks.length > 0)).toBe(true);
    expect(locked.length + ready.length).toBe(plan.steps.length);
  });

  it('puts overdue timers first, and leaves out those put away', () => {
    const [a, b, c] = [uuidOf(0x71), uuidOf(0x72), uuidOf(0x73)];
    const entries = [
      ...gluing('glue-halves', { 'first-glue': 100 * MINUTE }, { timerId: a }),
      ...gluing('glue-lid', { 'first-glue': 0, 'clamps-on': MINUTE }, { timerId: b }),
      ...gluing('glue-frame', { 'first-glue': 0, 'put-away': MINUTE }, { timerId: c }),
    ];
    const { timers } = now(entries, 101 * MINUTE);
    expect(timers.map(({ timerId, overdue }) => [timerId, overdue])).toEqual([
      [b, true],
      [a, false],
    ]);
    expect(timers[0]!.overdueMs).toBe(40 * MINUTE);
  });
});

describe('the order of what can be done', () => {
  /** Steps that wait for nothing, in two stages, with what distinguishes them. */
  const of = (...steps: (Partial<PlanStep> & { id: string })[]): PlanDocument => ({
    ...plan,
    stages: [
      { id: 'one', name: 'One' },
      { id: 'two', name: 'Two' },
    ],
    steps: steps.map((step) => ({ ...plan.steps[0]!, after: [], uses: [], stage: 'one', ...step })),
  });
  const glueUp = plan.steps.find(({ id }) => id === 'glue-lid')!.glueUp!;
  const finish = plan.steps.find(({ id }) => id === 'finish-1')!.finish!;
  const order = (of: PlanDocument, entries: StandingEntry[] = []) =>
    now(entries, 0, of).ready.map(({ stepId }) => stepId);

  it('goes on with the stage under way before others', () => {
    const two = of({ id: 'a', stage: 'two' }, { id: 'b' }, { id: 'c', stage: 'two' }, { id: 'd' });
    expect(order(two, done('b'))).toEqual(['d', 'a', 'c']);
    expect(order(two, done('a'))).toEqual(['c', 'b', 'd']);
  });

  it('starts the longest wait of a stage first, then what follows from the last step, then goes by the plan', () => {
    const steps = of(
      { id: 'a' },
      { id: 'b' },
      { id: 'c', after: ['a'] },
      { id: 'coat', finish: { ...finish, recoatMin: { min: 60, max: 240 } } },
      { id: 'glue', glueUp },
      { id: 'far', stage: 'two', glueUp },
    );
    const { ready } = now(done('a'), 0, steps);
    expect(ready.map(({ stepId }) => stepId)).toEqual(['glue', 'coat', 'c', 'b', 'far']);
    expect(ready.map(({ why }) => why)).toEqual([
      'Starts a wait: it cures while you do something else',
      'Starts a wait: it dries while you do something else',
      'Comes right after what you did last',
      'Goes on with One',
      'Starts a wait: it cures while you do something else',
    ]);
  });
});

describe('where I was', () => {
  const before = [
    ...done('measure-sheets'),
    entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: null }, { length: 11_684 }),
    entry('key-size-set', { keySizeId: 'thin-ply', stockPiece: null }, { length: 3_556 }),
  ];
  const here = (...entries: StandingEntry[]) => {
    const { here, ready } = now([...before, ...entries]);
    return [here, ready[0]!.why];
  };

  it('is the step that was touched last while it is open: cut for, noted, photographed, checked', () => {
    expect(here()[0]).toBe('choose-boards');
    expect(here(entry('piece-marked', { partId: 'back', piece: 1 }, { mark: 'cut' }))).toEqual([
      'cut-thin-ply',
      'You were at this step',
    ]);
    const note = { text: 'tear-out at the edge', stepId: 'cut-thin-ply' };
    expect(here(entry('note-written', { noteId: uuidOf(0x90) }, note))[0]).toBe('cut-thin-ply');
  });

  it('is a glue-up that was begun and not ticked', () => {
    const ready = done('choose-boards', 'rough-cut-seat', 'rip-seat');
    expect(now([...ready, ...gluing('glue-halves', { 'first-glue': 0, 'clamps-on': 1 })], 2).here).toBe('glue-halves');
  });

  it('is a step that was opened to be done again', () => {
    const twice = done('choose-boards', 'cut-thin-ply');
    const again = entry('step-marked', { stepId: 'cut-thin-ply' }, { mark: 'open' });
    expect(here(...twice, again)[0]).toBe('cut-thin-ply');
  });

  it('is not a step that is done, locked, or whose touch was undone', () => {
    const far = entry('note-written', { noteId: uuidOf(0x91) }, { text: 'mind the gap', stepId: 'hang-lid' });
    expect(here(far)[0]).toBe('choose-boards');
    const cut = entry('piece-marked', { partId: 'back', piece: 1 }, { mark: 'cut' });
    const undo = entry('entry-undone', { entryId: cut.id }, { undone: true });
    expect(here(cut, undo)[0]).toBe('choose-boards');
    expect(here(cut, ...done('cut-thin-ply'))[0]).not.toBe('cut-thin-ply');
  });
});
