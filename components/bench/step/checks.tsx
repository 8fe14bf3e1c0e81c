'use client';
import { useState } from 'react';
import { checkOf } from '@/lib/domain/build/views';
import type { PlanStep } from '@/lib/domain/plan/document';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { CheckForm } from './check-form';
import { verdictWords } from './check-words';

/** Checks of the step in boxes; a touch opens the one to take. */
export function Checks({ step }: { step: PlanStep }) {
  const { formatRead: format } = useBench();
  const { state, readOnly } = useBuild();
  const [open, setOpen] = useState<string | null>(null);
  if (step.checks.length === 0) return null;
  const taking = step.checks.find(({ id }) => id === open);
  return (
    <section aria-label="Checks" className="grid gap-3">
      <div className="grid grid-cols-[repeat(auto-fit,minmax(9rem,1fr))] gap-6">
        {step.checks.map((check) => {
          const value = checkOf(state, step.id, check.id)?.value;
          const colour = value?.verdict === 'within' ? 'text-green' : value?.verdict === 'outside' ? 'text-red' : '';
          return (
            <button
              key={check.id}
              type="button"
              disabled={readOnly}
              aria-expanded={open === check.id}
              onClick={() => setOpen(open === check.id ? null : check.id)}
              className={`min-h-[81px] rounded-plate border-2 bg-paper px-4 py-2.5 text-left active:bg-line ${
                open === check.id ? 'border-blue' : 'border-iron'
              }`}
            >
              <span className="block font-figures text-[1.0625rem] font-medium text-soft">{check.what}</span>
              <span className={`figures block text-[1.375rem] leading-tight font-semibold ${colour}`}>
                {value && value.readings.length > 0 && (
                  <>{value.readings.map((reading) => format(reading).text).join(' · ')}: </>
                )}
                {verdictWords(value)}
              </span>
            </button>
          );
        })}
      </div>
      {taking && <CheckForm key={taking.id} step={step} check={taking} onDone={() => setOpen(null)} />}
    </section>
  );
}
