/** `unasked`: asking at a meaningful tap makes sense. */
export type NotifyState = 'allowed' | 'unasked' | 'denied' | 'absent';

export function notifyState(): NotifyState {
  if (typeof Notification === 'undefined') return 'absent';
  return Notification.permission === 'granted'
    ? 'allowed'
    : Notification.permission === 'denied'
      ? 'denied'
      : 'unasked';
}

/** Asks the person, in a tap of theirs. */
export async function askToNotify(): Promise<NotifyState> {
  if (typeof Notification !== 'undefined' && Notification.permission === 'default')
    await Notification.requestPermission();
  return notifyState();
}

/** Shows a notification that opens an address of the bench; false where it may not be shown. */
export async function notify({
  title,
  body,
  tag,
  address,
}: {
  title: string;
  body: string;
  tag: string;
  address: string;
}): Promise<boolean> {
  if (notifyState() !== 'allowed') return false;
  const registration = await navigator.serviceWorker?.getRegistration();
  if (!registration) return false;
  try {
    await registration.showNotification(title, { body, tag, data: { address }, icon: '/icon-192.png' });
    return true;
  } catch {
    // Forbidden between asking and showing; sound and flash of the page still tell.
    return false;
  }
}
