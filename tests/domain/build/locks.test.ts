import { describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { foldEntries } from '@/lib/domain/build/fold';
import { stepStatuses, type LockOptions } from '@/lib/domain/build/locks';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { done, entry, gluing, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

const plan = demoPlan('hall-bench');
const MINUTE = 60_000;
const CURE = 24 * 60;
const options: LockOptions = { formatTime: (ms) => `${ms / MINUTE} min` };

const status = (stepId: string, entries: StandingEntry[], now = 0, of: PlanDocument = plan) =>
  stepStatuses(of, foldEntries(entries), now, options)[stepId]!;

describe('locks of order', () => {
  it('a step waits for the step before it, by number and name', () => {
    const { state, locks } = status('rough-cut-seat', []);
    expect(state).toBe('locked');
    expect(locks[0]).toMatchObject({ lock: 'order', protects: 'order', about: 'choose-boards' });
    expect(locks[0]!.words).toBe('Waits for step 1, Choose and mark the seat boards.');
  });

  it('a step that was skipped with a reason is passed, and the reason stays with it', () => {
    const skipped = entry('step-marked', { stepId: 'choose-boards' }, { mark: 'skipped', reason: 'done at the yard' });
    expect(status('rough-cut-seat', [skipped]).state).toBe('ready');
    expect(status('choose-boards', [skipped])).toMatchObject({
      state: 'skipped',
      claim: { reason: 'done at the yard' },
    });
  });

  it('close again when the step before is opened again', () => {
    const ticked = done('choose-boards');
    const reopened = entry('step-marked', { stepId: 'choose-boards' }, { mark: 'open' });
    expect(status('rough-cut-seat', [...ticked, reopened]).state).toBe('locked');
  });

  it('protect a person where the step before is a glue-up that is to cure', () => {
    expect(status('flatten-lid', []).locks[0]).toMatchObject({ lock: 'order', protects: 'person-or-tool' });
  });
});

describe('locks of glue', () => {
  const before = done('choose-boards', 'rough-cut-seat', 'rip-seat', 'glue-halves', 'glue-lid');
  const on = { 'first-glue': 0, 'clamps-on': 5 * MINUTE };
  const off = { ...on, 'clamps-off': 60 * MINUTE };
  /** The lid is flattened when glue-lid is cured, and glued up when the clamps of glue-halves are off. */
  const cured = (entries: StandingEntry[], now: number) => status('flatten-lid', [...before, ...entries], now);
  const unclamped = (entries: StandingEntry[], now: number) =>
    status('glue-lid', [...done('choose-boards', 'rough-cut-seat', 'rip-seat', 'glue-halves'), ...entries], now);

  it('name the time when the clamps may come off, where that is enough', () => {
    const { state, locks } = unclamped(gluing('glue-halves', on), 10 * MINUTE);
    expect(state).toBe('waiting');
    expect(locks).toHaveLength(1);
    expect(locks[0]).toMatchObject({
      lock: 'cure',
      protects: 'person-or-tool',
      until: { earliest: 35 * MINUTE, latest: 65 * MINUTE },
      words: 'Not yet: step 10, Glue the lid in two halves, is in clamps till about 65 min.',
    });
  });

  it('do not open by time while the clamps are on: only a person takes them off', () => {
    expect(unclamped(gluing('glue-halves', on), 1e12).locks).toHaveLength(1);
    expect(unclamped(gluing('glue-halves', off), 61 * MINUTE).state).toBe('ready');
  });

  it('hold till the shortest clamp time where the clamps came off early', () => {
    const early = gluing('glue-halves', { ...on, 'clamps-off': 10 * MINUTE });
    expect(unclamped(early, 11 * MINUTE)).toMatchObject({
      state: 'waiting',
      locks: [{ until: { earliest: 35 * MINUTE } }],
    });
    expect(unclamped(early, 11 * MINUTE).locks[0]!.words).toContain('came off early');
    expect(unclamped(early, 35 * MINUTE).state).toBe('ready');
  });

  it('name the end of the cure where the joint must be cured, already from the clamps on', () => {
    const { state, locks } = cured(gluing('glue-lid', on), 10 * MINUTE);
    expect(state).toBe('waiting');
    expect(locks[0]!.until).toEqual({ earliest: (5 + CURE) * MINUTE, latest: (5 + CURE) * MINUTE });
    expect(locks[0]!.words).toContain(`in clamps till about 65 min, and cures till about ${5 + CURE} min`);
  });

  it('wait through the cure after the clamps came off', () => {
    expect(cured(gluing('glue-lid', off), 61 * MINUTE).locks[0]!.words).toContain('is curing till about');
    expect(cured(gluing('glue-lid', off), (5 + CURE) * MINUTE - 1).state).toBe('waiting');
    expect(cured(gluing('glue-lid', off), (5 + CURE) * MINUTE).state).toBe('ready');
  });

  it('do not open by time where no timer was started: nobody knows', () => {
    const { state, locks } = cured([], 1e12);
    expect(state).toBe('locked');
    expect(locks[0]).toMatchObject({ lock: 'cure', until: null, protects: 'person-or-tool' });
    expect(locks[0]!.words).toContain('No glue timer was started');
    expect(locks[0]!.danger).toBeTruthy();
  });

  it('wait for a person while the glue is open', () => {
    expect(cured(gluing('glue-lid', { 'first-glue': 0 }), 1e12)).toMatchObject({
      state: 'locked',
      locks: [{ until: null, words: 'Step 11, Glue the halves to the lid: the clamps are not on yet.' }],
    });
  });

  it('do not open because a timer was put away: the joint goes on curing', () => {
    const away = gluing('glue-lid', { ...off, 'put-away': 62 * MINUTE });
    expect(cured(away, 63 * MINUTE).state).toBe('waiting');
    expect(cured(away, (5 + CURE) * MINUTE).state).toBe('ready');
  });

  it('take a timer that was put away with no clamp on for no glue-up at all', () => {
    const nothing = gluing('glue-lid', { 'first-glue': 0, 'put-away': MINUTE }, { timerId: uuidOf(0x71) });
    expect(cured(nothing, 1e12).locks[0]!.words).toContain('No glue timer was started');
    expect(cured([...gluing('glue-lid', off), ...nothing], (5 + CURE) * MINUTE).state).toBe('ready');
  });

  it('hold for the furthest behind of several glue-ups of one step', () => {
    const second = gluing(
      'glue-lid',
      { 'first-glue': 90 * MINUTE, 'clamps-on': 95 * MINUTE },
      { timerId: uuidOf(0x71) },
    );
    for (const entries of [
      [...gluing('glue-lid', off), ...second],
      [...second, ...gluing('glue-lid', off)],
    ]) {
      expect(cured(entries, (5 + CURE) * MINUTE).locks[0]!.until!.earliest).toBe((95 + CURE) * MINUTE);
    }
  });

  it('never open where the glue went on colder than it may', () => {
    const cold = gluing('glue-lid', off, { temperatureC: 4 });
    expect(cured(cold, 1e12)).toMatchObject({ state: 'locked', locks: [{ lock: 'cure', until: null }] });
    expect(cured(cold, 1e12).locks[0]!.words).toContain('colder than its glue allows');
    const halves = gluing('glue-halves', off, { temperatureC: 4 });
    expect(unclamped(halves, 1e12).state).toBe('locked');
  });

  it('go by the label where the times of the glue are unknown', () => {
    const other = { ...plan, adhesives: plan.adhesives.map((each) => ({ ...each, adhesiveClass: 'fish' })) };
    const { state, locks } = status('flatten-lid', [...before, ...gluing('glue-lid', off)], 1e12, other);
    expect(state).toBe('locked');
    expect(locks[0]!.words).toContain('Go by the label');
  });

  it('let a skipped glue-up pass', () => {
    const skipped = entry('step-marked', { stepId: 'glue-lid' }, { mark: 'skipped', reason: 'one wide board' });
    expect(status('flatten-lid', [...before, skipped]).state).toBe('ready');
  });
});

describe('locks of metal', () => {
  const glued = [
    ...done('glue-frame'),
    ...gluing('glue-frame', { 'first-glue': 0, 'clamps-on': MINUTE, 'clamps-off': 90 * MINUTE }),
  ];
  const metal = (entries: StandingEntry[], of: PlanDocument = plan) =>
    status('rout-frame', entries, 1e9, of).locks.filter(({ lock }) => lock === 'metal');

  it('name the fasteners in the way of the router, once for a face, until they are out', () => {
    const locks = metal(glued);
    expect(locks).toHaveLength(1);
    expect(locks[0]).toMatchObject({ protects: 'person-or-tool', about: 'frame-back' });
    expect(locks[0]!.words).toMatch(
      /^Metal where the rabbet of the right panel and the rabbet of the left panel will be cut, on the back of the face frame: \d × 18 gauge brad, put in at step 34, .*\. Take them out first\.$/,
    );
    expect(metal([...glued, ...done('pull-brads')])).toEqual([]);
  });

  it('stay while taking them out was skipped', () => {
    const skipped = entry('step-marked', { stepId: 'pull-brads' }, { mark: 'skipped', reason: 'left in' });
    expect(metal([...glued, skipped])).toHaveLength(1);
  });

  it('say nothing of fasteners that are not in yet', () => {
    expect(metal([])).toEqual([]);
  });

  it('reach as far as the margin and as a leaning fastener goes, and no further', () => {
    const cut = {
      id: 'cut',
      step: 'rout-frame',
      name: 'the groove',
      x: 1000,
      y: 1000,
      length: 500,
      width: 500,
      depth: 10,
    };
    const brad = {
      id: 'brad',
      step: 'glue-frame',
      kind: 'brad',
      length: 200,
      x: 0,
      y: 1200,
      angleDeg: 0,
      temporary: true,
    };
    const face = plan.faces[0]!;
    const at = (x: number, angleDeg: number) =>
      metal(glued, {
        ...plan,
        faces: [{ ...face, cuts: [{ ...cut, margin: 100 }], fasteners: [{ ...brad, x, angleDeg }] }],
      }).length;
    expect([at(900, 0), at(899, 0), at(1600, 0), at(1601, 0)]).toEqual([1, 0, 1, 0]);
    // It leans by 30°, so its point is half its length, 100, further to one side or the other.
    expect([at(800, 30), at(799, 30)]).toEqual([1, 0]);
  });
});

describe('measure first', () => {
  const ready = done('measure-sheets', 'cut-frame-stock', 'measure-carcass');
  const size = (keySizeId: string, length: number | null, stockPiece: string | null = null) =>
    entry('key-size-set', { keySizeId, stockPiece }, { length });
  const waits = (entries: StandingEntry[]) =>
    status('cut-frame', [...ready, ...entries]).locks.map(({ lock, about }) => `${lock} ${about}`);

  it('parts whose size must be taken from the work are not cut before, and the size is named', () => {
    const { locks } = status('cut-frame', ready);
    expect(locks).toContainEqual({
      lock: 'measure-first',
      protects: 'order',
      about: 'body-measured',
      words: 'Measure Length of the glued carcass from the work first (step 26, Measure the glued carcass).',
    });
    expect(waits([size('body-measured', 680_000), size('ply-thickness', 11_684)])).toEqual([]);
  });

  it('comes back when a size is set back to the plan', () => {
    const entries = [size('body-measured', 680_000), size('ply-thickness', 11_684), size('body-measured', null)];
    expect(waits(entries)).toEqual(['measure-first body-measured']);
  });

  it('is content with one sheet measured, and not with a length of nothing', () => {
    expect(waits([size('body-measured', 680_000), size('ply-thickness', 11_684, 'sheet A')])).toEqual([]);
    expect(waits([size('body-measured', 0), size('ply-thickness', 11_684)])).toEqual(['measure-first body-measured']);
  });

  it('asks for nothing where a size worked out from it was set itself', () => {
    expect(waits([size('opening-width', 280_000), size('body-measured', 1), size('ply-thickness', 11_684)])).toEqual(
      [],
    );
  });
});

describe('locks of clearance', () => {
  const cleared = (clearances: string[] | undefined) =>
    stepStatuses(plan, foldEntries(done('measure-sheets', 'cut-sheet-down')), 0, { clearances })['rip-carcass']!.locks;

  it('hold only where a shop says who is cleared', () => {
    const locks = cleared(['Router']).filter(({ lock }) => lock === 'clearance');
    expect(locks).toMatchObject([{ protects: 'person-or-tool', about: 'Table saw' }]);
    expect(cleared(['Table saw']).some(({ lock }) => lock === 'clearance')).toBe(false);
    expect(cleared(undefined).some(({ lock }) => lock === 'clearance')).toBe(false);
  });
});
