'use client';
import { useState } from 'react';
import type { photosOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { dayAndTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';
import { PhotoImage } from './photo-image';

/** One photo with its caption, which can be changed, and the way to take it out. */
export function PhotoItem({ photo }: { photo: ReturnType<typeof photosOf>[number] }) {
  const { build, plan, readOnly } = useBuild();
  const { act } = useActs();
  const clock = useClock(60_000);
  const [editing, setEditing] = useState(false);
  const caption = useDraft(`caption/${photo.id}`);
  const { value, madeAt, id, held } = photo;
  const step = value.stepId ? findStep(plan, value.stepId) : undefined;
  const text = caption.text || value.caption;

  async function keep() {
    const saved = await act('Caption kept', (acts, db) =>
      acts.captionPhoto(db, { buildId: build.id, photoId: id, caption: caption.text.trim() }),
    );
    if (!saved) return;
    caption.clear();
    setEditing(false);
  }

  return (
    <figure className="grid gap-2">
      <PhotoImage sha256={value.sha256} alt={value.caption || (step ? `Photo at ${step.title}` : 'Photo')} />
      <figcaption className="text-[1.125rem]">
        {value.caption && <b className="block">{value.caption}</b>}
        <span className="text-soft">
          {dayAndTime(madeAt, clock)}
          {step && `, step ${stepNumber(plan, step.id)}`}
          {held && ' · held here'}
        </span>
      </figcaption>
      {!readOnly && !editing && (
        <div className="grid grid-cols-2 gap-6">
          <ActButton onClick={() => setEditing(true)}>{value.caption ? 'Change caption' : 'Add a caption'}</ActButton>
          <ActButton
            onClick={() =>
              void act('Photo taken out', (acts, db) =>
                acts.removeItem(db, { buildId: build.id, collection: 'photos', itemId: id }),
              )
            }
          >
            Take it out
          </ActButton>
        </div>
      )}
      {editing && (
        <div className="grid gap-3">
          <Field label="Caption">
            <input value={text} maxLength={500} onChange={(event) => caption.setText(event.target.value)} />
          </Field>
          <ActButton onClick={() => void keep()}>Keep the caption</ActButton>
        </div>
      )}
    </figure>
  );
}
