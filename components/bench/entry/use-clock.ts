'use client';
import { useCallback, useSyncExternalStore } from 'react';

/**
 * The phone's clock, rounded down to `stepMs`, so that a screen draws itself anew only when that changes. Read afresh on
 * each look and when the page comes back, never counted: hidden pages are throttled or frozen.
 */
export function useClock(stepMs: number): number {
  const subscribe = useCallback(
    (changed: () => void) => {
      const timer = setInterval(changed, Math.min(1000, stepMs / 4));
      document.addEventListener('visibilitychange', changed);
      window.addEventListener('pageshow', changed);
      return () => {
        clearInterval(timer);
        document.removeEventListener('visibilitychange', changed);
        window.removeEventListener('pageshow', changed);
      };
    },
    [stepMs],
  );
  const read = useCallback(() => Math.floor(Date.now() / stepMs) * stepMs, [stepMs]);
  return useSyncExternalStore(subscribe, read, () => 0);
}
