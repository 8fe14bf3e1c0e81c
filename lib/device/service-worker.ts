/**
 * Registers the service worker and tells when a newer version waits. It takes over only when the returned function is
 * called, then the page loads anew, so that chunks of two versions never meet.
 *
 * @param onWaiting  called with a function that lets the new version take over
 */
export async function registerServiceWorker(onWaiting: (takeOver: () => void) => void): Promise<void> {
  if (process.env.NODE_ENV !== 'production' || !('serviceWorker' in navigator)) return;
  const registration = await navigator.serviceWorker.register('/sw.js', { updateViaCache: 'none' });
  let asked = false;
  navigator.serviceWorker.addEventListener('controllerchange', () => {
    if (asked) location.reload();
  });
  const tell = () => {
    if (!registration.waiting || !navigator.serviceWorker.controller) return;
    onWaiting(() => {
      asked = true;
      // Read afresh: a still newer version may have come meanwhile.
      registration.waiting?.postMessage({ type: 'take-over' });
    });
  };
  registration.addEventListener('updatefound', () => {
    registration.installing?.addEventListener('statechange', tell);
  });
  tell();
}

/** Resolves when this page's program is on the phone whole and works with no signal; false where that cannot be. */
export async function shellIsReady(): Promise<boolean> {
  if (!('serviceWorker' in navigator) || process.env.NODE_ENV !== 'production') return false;
  const registration = await navigator.serviceWorker.ready;
  return registration.active !== null;
}
