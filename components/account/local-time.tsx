'use client';
import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/**
 * A moment in the words and the zone of whoever looks; in UTC until scripts run, since the server knows neither.
 *
 * @param show  `time` where the day stands above it already
 */
export function LocalTime({ at, show = 'moment' }: { at: string; show?: 'moment' | 'time' }) {
  const words = useSyncExternalStore(
    never,
    () =>
      new Date(at).toLocaleString(undefined, {
        dateStyle: show === 'moment' ? 'medium' : undefined,
        timeStyle: 'short',
      }),
    () => `${at.slice(show === 'moment' ? 0 : 11, 16).replace('T', ' ')} UTC`,
  );
  return <time dateTime={at}>{words}</time>;
}
