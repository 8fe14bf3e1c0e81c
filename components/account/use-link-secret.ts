import { useSyncExternalStore } from 'react';

function watchHash(changed: () => void): () => void {
  window.addEventListener('hashchange', changed);
  return () => window.removeEventListener('hashchange', changed);
}

/**
 * The secret of the link by which this page was opened. It stands after the `#`, which browsers send to no server, so it
 * gets into no log. Undefined until scripts run, null when the link carries none.
 */
export function useLinkSecret(): string | null | undefined {
  return useSyncExternalStore(
    watchHash,
    () => new URLSearchParams(window.location.hash.slice(1)).get('token'),
    () => undefined,
  );
}
