import type { PlanDocument, PlanStep } from '../plan/document';
import { CURE_DANGER, cureLock } from './cure-lock';
import { CUTTING } from './cutting';
import { jointsByStep, type Joint } from './glue-timers';
import type { PassedLock } from './kinds';
import type { Lock, LockOptions } from './lock';
import { metalLocks } from './metal-lock';
import type { BuildState } from './state';
import { unmeasuredSizes } from './unmeasured-sizes';
import { measuredKeySizes, stepClaim, type StepMark } from './views';

export type { Lock, LockOptions } from './lock';
export { timerViews, windowsOf } from './glue-timers';

export interface StepStatus {
  stepId: string;
  mark: StepMark;
  /** `waiting` where only glue is in the way and time alone will open it; `locked` where somebody must act. */
  state: 'done' | 'skipped' | 'ready' | 'locked' | 'waiting';
  locks: Lock[];
  /** Set for done and skipped steps: who and when. */
  claim?: { accountId: string; madeAt: number; reason?: string; passedLocks: PassedLock[] };
}

/**
 * What stands in the way of each step. A skipped step counts as passed.
 *
 * @param now  ms since 1970
 */
export function stepStatuses(
  plan: PlanDocument,
  state: BuildState,
  now: number,
  options: LockOptions = {},
): Record<string, StepStatus> {
  const context = new LockContext(plan, state, now, options);
  const statuses: Record<string, StepStatus> = Object.create(null);
  for (const step of plan.steps) {
    const claim = stepClaim(state, step.id);
    const mark = claim?.value.mark ?? 'open';
    const locks = mark === 'open' ? context.locksOf(step) : [];
    const waits = locks.length > 0 && locks.every(({ lock, until }) => lock === 'cure' && until);
    statuses[step.id] = {
      stepId: step.id,
      mark,
      state: mark !== 'open' ? mark : locks.length === 0 ? 'ready' : waits ? 'waiting' : 'locked',
      locks,
      ...(claim && mark !== 'open'
        ? {
            claim: {
              accountId: claim.accountId,
              madeAt: claim.madeAt,
              reason: claim.value.reason,
              passedLocks: claim.value.passedLocks,
            },
          }
        : {}),
    };
  }
  return statuses;
}

class LockContext {
  private readonly names: ReadonlyMap<string, string>;
  private readonly joints: ReadonlyMap<string, Joint>;
  /** Part id to the key sizes that its own sizes wait for. */
  private readonly unmeasured: ReadonlyMap<string, readonly string[]>;
  private readonly cutting: ReadonlySet<string>;

  constructor(
    private readonly plan: PlanDocument,
    private readonly state: BuildState,
    private readonly now: number,
    private readonly options: LockOptions,
  ) {
    this.names = new Map(plan.steps.map(({ id, title }, i) => [id, `step ${i + 1}, ${title}`]));
    this.joints = jointsByStep(plan, state, now);
    this.unmeasured = unmeasuredSizes(plan, measuredKeySizes(state));
    this.cutting = new Set(plan.faces.flatMap(({ cuts }) => cuts.map(({ step }) => step)));
  }

  locksOf(step: PlanStep): Lock[] {
    const metal = this.cutting.has(step.id) ? metalLocks(this.plan, this.state, step.id, this.name) : [];
    return [...this.orderAndCure(step), ...metal, ...this.measureFirst(step), ...this.clearance(step)];
  }

  private readonly name = (stepId: string): string => this.names.get(stepId) ?? stepId;

  private orderAndCure(step: PlanStep): Lock[] {
    return step.after.flatMap((after): Lock[] => {
      const before = typeof after === 'string' ? after : after.step;
      const need = typeof after === 'string' ? undefined : after.glue;
      const mark = stepClaim(this.state, before)?.value.mark ?? 'open';
      if (mark === 'open') {
        const words = `Waits for ${this.name(before)}.`;
        return need
          ? [{ lock: 'order', protects: 'person-or-tool', about: before, words, danger: CURE_DANGER }]
          : [{ lock: 'order', protects: 'order', about: before, words }];
      }
      if (!need || mark === 'skipped') return [];
      const { now, options } = this;
      const cure = cureLock({
        before,
        name: this.name(before),
        need,
        joint: this.joints.get(before),
        now,
        formatTime: options.formatTime,
      });
      return cure ? [cure] : [];
    });
  }

  private measureFirst(step: PlanStep): Lock[] {
    if (!CUTTING.has(step.operation)) return [];
    const waits = new Set(step.uses.flatMap(({ part }) => this.unmeasured.get(part) ?? []));
    return this.plan.keySizes
      .filter(({ id, takeFromWork }) => waits.has(id) && takeFromWork && takeFromWork.step !== step.id)
      .map((size) => ({
        lock: 'measure-first',
        protects: 'order',
        about: size.id,
        words: `Measure ${size.name} from the work first (${this.name(size.takeFromWork!.step)}).`,
      }));
  }

  private clearance(step: PlanStep): Lock[] {
    const { clearances } = this.options;
    if (!step.clearance || !clearances || clearances.includes(step.clearance)) return [];
    return [
      {
        lock: 'clearance',
        protects: 'person-or-tool',
        about: step.clearance,
        words: `You are not cleared for the ${step.clearance} in this shop.`,
        danger: 'Ask the steward to clear you, or to stand by.',
      },
    ];
  }
}
