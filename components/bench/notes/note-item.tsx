'use client';
import { useState } from 'react';
import type { notesOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

const ABOUT = { note: '', 'near-miss': 'Near miss. ', 'went-wrong': 'Went wrong. ' } as const;

/** A note; changing it keeps the old words in the log. */
export function NoteItem({ note }: { note: ReturnType<typeof notesOf>[number] }) {
  const { build, plan, readOnly } = useBuild();
  const { act } = useActs();
  const clock = useClock(60_000);
  const draftKey = `note-change/${note.id}`;
  const draft = useDraft(draftKey);
  const [editing, setEditing] = useState(false);
  const { value, madeAt, revised, held } = note;
  const text = draft.text || value.text;

  async function keep() {
    const saved = await act('Note changed', (acts, db) =>
      acts.reviseNote(db, { buildId: build.id, noteId: note.id, text, draftKey }),
    );
    if (!saved) return;
    draft.clear();
    setEditing(false);
  }

  if (editing) {
    return (
      <div className="grid gap-3">
        <Field label="Change the note" hint="The old words stay in the log." error={draft.fault ?? undefined}>
          <textarea rows={4} value={text} onChange={(event) => draft.setText(event.target.value)} />
        </Field>
        <div className="grid grid-cols-2 gap-6">
          <ActButton
            onClick={() => {
              draft.clear();
              setEditing(false);
            }}
          >
            Leave it as it was
          </ActButton>
          <ActButton onClick={() => void keep()}>Keep it</ActButton>
        </div>
      </div>
    );
  }
  return (
    <div className="flex items-start gap-3">
      <div className="grow">
        <p className="break-words whitespace-pre-line">
          {ABOUT[value.about] && <b className="font-figures font-semibold text-red">{ABOUT[value.about]}</b>}
          {value.text}
        </p>
        <p className="text-[1rem] text-soft">
          {dayAndTime(madeAt, clock)}
          {value.stepId && findStep(plan, value.stepId) && `, step ${stepNumber(plan, value.stepId)}`}
          {revised > 0 && ', changed'}
          {held && ' · held here'}
        </p>
      </div>
      {!readOnly && (
        <div className="grid shrink-0">
          <Button kind="plain" className="text-blue!" onClick={() => setEditing(true)}>
            Change
          </Button>
          <Button
            kind="plain"
            className="text-blue!"
            onClick={() =>
              void act('Note taken out', (acts, db) =>
                acts.removeItem(db, { buildId: build.id, collection: 'notes', itemId: note.id }),
              )
            }
          >
            Take out
          </Button>
        </div>
      )}
    </div>
  );
}
