'use client';
import { useState } from 'react';
import { departuresOf, notesOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { CheckRow } from '../entry/check-row';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { SubjectFoot } from '../shell/subject-foot';
import { ViewHeading } from '../shell/view-heading';
import { NoteItem } from './note-item';

/** Notes of a step, or of the whole build, newest first; a new one is kept as it is typed. */
export function NotesView({ stepId }: { stepId: string | null }) {
  const { plan, state, readOnly } = useBuild();
  const step = stepId ? findStep(plan, stepId) : undefined;
  const notes = notesOf(state)
    .filter(({ value }) => !step || value.stepId === step.id)
    .reverse();
  const departures = departuresOf(state)
    .filter(({ value }) => !step || value.stepId === step.id)
    .reverse();
  return (
    <BuildFrame foot={step && <SubjectFoot stepId={step.id} />}>
      <div className="bench-page">
        <ViewHeading
          focusKey={`notes ${stepId ?? ''}`}
          over={step ? `Step ${stepNumber(plan, step.id)}, ${step.title}` : undefined}
        >
          Notes
        </ViewHeading>
        {!readOnly && <NoteForm stepId={step?.id ?? null} />}
        {notes.length > 0 && (
          <ul className="border-t-2 border-iron">
            {notes.map((note) => (
              <li key={note.id} className="border-b border-line py-3">
                <NoteItem note={note} />
              </li>
            ))}
          </ul>
        )}
        {departures.length > 0 && (
          <section aria-labelledby="departures">
            <h2 id="departures" className="border-b-2 border-iron pb-1 text-[1.5rem]">
              Departures from the plan
            </h2>
            <ul>
              {departures.map(({ id, value }) => (
                <li key={id} className="border-b border-line py-3">
                  {value.what}
                  {value.why && <span className="block text-soft">{value.why}</span>}
                </li>
              ))}
            </ul>
          </section>
        )}
      </div>
    </BuildFrame>
  );
}

type About = 'note' | 'went-wrong';

function NoteForm({ stepId }: { stepId: string | null }) {
  const { build } = useBuild();
  const { act } = useActs();
  const draftKey = `note/${build.id}/${stepId ?? ''}`;
  const draft = useDraft(draftKey);
  const [about, setAbout] = useState<About>('note');
  const [asked, setAsked] = useState(false);
  const empty = draft.text.trim() === '';

  async function keep() {
    setAsked(true);
    if (empty) return;
    const saved = await act('Note kept', (acts, db) =>
      acts.writeNote(db, { buildId: build.id, stepId, text: draft.text, about, draftKey }),
    );
    if (!saved) return;
    draft.clear();
    setAsked(false);
    setAbout('note');
  }

  return (
    <div className="grid gap-4">
      <Field
        label="New note"
        hint="Kept on this phone as you type."
        error={draft.fault ?? (asked && empty ? 'Write something first.' : undefined)}
      >
        <textarea rows={4} value={draft.text} onChange={(event) => draft.setText(event.target.value)} />
      </Field>
      <CheckRow checked={about === 'went-wrong'} onChange={(checked) => setAbout(checked ? 'went-wrong' : 'note')}>
        Something went wrong here
      </CheckRow>
      <Button kind="plate" onClick={() => void keep()}>
        Keep the note
      </Button>
    </div>
  );
}
