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
    let got: WakeLockSentinel;
    try {
      got = await navigator.wakeLock.request('screen');
    } catch {
      return onChange(false);
    }
    // Not wanted any more, or asked for twice: one that nobody holds would keep the screen on for ever.
    if (!wanted || (lock && !lock.released)) return void got.release();
    lock = got;
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
