'use client';
import { useSyncExternalStore } from 'react';

const WIDE = '(min-width: 900px) and (min-height: 521px)';

function subscribe(changed: () => void): () => void {
  const query = window.matchMedia(WIDE);
  query.addEventListener('change', changed);
  return () => query.removeEventListener('change', changed);
}

/** Whether there is room for a column beside the text: a tablet on its side, a desk's screen. */
export function useWide(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(WIDE).matches,
    () => false,
  );
}
