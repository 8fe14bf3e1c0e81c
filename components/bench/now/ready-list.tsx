'use client';
import { useState } from 'react';
import type { StepSuggestion } from '@/lib/domain/build/what-now';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { ActButton } from '../entry/act-button';
import { TrueFractions } from '../entry/true-fractions';
import { minutesWords } from '../entry/time-words';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';

const SHOWN_FIRST = 4;

/** What else can be done now, each with its reason and the time it takes. */
export function ReadyList({ suggestions }: { suggestions: readonly StepSuggestion[] }) {
  const { build, plan } = useBuild();
  const [all, setAll] = useState(false);
  if (suggestions.length === 0) return null;
  const shown = all ? suggestions : suggestions.slice(0, SHOWN_FIRST);
  return (
    <section aria-labelledby="ready">
      <h2 id="ready" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Or do now
      </h2>
      <ul>
        {shown.map(({ stepId, why, minutes }) => (
          <li key={stepId} className="border-b border-line">
            <BenchLink
              to={{ buildId: build.id, view: 'step', stepId }}
              className="grid min-h-[81px] grid-cols-[2.4rem_1fr_auto] items-center gap-x-2 py-2 active:bg-line"
            >
              <span className="figures text-[1.375rem] font-semibold">{stepNumber(plan, stepId)}</span>
              <span>
                <span className="block font-semibold leading-snug">
                  <TrueFractions text={findStep(plan, stepId)?.title ?? ''} />
                </span>
                <span className="block text-[1rem] text-soft">{why}</span>
              </span>
              <span className="figures text-[1.125rem]">{minutesWords(minutes)}</span>
            </BenchLink>
          </li>
        ))}
      </ul>
      {suggestions.length > SHOWN_FIRST && !all && (
        <ActButton className="mt-3 w-full" onClick={() => setAll(true)}>
          {suggestions.length - SHOWN_FIRST} more that are ready
        </ActButton>
      )}
    </section>
  );
}
