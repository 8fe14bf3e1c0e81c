import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** False in the page as it comes from the server, true once scripts run it: a form is not pressed before it can act. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
