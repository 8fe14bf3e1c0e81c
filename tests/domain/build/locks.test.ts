import { describe, expect, it } from 'vitest';
import { closeDown } from '@/lib/domain/build/close-down';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import { stepStatuses } from '@/lib/domain/build/locks';
import { progressOf } from '@/lib/domain/build/progress';
import { touchesOf } from '@/lib/domain/build/touches';
import { whatNow } from '@/lib/domain/build/what-now';
import { stepOrder } from '@/lib/domain/plan/step-order';
import { entry, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const MINUTE = 60_000;
const done = (...ids: string[]) => ids.map((stepId) => entry('step-marked', { stepId }, { mark: 'done' }));
const timer = (
  stepId: string,
  times: Partial<Record<'first-glue' | 'clamps-on' | 'clamps-off', number>>,
): StandingEntry[] =>
  Object.entries(times).map(([event, at]) =>
    entry('timer-marked', { timerId: uuidOf(0x70), event: event as 'first-glue' }, { stepId, at: at! }),
  );
const status = (stepId: string, entries: StandingEntry[], now = 0) =>
  stepStatuses(plan, foldEntries(entries), now)[stepId]!;

describe('locks of order', () => {
  it('a step waits for the step before it, by number and name', () => {
    const { state, locks } = status('rough-cut-seat', []);
    expect(state).toBe('locked');
    expect(locks[0]).toMatchObject({ lock: 'order', protects: 'order', about: 'choose-boards' });
    expect(locks[0]!.words).toBe('Waits for step 1, Choose and mark the seat boards.');
  });

  it('a step that was skipped with a reason is passed', () => {
    const skipped = entry('step-marked', { stepId: 'choose-boards' }, { mark: 'skipped', reason: 'done at the yard' });
    expect(status('rough-cut-seat', [skipped]).state).toBe('ready');
  });
});

describe('locks of glue', () => {
  const before = done('choose-boards', 'rough-cut-seat', 'rip-seat', 'glue-halves', 'glue-lid');
  it('wait while the piece is in clamps, and name the time when it may come out', () => {
    const entries = [...before, ...timer('glue-lid', { 'first-glue': 0, 'clamps-on': 5 * MINUTE })];
    const result = stepStatuses(plan, foldEntries(entries), 10 * MINUTE, { formatTime: (ms) => `${ms / MINUTE} min` })[
      'flatten-lid'
    ]!;
    expect(result.state).toBe('waiting');
    expect(result.locks[0]).toMatchObject({
      lock: 'cure',
      protects: 'person-or-tool',
      until: { earliest: 35 * MINUTE, latest: 65 * MINUTE },
    });
    expect(result.locks[0]!.words).toContain('till about 65 min');
  });

  it('wait through the cure after the clamps came off', () => {
    const entries = [
      ...before,
      ...timer('glue-lid', { 'first-glue': 0, 'clamps-on': 5 * MINUTE, 'clamps-off': 60 * MINUTE }),
    ];
    expect(status('flatten-lid', entries, 61 * MINUTE).state).toBe('waiting');
    expect(status('flatten-lid', entries, (5 + 24 * 60) * MINUTE).state).toBe('ready');
  });

  it('do not open by time where no timer was started: nobody knows', () => {
    const { state, locks } = status('flatten-lid', before, 1e12);
    expect(state).toBe('locked');
    expect(locks[0]).toMatchObject({ lock: 'cure', until: null, protects: 'person-or-tool' });
  });
});

describe('locks of metal', () => {
  const before = [
    ...done('glue-frame'),
    ...timer('glue-frame', { 'first-glue': 0, 'clamps-on': MINUTE, 'clamps-off': 90 * MINUTE }),
  ];
  it('name the fasteners in the way of the router until they are out', () => {
    const locked = status('rout-frame', before, 1e9).locks.filter(({ lock }) => lock === 'metal');
    expect(locked.length).toBeGreaterThan(0);
    expect(locked[0]).toMatchObject({ protects: 'person-or-tool', about: 'frame-back' });
    expect(
      status('rout-frame', [...before, ...done('pull-brads')], 1e9).locks.filter(({ lock }) => lock === 'metal'),
    ).toEqual([]);
  });

  it('say nothing of fasteners that are not in yet', () => {
    expect(status('rout-frame', [], 0).locks.some(({ lock }) => lock === 'metal')).toBe(false);
  });
});

describe('measure first', () => {
  it('parts whose size must be taken from the work are not cut before', () => {
    const ready = done('measure-sheets', 'cut-frame-stock', 'measure-carcass');
    expect(status('cut-frame', ready).locks).toContainEqual(
      expect.objectContaining({ lock: 'measure-first', about: 'body-measured' }),
    );
    const measured = entry('key-size-set', { keySizeId: 'body-measured', stockPiece: null }, { length: 680_000 });
    const ply = entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: null }, { length: 11_684 });
    expect(status('cut-frame', [...ready, measured, ply]).locks).toEqual([]);
  });
});

