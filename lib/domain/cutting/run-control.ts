/** How a caller watches and ends a planning run. */
export interface RunControl<Plan> {
  /** Milliseconds that only go forward; the time limit is measured with it. */
  now?: () => number;
  /** Called with each better plan as it is found. */
  onProgress?: (best: Plan) => void;
  /** Asked often; true ends the run with the best plan so far. */
  shouldStop?: () => boolean;
}

/** True once the time limit has passed or the caller has asked to stop; asked between small pieces of work. */
export type TimeIsUp = () => boolean;

export function timeIsUp<Plan>(timeLimitMs: number, { now, shouldStop }: RunControl<Plan>): TimeIsUp {
  const clock = now ?? (() => performance.now());
  const end = clock() + timeLimitMs;
  let up = false;
  return () => (up ||= clock() >= end || shouldStop?.() === true);
}
