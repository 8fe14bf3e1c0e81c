import type { PlanDocument } from '../plan/document';
import type { BuildState } from './state';
import { openMinutes } from './session-minutes';
import { pieceMark, sessionsOf, stepMark } from './views';

export interface Progress {
  stepsDone: number;
  stepsSkipped: number;
  stepsInAll: number;
  piecesCut: number;
  piecesInAll: number;
  /** Minutes of closed sessions, and of open ones as {@link openMinutes} counts them. */
  minutesWorked: number;
  /** Hands-on minutes of the steps still open, from the quickest to the slowest builder. */
  minutesLeft: { min: number; max: number };
  byStage: { stageId: string; name: string; done: number; skipped: number; inAll: number }[];
}

/** How far a build is. `now` in ms since 1970 counts the open session. */
export function progressOf(plan: PlanDocument, state: BuildState, now: number): Progress {
  const marks = plan.steps.map((step) => ({ step, mark: stepMark(state, step.id) }));
  const count = (mark: string, rows = marks) => rows.filter((row) => row.mark === mark).length;
  const cutParts = plan.parts.filter((part) => !part.madeFrom);
  const left = marks.filter(({ mark }) => mark === 'open').map(({ step }) => step.minutes);
  const sum = (values: number[]) => values.reduce((a, b) => a + b, 0);
  return {
    stepsDone: count('done'),
    stepsSkipped: count('skipped'),
    stepsInAll: marks.length,
    piecesCut: sum(
      cutParts.map((part) => pieceNumbers(part.quantity).filter((n) => pieceMark(state, part.id, n) === 'cut').length),
    ),
    piecesInAll: sum(cutParts.map(({ quantity }) => quantity)),
    minutesWorked: sum(
      sessionsOf(state).map(
        ({ openedAt, minutes }) => minutes ?? (openedAt === null ? 0 : openMinutes(state, openedAt, now)),
      ),
    ),
    minutesLeft: { min: sum(left.map(({ min }) => min)), max: sum(left.map(({ max }) => max)) },
    byStage: plan.stages.map(({ id, name }) => {
      const rows = marks.filter(({ step }) => step.stage === id);
      return { stageId: id, name, done: count('done', rows), skipped: count('skipped', rows), inAll: rows.length };
    }),
  };
}

/** 1 to `quantity`. */
export function pieceNumbers(quantity: number): number[] {
  return Array.from({ length: quantity }, (_, i) => i + 1);
}
