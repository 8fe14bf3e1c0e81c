'use client';
import { photosOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { SubjectFoot } from '../shell/subject-foot';
import { ViewHeading } from '../shell/view-heading';
import { AskedPhoto } from './asked-photo';
import { PhotoButtons } from './photo-buttons';
import { PhotoItem } from './photo-item';

/** Photos of a step, or of the whole build, newest first, and the way to take one. */
export function PhotosView({ stepId }: { stepId: string | null }) {
  const { plan, state, readOnly } = useBuild();
  const step = stepId ? findStep(plan, stepId) : undefined;
  const photos = photosOf(state)
    .filter(({ value }) => !step || value.stepId === step.id)
    .reverse();
  const wanted = step?.photosWanted.find(({ id }) => !photos.some(({ value }) => value.wantedId === id));
  return (
    <BuildFrame foot={step && <SubjectFoot stepId={step.id} />}>
      <div className="bench-page">
        <ViewHeading
          focusKey={`photos ${stepId ?? ''}`}
          over={step ? `Step ${stepNumber(plan, step.id)}, ${step.title}` : undefined}
        >
          Photos
        </ViewHeading>
        <AskedPhoto />
        {wanted && <p>The plan wants: {wanted.of}.</p>}
        {!readOnly && <PhotoButtons stepId={step?.id ?? null} wantedId={wanted?.id} of={wanted?.of} />}
        {photos.length === 0 && <p className="text-soft">No photo yet. Where you were stays out of them.</p>}
        <ul className="grid gap-6">
          {photos.map((photo) => (
            <li key={photo.id}>
              <PhotoItem photo={photo} />
            </li>
          ))}
        </ul>
      </div>
    </BuildFrame>
  );
}