describe('what now', () => {
  it('offers only what nothing stands in the way of, from the first to the last tick', () => {
    const order = stepOrder(plan.steps);
    if (!order.ok) throw new Error('the plan goes round');
    let entries: StandingEntry[] = [
      entry('key-size-set', { keySizeId: 'ply-thickness', stockPiece: null }, { length: 11_684 }),
      entry('key-size-set', { keySizeId: 'thin-ply', stockPiece: null }, { length: 3_556 }),
      entry('key-size-set', { keySizeId: 'body-measured', stockPiece: null }, { length: 682_752 }),
    ];
    let now = 0;
    let steps = 0;
    for (
      let next = whatNow(plan, foldEntries(entries), now);
      !next.finished;
      next = whatNow(plan, foldEntries(entries), now)
    ) {
      expect(next.here).not.toBeNull();
      expect(next.ready.every(({ stepId }) => next.statuses[stepId]!.locks.length === 0)).toBe(true);
      const here = plan.steps.find(({ id }) => id === next.here)!;
      if (here.glueUp) {
        const timerId = uuidOf(0x500 + steps);
        entries = [
          ...entries,
          entry('timer-marked', { timerId, event: 'first-glue' }, { stepId: here.id, at: now }),
          entry('timer-marked', { timerId, event: 'clamps-on' }, { stepId: here.id, at: now + MINUTE }),
          entry('timer-marked', { timerId, event: 'clamps-off' }, { stepId: here.id, at: now + 60 * MINUTE }),
        ];
      }
      now += 2 * 24 * 60 * MINUTE;
      entries = [...entries, entry('step-marked', { stepId: here.id }, { mark: 'done' }, { madeAt: now, stamp: now })];
      steps += 1;
      expect(steps).toBeLessThanOrEqual(plan.steps.length);
    }
    expect(steps).toBe(plan.steps.length);
    expect(progressOf(plan, foldEntries(entries), now)).toMatchObject({
      stepsDone: plan.steps.length,
      minutesLeft: { min: 0, max: 0 },
    });
  });

  it('puts overdue timers first', () => {
    const [a, b] = [uuidOf(0x71), uuidOf(0x72)];
    const entries = [
      entry('timer-marked', { timerId: a, event: 'first-glue' }, { stepId: 'glue-halves', at: 100 * MINUTE }),
      entry('timer-marked', { timerId: b, event: 'first-glue' }, { stepId: 'glue-lid', at: 0 }),
      entry('timer-marked', { timerId: b, event: 'clamps-on' }, { stepId: 'glue-lid', at: MINUTE }),
    ];
    const { timers } = whatNow(plan, foldEntries(entries), 101 * MINUTE);
    expect(timers.map(({ timerId, overdue }) => [timerId, overdue])).toEqual([
      [b, true],
      [a, false],
    ]);
    expect(timers[0]!.overdueMs).toBe(40 * MINUTE);
  });
});

describe('closing down', () => {
  it('insists on oily rags after a coat of oil, and names what is in clamps', () => {
    const opened = entry('session-opened', { sessionId: uuidOf(0x80) }, { at: 0 });
    const entries = [opened, ...done('finish-1'), ...timer('glue-lid', { 'first-glue': 0, 'clamps-on': MINUTE })];
    const { items, curing, minutes } = closeDown(plan, foldEntries(entries), 30 * MINUTE);
    expect(items.find(({ kind }) => kind === 'rags')).toMatchObject({ level: 'danger' });
    expect(items.find(({ kind }) => kind === 'in-clamps')!.words).toContain('Lid');
    expect(curing).toHaveLength(1);
    expect(minutes).toBe(30);
  });

  it('does not speak of rags when nothing was oiled', () => {
    expect(closeDown(plan, foldEntries(done('choose-boards')), MINUTE).items.some(({ kind }) => kind === 'rags')).toBe(
      false,
    );
  });
});

describe('what a departure touches', () => {
  it('a key size reaches the parts that follow from it and the later steps that use them', () => {
    const { parts, steps } = touchesOf(plan, { stepId: 'measure-carcass', keySizeIds: ['body-measured'] });
    expect(parts).toEqual(expect.arrayContaining(['top-rail', 'bottom-rail', 'front-panel']));
    expect(parts).not.toContain('lid');
    expect(steps).toEqual(expect.arrayContaining(['cut-frame', 'cut-panels']));
    expect(steps).not.toContain('choose-boards');
  });
});
