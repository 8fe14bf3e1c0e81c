import { describe, expect, it } from 'vitest';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { applyEntries, foldEntries } from '@/lib/domain/build/fold';
import { whatNow } from '@/lib/domain/build/what-now';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { entry, uuidOf } from '../../support/log';
import { demoPlan } from '../../support/plans';

/**
 * The quickest of some runs, ms. The bounds below are a hundred times what it takes: they tell work that grows with the
 * square of the log from work that does not, and are no measure of speed.
 */
const quickest = (runs: number, work: () => unknown) =>
  Math.min(
    ...Array.from({ length: runs }, () => {
      const start = performance.now();
      work();
      return performance.now() - start;
    }),
  );

const plan = demoPlan('hall-bench');

/** A build of 10 000 entries: ticks, pieces, notes and timers over the steps of a plan. */
function longLog({ steps, parts }: PlanDocument): StandingEntry[] {
  return Array.from({ length: 10_000 }, (_, i): StandingEntry => {
    const beside = { id: uuidOf(i + 1), stamp: i, madeAt: i, position: i + 1 };
    const stepId = steps[i % steps.length]!.id;
    const item = uuidOf(0x9000 + i);
    switch (i % 4) {
      case 0:
        return entry('step-marked', { stepId }, { mark: i % 8 === 0 ? 'done' : 'open' }, beside);
      case 1: {
        const partId = parts[i % parts.length]!.id;
        return entry('piece-marked', { partId, piece: (i % 200) + 1 }, { mark: 'cut' }, beside);
      }
      case 2:
        return entry('note-written', { noteId: item }, { text: `note ${i}`, stepId }, beside);
      default:
        return i % 100 === 3
          ? entry('timer-marked', { timerId: item, event: 'first-glue' }, { stepId, at: i }, beside)
          : entry('entry-undone', { entryId: uuidOf(i % 500) }, { undone: i % 3 === 0 }, beside);
    }
  });
}

describe('the fold of 10 000 entries', () => {
  const state = foldEntries(longLog(plan));

  it('takes one more entry without folding the rest again, and shares what it does not touch', () => {
    const more = entry('step-marked', { stepId: 'rip-seat' }, { mark: 'open' }, { stamp: 20_000, position: 20_000 });
    const after = applyEntries(state, [more]);
    expect(after.notes).toBe(state.notes);
    expect(after.steps['glue-lid']).toBe(state.steps['glue-lid']);
    expect(quickest(20, () => applyEntries(state, [more]))).toBeLessThan(200);
    const note = entry('note-written', { noteId: uuidOf(0x80) }, { text: 'one more', stepId: null });
    expect(quickest(20, () => applyEntries(state, [note]))).toBeLessThan(1_000);
  });

  it('is quick for a register with thousands of claims that come in the wrong order', () => {
    const one = Array.from({ length: 3_000 }, (_, i) =>
      entry('step-marked', { stepId: 'a' }, { mark: 'done' }, { id: uuidOf(i + 1), stamp: 3_000 - i, position: i + 1 }),
    );
    expect(quickest(3, () => foldEntries(one))).toBeLessThan(20_000);
  });
});

describe('what now', () => {
  it('of 300 steps and 10 000 entries does not grow with their product', () => {
    const steps = Array.from({ length: 6 }, (_, round) =>
      plan.steps.map((step) => ({
        ...step,
        id: `${step.id}-${round}`,
        after: step.after.map((after) =>
          typeof after === 'string' ? `${after}-${round}` : { ...after, step: `${after.step}-${round}` },
        ),
      })),
    ).flat();
    const long = { ...plan, steps };
    const state = foldEntries(longLog(long));
    expect(steps).toHaveLength(300);
    expect(quickest(10, () => whatNow(long, state, 1e6))).toBeLessThan(2_000);
  });
});
