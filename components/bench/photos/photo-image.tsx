'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useEffect, useState } from 'react';
import { getPhoto } from '@/lib/store/queries/held';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

interface PhotoImageProps {
  sha256: string;
  alt: string;
  /** Cut to a square, for a row of several. */
  square?: boolean;
}

/** A photo from this phone, or from the server where another phone took it and there is a signal. */
export function PhotoImage({ sha256, alt, square = false }: PhotoImageProps) {
  const { db } = useBench();
  const { build } = useBuild();
  const row = useLiveQuery(async () => ({ photo: await getPhoto(db, build.id, sha256) }), [db, build.id, sha256]);
  const [absent, setAbsent] = useState(false);
  const src = usePhotoAddress(row?.photo, `/api/builds/${build.id}/photos/${sha256}`, row !== undefined);
  const shape = square ? 'aspect-square object-cover' : 'max-h-[70dvh] object-contain';
  if (absent) {
    return (
      <span className="flex min-h-24 items-center justify-center border-2 border-line bg-paper p-3 text-center text-[1rem] text-soft">
        This photo is on another phone; it comes with the next signal.
      </span>
    );
  }
  return (
    // A picture from this phone's own storage: there is nothing for an image service to make smaller.
    // eslint-disable-next-line @next/next/no-img-element
    <img
      src={src ?? undefined}
      alt={alt}
      onError={() => src && setAbsent(true)}
      className={`w-full border-2 border-iron bg-paper ${shape}`}
    />
  );
}

function usePhotoAddress(
  photo: { bytes: ArrayBuffer; mediaType: string } | undefined,
  elsewhere: string,
  known: boolean,
): string | null {
  const [here, setHere] = useState<string | null>(null);
  const bytes = photo?.bytes;
  const mediaType = photo?.mediaType;
  useEffect(() => {
    if (!bytes) return;
    const address = URL.createObjectURL(new Blob([bytes], { type: mediaType }));
    // The address can only be made here, beside its release.
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setHere(address);
    return () => URL.revokeObjectURL(address);
  }, [bytes, mediaType]);
  if (!known) return null;
  return bytes ? here : elsewhere;
}
