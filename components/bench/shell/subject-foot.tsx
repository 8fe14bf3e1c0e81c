'use client';
import { stepNumber } from '@/lib/domain/plan/find';
import { useBenchAddress, type BenchView } from './address';
import { BenchLink } from './bench-link';
import { useBuild } from './build-context';

const WAYS: readonly { view: BenchView; word: string }[] = [
  { view: 'photos', word: 'Photo' },
  { view: 'notes', word: 'Note' },
  { view: 'sizes', word: 'Measure' },
];

/** Foot of what is kept with a step: back to the step, and the other things that can be kept with it. */
export function SubjectFoot({ stepId }: { stepId: string }) {
  const { build, plan } = useBuild();
  const { view: here } = useBenchAddress();
  const look = 'flex items-center justify-center text-center font-figures text-[1.125rem] font-medium active:bg-line';
  return (
    <nav className="bench-foot" aria-label="This step">
      <BenchLink to={{ buildId: build.id, view: 'step', stepId }} className={look}>
        Step {stepNumber(plan, stepId)}
      </BenchLink>
      {WAYS.map(({ view, word }) => (
        <BenchLink
          key={view}
          to={{ buildId: build.id, view, stepId }}
          aria-current={view === here ? 'page' : undefined}
          className={`${look} ${view === here ? 'shadow-[inset_0_4px_0_var(--iron)]' : ''}`}
        >
          {word}
        </BenchLink>
      ))}
    </nav>
  );
}
