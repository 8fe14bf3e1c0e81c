'use client';
import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** A moment in the words and the zone of whoever looks; in UTC until scripts run, since the server knows neither. */
export function LocalTime({ at }: { at: string }) {
  const words = useSyncExternalStore(
    never,
    () => new Date(at).toLocaleString(undefined, { dateStyle: 'medium', timeStyle: 'short' }),
    () => `${at.slice(0, 16).replace('T', ' ')} UTC`,
  );
  return <time dateTime={at}>{words}</time>;
}
