/** A difference that no drift explains, ms. */
const JUMP_MS = 90_000;

export interface ClockJump {
  /** Wall clock now minus where it should be, ms. */
  byMs: number;
}

/**
 * Compares the wall clock with the time since the page began while the page is visible, and tells when they part: the
 * clock was set, or the phone slept. Either may be at fault, so it is only told.
 *
 * @returns a function that ends the watch
 */
export function watchClock(onJump: (jump: ClockJump) => void, everyMs = 5_000): () => void {
  let wall = Date.now();
  let steady = performance.now();
  const mark = () => {
    wall = Date.now();
    steady = performance.now();
  };
  const timer = setInterval(() => {
    if (document.visibilityState !== 'visible') return mark();
    const byMs = Date.now() - wall - (performance.now() - steady);
    if (Math.abs(byMs) >= JUMP_MS) {
      onJump({ byMs });
    }
    mark();
  }, everyMs);
  document.addEventListener('visibilitychange', mark);
  return () => {
    clearInterval(timer);
    document.removeEventListener('visibilitychange', mark);
  };
}
