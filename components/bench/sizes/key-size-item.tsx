'use client';
import { useState } from 'react';
import type { PlanKeySize } from '@/lib/domain/plan/document';
import { findPart, stepNumber } from '@/lib/domain/plan/find';
import { touchesOf } from '@/lib/domain/build/touches';
import { measuredKeySizes } from '@/lib/domain/build/views';
import { judgeKeySize } from '@/lib/domain/plan/judge-key-size';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { Notice } from '@/components/ui/notice';
import { LengthEntry } from '../entry/length-entry';
import { readLength } from '../entry/length-text-edit';
import { TrueFractions } from '../entry/true-fractions';
import { SizeText } from '../entry/size-text';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

/** A size that comes from the piece, not the plan: how and where to measure it, and what follows from it. */
export function KeySizeItem({ size, startOpen }: { size: PlanKeySize; startOpen: boolean }) {
  const { formatRead: format, settings } = useBench();
  const { build, plan, state, values, readOnly } = useBuild();
  const { act } = useActs();
  const draft = useDraft(`size/${build.id}/${size.id}`);
  const [open, setOpen] = useState(startOpen);
  const [asked, setAsked] = useState(false);
  const value = values[size.id];
  const measured = value?.from === 'measured';
  const read = readLength(draft.text, settings);
  const judged = read.ok ? judgeKeySize(plan, measuredKeySizes(state), size.id, read.length) : null;
  const touched = touchesOf(plan, { keySizeIds: [size.id] });

  async function keep() {
    setAsked(true);
    if (!read.ok || !judged?.ok) return;
    const saved = await act(`${size.name} taken as ${format(read.length).text}`, (acts, db) =>
      acts.setKeySize(db, { buildId: build.id, keySizeId: size.id, length: read.length, how: 'Measured on the work' }),
    );
    if (!saved) return;
    draft.clear();
    setOpen(false);
    setAsked(false);
  }

  return (
    <div className={`grid gap-3 rounded-plate border-2 bg-paper p-4 ${open ? 'border-blue' : 'border-iron'}`}>
      <div className="flex items-center justify-between gap-4">
        <div>
          <h2 className="text-[1.5rem]">
            <TrueFractions text={size.name} />
          </h2>
          <p className={`font-semibold ${measured ? 'text-blue' : ''}`}>
            {value && <SizeText sizes={[format(value.length)]} className="text-[1.5rem]" />}{' '}
            {measured ? 'measured' : 'as drawn, not measured yet'}
          </p>
        </div>
        {!readOnly && (
          <ActButton className="shrink-0" aria-expanded={open} onClick={() => setOpen(!open)}>
            {open ? 'Later' : measured ? 'Again' : 'Measure'}
          </ActButton>
        )}
      </div>
      {open && size.takeFromWork && (
        <>
          <p>
            {size.takeFromWork.how} <span className="text-soft">Where: {size.takeFromWork.where}</span>
          </p>
          <LengthEntry
            fields={[{ id: size.id, label: size.name, text: draft.text }]}
            onText={(_, text) => draft.setText(text)}
            showProblems={asked}
          />
          {judged && !judged.ok && (
            <Notice tone="danger" title="It cannot be this.">
              {judged.message}
            </Notice>
          )}
          {judged?.ok && judged.outsideRange && (
            <Notice tone="wait" title="Outside what the plan allows.">
              It goes from {format(judged.outsideRange.min).text} to {format(judged.outsideRange.max).text}. Measure
              again; if it is so, write a departure.
            </Notice>
          )}
          <p className="text-[1.0625rem] text-soft">
            {touched.parts.length > 0
              ? `Follows from it: ${touched.parts.flatMap((id) => findPart(plan, id)?.label ?? []).join(', ')}${
                  touched.steps.length > 0
                    ? `; steps ${touched.steps.map((id) => stepNumber(plan, id)).join(', ')}`
                    : ''
                }.`
              : 'No part’s size follows from it.'}
          </p>
          <Button kind="plate" onClick={() => void keep()}>
            Take it as measured
          </Button>
          {measured && (
            <Button
              kind="quiet"
              className="justify-self-start"
              onClick={() =>
                void act(`${size.name} set back to the plan`, (acts, db) =>
                  acts.setKeySize(db, { buildId: build.id, keySizeId: size.id, length: null }),
                )
              }
            >
              Set it back to the plan
            </Button>
          )}
        </>
      )}
    </div>
  );
}
