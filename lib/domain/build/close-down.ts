import type { PlanDocument } from '../plan/document';
import { findStep, stepNumber } from '../plan/find';
import { timerViews } from './locks';
import type { BuildState } from './state';
import { openMinutes } from './session-minutes';
import { photosOf, sessionsOf, stepClaim } from './views';
import { whatNow } from './what-now';

export interface CloseDownItem {
  id: string;
  kind: 'open-glue' | 'in-clamps' | 'rags' | 'photo' | 'unplug' | 'sharp' | 'sweep';
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
  /** Minutes of the open session; 0 without one. */
  minutes: number;
}

/** What to see to before leaving: one tap each. `now` in ms since 1970. */
export function closeDown(plan: PlanDocument, state: BuildState, now: number): CloseDown {
  const sessions = sessionsOf(state).filter(({ openedAt, closedAt }) => openedAt !== null && closedAt === null);
  const open = sessions.at(-1);
  // Two phones may each have opened one; what was oiled in either lies about.
  const since = sessions[0]?.openedAt ?? now - 12 * 3_600_000;
  const doneNow = plan.steps.filter((step) => {
    const claim = stepClaim(state, step.id);
    // By either clock: a phone whose clock is behind must not hide the rags.
    return claim?.value.mark === 'done' && Math.max(claim.madeAt, claim.stamp) >= since;
  });
  const photos = new Set(photosOf(state).map(({ value }) => value.wantedId));
  const timers = timerViews(plan, state, now).filter(({ phase }) => ['open', 'in-clamps', 'curing'].includes(phase));
  const items: CloseDownItem[] = [];
  for (const timer of timers) {
    const name = nameOf(plan, timer.stepId);
    if (timer.phase === 'open') {
      items.push({
        id: `open-${timer.timerId}`,
        kind: 'open-glue',
        level: 'care',
        words: `${name}: the glue is on and no clamps are. Close the joint, or put its timer away if nothing was glued.`,
      });
    } else if (timer.phase === 'in-clamps') {
      items.push({
        id: `clamps-${timer.timerId}`,
        kind: 'in-clamps',
        level: 'care',
        words: `${name} stays in clamps. Stand it where nobody knocks it.`,
      });
    }
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
      if (photos.has(wanted.id)) continue;
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
      words: nameOf(plan, stepId),
      earliest,
      latest,
    })),
    firstNext: next.here ? (findStep(plan, next.here)?.title ?? '') : '',
    session: open ? { sessionId: open.sessionId, openedAt: open.openedAt! } : null,
    minutes: open ? openMinutes(state, open.openedAt!, now) : 0,
  };
}

function nameOf(plan: PlanDocument, stepId: string): string {
  const step = findStep(plan, stepId);
  return step?.glueUp?.name ?? step?.title ?? 'A glue-up';
}
