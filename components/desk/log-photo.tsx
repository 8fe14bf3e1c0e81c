'use client';
import { useState } from 'react';

/** A photo of the log. Entries go up before photos: one that is not here yet is said to be on its way. */
export function LogPhoto({ buildId, sha256, words }: { buildId: string; sha256: string; words: string }) {
  const [missing, setMissing] = useState(false);
  if (missing) {
    return (
      <p className="justify-self-start rounded-[3px] border-2 border-amber bg-amber-ground px-4 py-3 text-lg text-on-amber">
        This photo is not here yet: it is held on the phone that took it, and comes when that has a signal.
      </p>
    );
  }
  return (
    // The picture is private to the crew: the framework's optimiser, which keeps copies, has no part in it.
    // eslint-disable-next-line @next/next/no-img-element
    <img
      src={`/api/builds/${buildId}/photos/${sha256}`}
      alt={words}
      loading="lazy"
      onError={() => setMissing(true)}
      ref={(image) => {
        // It may have failed before scripts ran, when nobody listened.
        if (image?.complete && image.naturalWidth === 0) setMissing(true);
      }}
      className="max-h-80 max-w-full justify-self-start rounded-[3px] border border-line"
    />
  );
}
