'use client';
import { useState } from 'react';
import type { measurementsOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { LengthEntry } from '../entry/length-entry';
import { readLength } from '../entry/length-text-edit';
import { SizeText } from '../entry/size-text';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

type Measurement = ReturnType<typeof measurementsOf>[number];

/** A measurement; changing it keeps the old one in the log. */
export function MeasurementItem({ measurement }: { measurement: Measurement }) {
  const { formatRead: format } = useBench();
  const { plan, readOnly } = useBuild();
  const clock = useClock(60_000);
  const [editing, setEditing] = useState(false);
  const { value, madeAt, revised, held } = measurement;
  if (editing) return <ChangeForm measurement={measurement} onDone={() => setEditing(false)} />;
  return (
    <div className="flex items-center gap-3">
      <div className="grow">
        <p>
          {value.what}: <SizeText sizes={[format(value.length)]} className="text-[1.5rem] font-semibold" />
        </p>
        <p className="text-[1rem] text-soft">
          {dayAndTime(madeAt, clock)}
          {value.stepId && findStep(plan, value.stepId) && `, step ${stepNumber(plan, value.stepId)}`}
          {revised > 0 && ', changed'}
          {held && ' · held here'}
        </p>
      </div>
      {!readOnly && (
        <Button kind="plain" className="min-h-[81px]! shrink-0 text-blue!" onClick={() => setEditing(true)}>
          Change
        </Button>
      )}
    </div>
  );
}

function ChangeForm({ measurement, onDone }: { measurement: Measurement; onDone: () => void }) {
  const { formatRead: format, settings } = useBench();
  const { build } = useBuild();
  const { act } = useActs();
  const [what, setWhat] = useState(measurement.value.what);
  const [text, setText] = useState(() => format(measurement.value.length).text);
  const [shownFirst] = useState(text);
  const [asked, setAsked] = useState(false);
  const read = readLength(text, settings);
  // What was shown may be rounded; left as it was, the length stays what was read off.
  const length = text === shownFirst ? measurement.value.length : read.ok ? read.length : null;

  async function keep() {
    setAsked(true);
    if (length === null || what.trim() === '') return;
    const saved = await act('Measurement changed', (acts, db) =>
      acts.reviseMeasurement(db, {
        buildId: build.id,
        measurementId: measurement.id,
        what: what.trim(),
        length,
      }),
    );
    if (saved) onDone();
  }

  async function takeOut() {
    const saved = await act('Measurement taken out', (acts, db) =>
      acts.removeItem(db, { buildId: build.id, collection: 'measurements', itemId: measurement.id }),
    );
    if (saved) onDone();
  }

  return (
    <div className="grid gap-3 py-2">
      <Field
        label="What you measured"
        error={asked && what.trim() === '' ? 'Say what it is that you measured.' : undefined}
      >
        <input maxLength={200} value={what} onChange={(event) => setWhat(event.target.value)} />
      </Field>
      <LengthEntry
        fields={[{ id: measurement.id, label: 'Length', text }]}
        onText={(_, changed) => setText(changed)}
        showProblems={asked}
      />
      <div className="grid grid-cols-3 gap-4">
        <ActButton onClick={onDone}>Leave it</ActButton>
        <ActButton onClick={() => void takeOut()}>Take it out</ActButton>
        <ActButton onClick={() => void keep()}>Keep it</ActButton>
      </div>
    </div>
  );
}
