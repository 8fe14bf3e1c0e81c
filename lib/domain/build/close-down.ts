import type { PlanDocument } from '../plan/document';
import { findStep, stepNumber } from '../plan/find';
import { timerViews } from './locks';
import type { BuildState } from './state';
import { photosOf, sessionsOf, stepClaim } from './views';
import { whatNow } from './what-now';

export interface CloseDownItem {
  id: string;
  kind: 'in-clamps' | 'rags' | 'photo' | 'unplug' | 'sharp' | 'sweep';
  /** `danger` can hurt if it is left. */
  level: 'danger' | 'care';
  words: string;
}

export interface CloseDown {
  items: CloseDownItem[];
  /** What is in clamps or curing, and until when. */
  curing: { timerId: string; words: string; earliest: number | null; latest: number | null }[];
  /** Title of what comes first next time, as the program would have it; a person may write their own. */
  firstNext: string;
  /** The open session, or null when none was opened. */
  session: { sessionId: string; openedAt: number } | null;
  minutes: number;
}

/** What to see to before leaving: one tap each. `now` in ms since 1970. */
export function closeDown(plan: PlanDocument, state: BuildState, now: number): CloseDown {
  const open = sessionsOf(state).findLast(({ openedAt, closedAt }) => openedAt !== null && closedAt === null);
  const since = open?.openedAt ?? now - 12 * 3_600_000;
  const doneNow = plan.steps.filter((step) => {
    const claim = stepClaim(state, step.id);
    return claim?.value.mark === 'done' && claim.madeAt >= since;
  });
  const timers = timerViews(plan, state, now).filter(({ phase }) => ['open', 'in-clamps', 'curing'].includes(phase));
  const items: CloseDownItem[] = [];
  for (const timer of timers) {
    const step = findStep(plan, timer.stepId);
    if (timer.phase !== 'in-clamps' || !step) continue;
    items.push({
      id: `clamps-${timer.timerId}`,
      kind: 'in-clamps',
      level: 'care',
      words: `${step.glueUp?.name ?? step.title} stays in clamps. Stand it where nobody knocks it.`,
    });
  }
  if (doneNow.some((step) => step.finish?.oilyRags)) {
    items.push({
      id: 'rags',
      kind: 'rags',
      level: 'danger',
      words:
        'Oily rags: lay them flat outdoors to dry, or put them in water in a closed metal can. Left in a heap they can catch fire by themselves. The product’s label comes first.',
    });
  }
  for (const step of plan.steps) {
    if (stepClaim(state, step.id)?.value.mark !== 'done') continue;
    for (const wanted of step.photosWanted) {
      if (photosOf(state).some(({ value }) => value.wantedId === wanted.id)) continue;
      items.push({
        id: `photo-${wanted.id}`,
        kind: 'photo',
        level: 'care',
        words: `No photo yet of ${wanted.of} (step ${stepNumber(plan, step.id)}).`,
      });
    }
  }
  items.push(
    {
      id: 'unplug',
      kind: 'unplug',
      level: 'danger',
      words: 'Machines unplugged, batteries out of tools and off the charger.',
    },
    { id: 'sharp', kind: 'sharp', level: 'danger', words: 'Blades, chisels and cutters put away, edges covered.' },
    {
      id: 'sweep',
      kind: 'sweep',
      level: 'care',
      words: 'Floor swept, so that nobody slips and the dust does not come along indoors.',
    },
  );
  const next = whatNow(plan, state, now);
  return {
    items,
    curing: timers.map(({ timerId, stepId, earliest, latest }) => ({
      timerId,
      words: findStep(plan, stepId)?.glueUp?.name ?? findStep(plan, stepId)?.title ?? 'A glue-up',
      earliest,
      latest,
    })),
    firstNext: next.here ? (findStep(plan, next.here)?.title ?? '') : '',
    session: open ? { sessionId: open.sessionId, openedAt: open.openedAt! } : null,
    minutes: open ? Math.max(0, Math.round((now - open.openedAt!) / 60_000)) : 0,
  };
}
