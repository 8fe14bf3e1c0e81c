'use client';
import { useEffect, useState } from 'react';

/** The time, told anew every half minute; the server's until then, so that both draw the same first. */
export function useNow(first: number): number {
  const [now, setNow] = useState(first);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 30_000);
    return () => clearInterval(timer);
  }, []);
  return now;
}
