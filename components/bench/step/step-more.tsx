'use client';
import { useState } from 'react';
import type { StepStatus } from '@/lib/domain/build/locks';
import { touchesOf } from '@/lib/domain/build/touches';
import type { PlanStep } from '@/lib/domain/plan/document';
import { findPart, stepNumber } from '@/lib/domain/plan/find';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

/** What else can be done with a step: skip it with a reason, take the tick back, do it again, depart from the plan. */
export function StepMore({ step, status }: { step: PlanStep; status: StepStatus }) {
  const { build, plan } = useBuild();
  const { act } = useActs();
  const [form, setForm] = useState<'skip' | 'departure' | null>(null);
  const number = stepNumber(plan, step.id);

  const open = (said: string, reason?: string) =>
    void act(said, (acts, db) => acts.markStep(db, { buildId: build.id, stepId: step.id, mark: 'open', reason }));

  return (
    <section aria-label="More with this step" className="grid gap-6 border-t-2 border-iron pt-4">
      <div className="grid grid-cols-2 gap-6">
        {status.mark === 'open' ? (
          <ActButton aria-expanded={form === 'skip'} onClick={() => setForm(form === 'skip' ? null : 'skip')}>
            Skip it
          </ActButton>
        ) : (
          <ActButton
            onClick={() =>
              status.mark === 'done'
                ? open(`Step ${number} opened to be done again`, 'To be done again')
                : open(`Step ${number} opened again`)
            }
          >
            {status.mark === 'done' ? 'Do it again' : 'Open it again'}
          </ActButton>
        )}
        <ActButton
          aria-expanded={form === 'departure'}
          onClick={() => setForm(form === 'departure' ? null : 'departure')}
        >
          Change from the plan
        </ActButton>
        {status.mark === 'done' && (
          <ActButton onClick={() => open(`Step ${number}: tick taken back`)}>Take the tick back</ActButton>
        )}
      </div>
      {form === 'skip' && <SkipForm step={step} onDone={() => setForm(null)} />}
      {form === 'departure' && <DepartureForm step={step} onDone={() => setForm(null)} />}
    </section>
  );
}

function SkipForm({ step, onDone }: { step: PlanStep; onDone: () => void }) {
  const { build, plan } = useBuild();
  const { act } = useActs();
  const why = useDraft(`skip/${build.id}/${step.id}`);
  const [asked, setAsked] = useState(false);
  const reason = why.text.trim();

  async function skip() {
    setAsked(true);
    if (reason === '') return;
    const saved = await act(`Step ${stepNumber(plan, step.id)} skipped`, (acts, db) =>
      acts.markStep(db, { buildId: build.id, stepId: step.id, mark: 'skipped', reason }),
    );
    if (!saved) return;
    why.clear();
    onDone();
  }

  return (
    <div className="grid gap-3 rounded-plate border-2 border-iron bg-paper p-4">
      <Field label="Why is it skipped" error={asked && reason === '' ? 'Say in a few words why.' : undefined}>
        <textarea rows={2} maxLength={1000} value={why.text} onChange={(event) => why.setText(event.target.value)} />
      </Field>
      <ActButton onClick={() => void skip()}>Skip this step</ActButton>
    </div>
  );
}

function DepartureForm({ step, onDone }: { step: PlanStep; onDone: () => void }) {
  const { build, plan } = useBuild();
  const { act } = useActs();
  const what = useDraft(`departure/${build.id}/${step.id}`);
  const why = useDraft(`departure-why/${build.id}/${step.id}`);
  const [asked, setAsked] = useState(false);
  const touches = touchesOf(plan, { stepId: step.id, partIds: step.uses.map(({ part }) => part) });

  async function keep() {
    setAsked(true);
    if (what.text.trim() === '') return;
    const saved = await act('Departure written down', (acts, db) =>
      acts.recordDeparture(db, {
        buildId: build.id,
        stepId: step.id,
        what: what.text.trim(),
        why: why.text.trim(),
        touches: { steps: touches.steps, parts: touches.parts },
      }),
    );
    if (!saved) return;
    what.clear();
    why.clear();
    onDone();
  }

  const parts = touches.parts.flatMap((id) => findPart(plan, id)?.label ?? []);
  return (
    <div className="grid gap-3 rounded-plate border-2 border-iron bg-paper p-4">
      <Field
        label="What you do otherwise than the plan"
        error={asked && what.text.trim() === '' ? 'Say what you do otherwise.' : undefined}
      >
        <textarea
          rows={3}
          maxLength={20_000}
          value={what.text}
          onChange={(event) => what.setText(event.target.value)}
        />
      </Field>
      <Field label="Why">
        <textarea rows={2} maxLength={1000} value={why.text} onChange={(event) => why.setText(event.target.value)} />
      </Field>
      {touches.steps.length > 0 && (
        <p className="text-[1.0625rem] text-soft">
          May touch later: steps {touches.steps.map((id) => stepNumber(plan, id)).join(', ')}
          {parts.length > 0 && `; parts ${parts.join(', ')}`}.
        </p>
      )}
      <ActButton onClick={() => void keep()}>Write it down</ActButton>
    </div>
  );
}
