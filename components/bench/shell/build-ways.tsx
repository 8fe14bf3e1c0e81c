'use client';
import { useBenchAddress, type BenchView } from './address';
import { BenchLink } from './bench-link';

const WAYS: readonly { view: BenchView; word: string }[] = [
  { view: 'now', word: 'What now' },
  { view: 'steps', word: 'Steps' },
  { view: 'cuts', word: 'Cut list' },
  { view: 'timers', word: 'Timers' },
  { view: 'more', word: 'More' },
];

/** Ways about one build. */
export function BuildWays({ buildId }: { buildId: string }) {
  const { view: here } = useBenchAddress();
  return (
    <nav className="bench-foot" aria-label="This build">
      {WAYS.map(({ view, word }) => (
        <BenchLink
          key={view}
          to={{ buildId, view }}
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
