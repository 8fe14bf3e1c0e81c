'use client';
import { useBenchAddress, type BenchView } from './address';
import { BuildWays } from './build-ways';
import { BenchLink } from './bench-link';

const WAYS: readonly { view: BenchView; word: string }[] = [
  { view: 'builds', word: 'Builds' },
  { view: 'take', word: 'Take one here' },
  { view: 'sync', word: 'Sending' },
  { view: 'settings', word: 'Settings' },
];

/** Ways about the bench where no build is open; the build's own where one was left for a moment. */
export function OutsideFoot() {
  const { view: here, buildId } = useBenchAddress();
  if (buildId) return <BuildWays buildId={buildId} />;
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
