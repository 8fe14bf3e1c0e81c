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

/** Longest wait for the program to be stored whole, ms: it is about 2 MB. */
const SHELL_LIMIT_MS = 30_000;

/** Whether this page's own program is on the phone whole, so that it opens with no signal; waits a while for it. */
export async function shellIsReady(): Promise<boolean> {
  // In development nothing is stored, on purpose.
  if (process.env.NODE_ENV !== 'production') return true;
  if (!('serviceWorker' in navigator)) return false;
  const limit = new Promise<null>((resolve) => setTimeout(() => resolve(null), SHELL_LIMIT_MS));
  const registration = await Promise.race([navigator.serviceWorker.ready, limit]);
  return registration?.active !== null && registration !== null;
}
