'use client';
import { useQueryClient } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { useHydrated } from '@/components/account/use-hydrated';
import { Notice } from '@/components/ui/notice';
import { controlLook } from '@/components/ui/field';
import type { PlanProblem } from '@/lib/domain/plan/plan-problem';
import { sendPlanFile, type ImportAnswer } from './send-plan-file';

type State =
  { is: 'waiting' } | { is: 'sending'; name: string } | { is: 'answered'; name: string; answer: ImportAnswer };

/** Brings a plan in from its file; what is wrong with it is named by place and by what was expected. */
export function ImportPlan() {
  const id = useId();
  const queries = useQueryClient();
  // A file chosen before scripts run would be lost without a word.
  const hydrated = useHydrated();
  const [state, setState] = useState<State>({ is: 'waiting' });

  async function bring(file: File | undefined) {
    if (!file) return;
    setState({ is: 'sending', name: file.name });
    const answer = await sendPlanFile(file);
    setState({ is: 'answered', name: file.name, answer });
    if (answer.ok) await queries.invalidateQueries({ queryKey: ['plans'] });
  }

  return (
    <section aria-labelledby={`${id}-title`} className="grid max-w-2xl gap-3 border-t-2 border-iron py-6">
      <h2 id={`${id}-title`} className="text-2xl">
        Bring a plan in
      </h2>
      <label htmlFor={id} className="text-lg">
        A plan file (.json)
      </label>
      <input
        id={id}
        type="file"
        accept="application/json,.json"
        className={controlLook}
        disabled={!hydrated || state.is === 'sending'}
        onChange={(event) => {
          const { files } = event.currentTarget;
          void bring(files?.[0]).finally(() => {
            event.target.value = '';
          });
        }}
      />
      <div aria-live="polite" className="grid gap-3">
        {state.is === 'sending' && <p className="text-lg">Reading {state.name} …</p>}
        {state.is === 'answered' && <Outcome name={state.name} answer={state.answer} />}
      </div>
    </section>
  );
}

function Outcome({ name, answer }: { name: string; answer: ImportAnswer }) {
  if (answer.ok) {
    return (
      <Notice tone="done" title={`${name} is in.`}>
        {answer.value.isNew
          ? `It is revision ${answer.value.number}.`
          : 'This very revision was here already; nothing changed.'}
      </Notice>
    );
  }
  return (
    <Notice tone="danger" title="Not taken in.">
      {answer.detail}
      {answer.problems.length > 0 && <Problems problems={answer.problems} />}
    </Notice>
  );
}

function Problems({ problems }: { problems: PlanProblem[] }) {
  return (
    <ul className="mt-3 grid gap-3">
      {problems.map(({ path, expected, message }, i) => (
        <li key={`${path}-${i}`} className="grid">
          <code className="font-figures text-lg font-semibold break-all">{path || 'the whole file'}</code>
          <span>
            {message} Expected: {expected}.
          </span>
        </li>
      ))}
    </ul>
  );
}
