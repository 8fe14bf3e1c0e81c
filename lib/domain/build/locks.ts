import type { Length } from '../measure';
import { adhesiveOf } from '../plan/find';
import type { PlanDocument, PlanStep } from '../plan/document';
import { namesIn, parseFormula } from '../plan/formula/parse';
import { resolveKeySizes } from '../plan/key-sizes';
import { resolveParts } from '../plan/resolve-parts';
import { timerView, type TimerView } from '../glue/timer-view';
import { glueWindows } from '../glue/windows';
import type { PassedLock } from './kinds';
import type { BuildState } from './state';
import { measuredKeySizes, stepClaim, timersOf, type StepMark } from './views';

export interface Lock {
  lock: PassedLock['lock'];
  /** A lock of order can be passed with a departure; one that protects needs its own confirmation, named in the log. */
  protects: PassedLock['protects'];
  /** Step, face, key size or tool that it is about. */
  about: string;
  /** What it waits for, in words. */
  words: string;
  /** What can go wrong when it is passed; for locks that protect. */
  danger?: string;
  /** When time alone opens it, ms since 1970; null while a person must act first. */
  until?: { earliest: number; latest: number } | null;
}

export interface StepStatus {
  stepId: string;
  mark: StepMark;
  state: 'done' | 'skipped' | 'ready' | 'locked' | 'waiting';
  locks: Lock[];
  /** Set for done and skipped steps: who and when. */
  claim?: { accountId: string; madeAt: number; reason?: string; passedLocks: PassedLock[] };
}

export interface LockOptions {
  /** Clock time for the words, in the person's own way: "15:10". */
  formatTime?: (ms: number) => string;
  /** Tools that this person is cleared for in a shared shop; undefined where there is no shop to say so. */
  clearances?: readonly string[];
}

/**
 * What stands in the way of each step. `waiting` where only glue is in the way, `locked` where something else is.
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

/** Timers of a build as they stand, those of glue the plan does not know included, earliest first. */
export function timerViews(plan: PlanDocument, state: BuildState, now: number): TimerView[] {
  return timersOf(state).map((timer) => timerView(timer, windowsOf(plan, timer.stepId, timer.temperatureC), now));
}

/** Times of the glue of a step at a temperature of the wood. */
export function windowsOf(plan: PlanDocument, stepId: string, temperatureC: number | null) {
  const adhesive = adhesiveOf(plan, stepId);
  return adhesive
    ? glueWindows(adhesive, { temperatureC })
    : {
        known: false as const,
        adhesiveName: 'the glue',
        message: 'The plan names no glue for this step. Go by the label.',
      };
}

class LockContext {
  private readonly numbers: Map<string, number>;
  private readonly steps: Map<string, PlanStep>;
  private readonly timers: Map<string, TimerView>;
  private readonly measured: Record<string, Length>;
  /** Part id to the key sizes that its own sizes wait for. */
  private readonly unmeasured: Map<string, string[]>;

  constructor(
    private readonly plan: PlanDocument,
    private readonly state: BuildState,
    now: number,
    private readonly options: LockOptions,
  ) {
    this.numbers = new Map(plan.steps.map(({ id }, i) => [id, i + 1]));
    this.steps = new Map(plan.steps.map((step) => [step.id, step]));
    // The last timer of a step is the one in force: a glue-up done again starts anew.
    this.timers = new Map(timerViews(plan, state, now).map((view) => [view.stepId, view]));
    this.measured = measuredKeySizes(state);
    this.unmeasured = unmeasuredSizes(plan, this.measured);
  }

  locksOf(step: PlanStep): Lock[] {
    return [...this.orderAndCure(step), ...this.metal(step), ...this.measureFirst(step), ...this.clearance(step)];
  }

  private name(stepId: string): string {
    const step = this.steps.get(stepId);
    return step ? `step ${this.numbers.get(stepId)}, ${step.title}` : stepId;
  }

  private passed(stepId: string): boolean {
    return (stepClaim(this.state, stepId)?.value.mark ?? 'open') !== 'open';
  }

  private orderAndCure(step: PlanStep): Lock[] {
    return step.after.flatMap((after): Lock[] => {
      const before = typeof after === 'string' ? after : after.step;
      const glue = typeof after === 'string' ? undefined : after.glue;
      if (!this.passed(before)) {
        return [
          {
            lock: 'order',
            protects: glue ? 'person-or-tool' : 'order',
            about: before,
            words: `Waits for ${this.name(before)}.`,
            ...(glue ? { danger: CURE_DANGER } : {}),
          },
        ];
      }
      if (!glue || stepClaim(this.state, before)?.value.mark === 'skipped') return [];
      return this.cure(before, glue);
    });
  }

