'use client';
import { clockTime } from '@/components/bench/entry/time-words';
import { badgeWords } from './sync-words';
import { useHeld } from './use-held';

/** What is still only on this phone, in words; opens what there is to say about sending. */
export function SyncBadge({ onOpen }: { onOpen: () => void }) {
  const { held, status, known } = useHeld();
  const needsYou =
    held.refused + held.refusedPhotos > 0 || (held.entries + held.photos > 0 && status.state === 'sign-in');
  return (
    <button
      type="button"
      onClick={onOpen}
      className={`flex items-center gap-2 px-2 font-figures text-[1.0625rem] font-medium whitespace-nowrap active:bg-line ${
        needsYou ? 'text-amber' : 'text-soft'
      }`}
    >
      <svg
        viewBox="0 0 18 18"
        width={17}
        height={17}
        fill="none"
        stroke="currentColor"
        strokeWidth={2}
        className="max-[400px]:hidden"
        aria-hidden="true"
      >
        <path d="M2 3h14v13H2zM2 8h14M6 1v4M12 1v4" />
      </svg>
      {known ? badgeWords(held, status, clockTime) : '…'}
    </button>
  );
}
