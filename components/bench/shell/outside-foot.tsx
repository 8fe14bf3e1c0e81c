'use client';
import { useBenchAddress, type BenchView } from './address';
import { BenchLink } from './bench-link';

const WAYS: readonly { view: BenchView; word: string }[] = [
  { view: 'builds', word: 'Builds' },
  { view: 'take', word: 'Take one here' },
  { view: 'sync', word: 'Sending' },
  { view: 'settings', word: 'Settings' },
];

/** Ways about the bench where no build is open. */
export function OutsideFoot() {
  const { view: here } = useBenchAddress();
  return (
    <nav className="bench-foot" aria-label="Bench">
      {WAYS.map(({ view, word }) => (
        <BenchLink
          key={view}
          to={{ view }}
          aria-current={view === here ? 'page' : undefined}
          className={`flex items-center justify-center text-center font-figures text-[1.125rem] font-medium active:bg-line ${
            view === here ? 'shadow-[inset_0_4px_0_var(--iron)]' : ''
          }`}
        >
          {word}
        </BenchLink>
      ))}
    </nav>
  );
}
