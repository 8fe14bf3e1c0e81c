'use client';
import { useEffect } from 'react';

/** At the desk, ends a sign-in that was left at the bench with no signal, before the next person goes on in its name. */
export function OwedSignOut() {
  useEffect(() => {
    const end = async () => {
      const { endOwedSignOut } = await import('./sign-in-out');
      // A whole load, so that nothing of the account stays in the page.
      if ((await endOwedSignOut()) === 'ended') window.location.assign(new URL('/sign-in', window.location.href));
    };
    end().catch((error: unknown) => console.error(error));
  }, []);
  return null;
}