  private cure(before: string, need: 'clamps-off' | 'cured'): Lock[] {
    const base = { lock: 'cure', protects: 'person-or-tool', about: before, danger: CURE_DANGER } as const;
    const timer = this.timers.get(before);
    if (!timer) {
      return [
        { ...base, until: null, words: `No glue timer was started at ${this.name(before)}, so its cure is unknown.` },
      ];
    }
    if (timer.phase === 'put-away' || timer.phase === 'cured') return [];
    if (timer.phase === 'open')
      return [{ ...base, until: null, words: `${this.name(before)}: the clamps are not on yet.`.replace(/^s/, 'S') }];
    if (timer.phase === 'in-clamps') {
      return [
        { ...base, until: rangeOf(timer), words: `Not yet: ${this.name(before)} is in clamps${this.till(timer)}.` },
      ];
    }
    if (need === 'clamps-off') return [];
    return [{ ...base, until: rangeOf(timer), words: `Not yet: ${this.name(before)} is curing${this.till(timer)}.` }];
  }

  private till(timer: TimerView): string {
    const { formatTime } = this.options;
    return timer.latest !== null && formatTime ? ` till about ${formatTime(timer.latest)}` : '';
  }

  /** Fasteners that sit, or may sit, where this step cuts. */
  private metal(step: PlanStep): Lock[] {
    return this.plan.faces.flatMap((face) =>
      face.cuts
        .filter((cut) => cut.step === step.id)
        .flatMap((cut): Lock[] => {
          const inTheWay = face.fasteners.filter(
            (fastener) =>
              fastener.x >= cut.x - cut.margin &&
              fastener.x <= cut.x + cut.length + cut.margin &&
              fastener.y >= cut.y - cut.margin &&
              fastener.y <= cut.y + cut.width + cut.margin &&
              stepClaim(this.state, fastener.step)?.value.mark === 'done' &&
              !(fastener.removedIn && stepClaim(this.state, fastener.removedIn)?.value.mark === 'done'),
          );
          if (inTheWay.length === 0) return [];
          const count = inTheWay.length === 1 ? '1 fastener is' : `${inTheWay.length} fasteners are`;
          return [
            {
              lock: 'metal',
              protects: 'person-or-tool',
              about: face.id,
              words: `${count} where ${cut.name} will be cut, on ${face.name}. Take ${inTheWay.length === 1 ? 'it' : 'them'} out first.`,
              danger: 'A cutter that meets metal can break and throw pieces. The tool’s manual comes first.',
            },
          ];
        }),
    );
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

const CURE_DANGER = 'A joint put under stress before its glue has set can let go while you work on it.';

/** Operations that take a piece to its size. */
const CUTTING: ReadonlySet<string> = new Set(['rip', 'crosscut', 'sheet-cut']);

function rangeOf(timer: TimerView): { earliest: number; latest: number } | null {
  return timer.earliest !== null && timer.latest !== null ? { earliest: timer.earliest, latest: timer.latest } : null;
}

function unmeasuredSizes(plan: PlanDocument, measured: Record<string, Length>): Map<string, string[]> {
  const waits = new Map<string, string[]>();
  const resolved = resolveKeySizes(plan, measured);
  if (!resolved.ok) return waits;
  const roots = takeFromWorkRoots(plan);
  for (const part of resolveParts(plan, resolved.values)) {
    const open = part.uses.flatMap((id) => roots.get(id) ?? []).filter((id) => measured[id] === undefined);
    if (open.length > 0) waits.set(part.part.id, [...new Set(open)]);
  }
  return waits;
}

/** Key size id to the take-from-work sizes that it is, or is worked out from. */
function takeFromWorkRoots(plan: PlanDocument): Map<string, string[]> {
  const byId = new Map(plan.keySizes.map((size) => [size.id, size]));
  const roots = new Map<string, string[]>();
  const rootsOf = (id: string, depth: number): string[] => {
    const known = roots.get(id);
    if (known) return known;
    const size = byId.get(id);
    if (!size || depth > byId.size) return [];
    const found = size.takeFromWork
      ? [id]
      : size.formula
        ? namesIn(parseFormula(size.formula)).flatMap((name) => rootsOf(name, depth + 1))
        : [];
    const unique = [...new Set(found)];
    roots.set(id, unique);
    return unique;
  };
  for (const { id } of plan.keySizes) rootsOf(id, 0);
  return roots;
}
