'use client';
import { useEffect, useState } from 'react';
import { askToPersist, storageHealth, type StorageHealth } from '@/lib/device/storage-health';
import { ActButton } from '../entry/act-button';
import { byteWords } from '../builds/pack-words';

/** What the browser says about keeping this phone's records; asked for, shown, and not promised. */
export function StorageAnswer() {
  const [health, setHealth] = useState<StorageHealth | null>(null);
  const [asked, setAsked] = useState(false);
  useEffect(() => {
    let wanted = true;
    void storageHealth().then((got) => wanted && setHealth(got));
    return () => {
      wanted = false;
    };
  }, [asked]);
  if (!health) return null;
  return (
    <section aria-labelledby="storage" className="grid gap-3">
      <h2 id="storage" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Storage
      </h2>
      <p>
        {health.persistent === true && 'This browser has said that it will not clear Holdfast’s records by itself.'}
        {health.persistent === false &&
          'This browser may clear Holdfast’s records when the phone runs short. What was sent is safe; the rest is only here.'}
        {health.persistent === null && 'This browser does not say whether it keeps Holdfast’s records.'}
        {health.freeBytes !== null && ` About ${byteWords(health.freeBytes)} are free for it.`}
      </p>
      {health.persistent === false && (
        <ActButton onClick={() => void askToPersist().then(() => setAsked(true))}>Ask it to keep them</ActButton>
      )}
      {asked && health.persistent === false && (
        <p className="text-soft">It said no for now. It may say yes when Holdfast is installed or used for a while.</p>
      )}
    </section>
  );
}
