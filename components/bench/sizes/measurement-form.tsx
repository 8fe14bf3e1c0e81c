'use client';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { LengthEntry } from '../entry/length-entry';
import { readLength } from '../entry/length-text-edit';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

/** A length with what was measured; both kept as they are put in. */
export function MeasurementForm({ stepId, startOpen }: { stepId: string | null; startOpen: boolean }) {
  const { settings } = useBench();
  const { build } = useBuild();
  const { act } = useActs();
  const what = useDraft(`measured-what/${build.id}/${stepId ?? ''}`);
  const length = useDraft(`measured-length/${build.id}/${stepId ?? ''}`);
  const [open, setOpen] = useState(startOpen);
  const [asked, setAsked] = useState(false);
  const read = readLength(length.text, settings);
  const noWhat = what.text.trim() === '';

  async function keep() {
    setAsked(true);
    if (!read.ok || noWhat) return;
    const saved = await act(`Measured: ${what.text.trim()}`, (acts, db) =>
      acts.takeMeasurement(db, {
        buildId: build.id,
        what: what.text.trim(),
        length: read.length,
        stepId,
        keySizeId: null,
      }),
    );
    if (!saved) return;
    what.clear();
    length.clear();
    setAsked(false);
  }

  if (!open) {
    return <ActButton onClick={() => setOpen(true)}>Measure something else</ActButton>;
  }
  return (
    <div className="grid gap-4">
      <Field
        label="What you measured"
        hint="For example: gap under the left door, at the back"
        error={what.fault ?? (asked && noWhat ? 'Say what it is that you measured.' : undefined)}
      >
        <input maxLength={200} value={what.text} onChange={(event) => what.setText(event.target.value)} />
      </Field>
      <LengthEntry
        fields={[{ id: 'length', label: 'Length', text: length.text }]}
        onText={(_, text) => length.setText(text)}
        showProblems={asked}
      />
      <Button kind="plate" onClick={() => void keep()}>
        Keep it
      </Button>
    </div>
  );
}
