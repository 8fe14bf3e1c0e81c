import type { PlanDocument, PlanFace } from '../plan/document';
import type { Lock } from './lock';
import type { BuildState } from './state';
import { stepClaim } from './views';

type Fastener = PlanFace['fasteners'][number];
type Cut = PlanFace['cuts'][number];

/**
 * Locks of metal in the way of a step's cuts, one for each face: fasteners that the log says are in, and not out again,
 * inside the keep-clear zone of a cut with its margin.
 *
 * A fastener that leans reaches length × sin(angle) from its head, to whichever side: the plan does not say which, so
 * any side counts. How thick it is does not; the margin is for that.
 *
 * @param nameOf  a step as people say it: "step 34, Glue up the face frame"
 */
export function metalLocks(
  plan: PlanDocument,
  state: BuildState,
  stepId: string,
  nameOf: (stepId: string) => string,
): Lock[] {
  return plan.faces.flatMap((face): Lock[] => {
    const cuts = face.cuts.filter(({ step }) => step === stepId);
    const hit = cuts.filter((cut) => face.fasteners.some((fastener) => isIn(state, fastener) && meets(fastener, cut)));
    if (hit.length === 0) return [];
    const inTheWay = face.fasteners.filter(
      (fastener) => isIn(state, fastener) && hit.some((cut) => meets(fastener, cut)),
    );
    const one = inTheWay.length === 1;
    return [
      {
        lock: 'metal',
        protects: 'person-or-tool',
        about: face.id,
        words: `Metal where ${list(hit.map(({ name }) => name))} will be cut, on ${face.name}: ${named(inTheWay, nameOf)}. Take ${one ? 'it' : 'them'} out first.`,
        danger: 'A cutter that meets metal can break and throw pieces. The tool’s manual comes first.',
      },
    ];
  });
}

function isIn(state: BuildState, { step, removedIn }: Fastener): boolean {
  const isDone = (id: string) => stepClaim(state, id)?.value.mark === 'done';
  return isDone(step) && !(removedIn && isDone(removedIn));
}

function meets({ x, y, length, angleDeg }: Fastener, cut: Cut): boolean {
  const clear = cut.margin + Math.ceil(length * Math.sin((angleDeg * Math.PI) / 180));
  return x >= cut.x - clear && x <= cut.x + cut.length + clear && y >= cut.y - clear && y <= cut.y + cut.width + clear;
}

/** "6 of 18 gauge brad, put in at step 34, Glue up the face frame" */
function named(fasteners: readonly Fastener[], nameOf: (stepId: string) => string): string {
  const counts = new Map<string, number>();
  for (const { kind, step } of fasteners) {
    const words = `${kind}, put in at ${nameOf(step)}`;
    counts.set(words, (counts.get(words) ?? 0) + 1);
  }
  return [...counts].map(([words, count]) => `${count} × ${words}`).join('; ');
}

function list(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)!}`;
}
