'use client';
import { useRouter } from 'next/navigation';
import { useEffect } from 'react';

/** Asks the server for this page anew when the window is looked at again, and once a minute while it is. */
export function Refresh() {
  const router = useRouter();
  useEffect(() => {
    const look = () => {
      if (document.visibilityState === 'visible') router.refresh();
    };
    const timer = setInterval(look, 60_000);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', look);
    };
  }, [router]);
  return null;
}
