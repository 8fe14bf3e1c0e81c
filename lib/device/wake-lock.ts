/**
 * Keeps the screen on until the returned function is called; asks again when the page is shown again, since hiding it
 * ends the lock. A refusal (battery saver, old browser) is told and changes nothing else.
 *
 * @param onChange  told whether the screen is being kept on
 */
export function keepScreenOn(onChange: (on: boolean) => void): () => void {
  let lock: WakeLockSentinel | null = null;
  let wanted = true;
  const request = async () => {
    if (!wanted || document.visibilityState !== 'visible' || !('wakeLock' in navigator)) return onChange(false);
    try {
      lock = await navigator.wakeLock.request('screen');
    } catch {
      return onChange(false);
    }
    if (!wanted) return void lock.release();
    lock.addEventListener('release', () => onChange(false));
    onChange(true);
  };
  const shown = () => void request();
  document.addEventListener('visibilitychange', shown);
  void request();
  return () => {
    wanted = false;
    document.removeEventListener('visibilitychange', shown);
    void lock?.release();
  };
}
