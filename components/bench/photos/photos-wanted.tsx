'use client';
import { photosOf } from '@/lib/domain/build/views';
import type { PlanStep } from '@/lib/domain/plan/document';
import { useBuild } from '../shell/build-context';
import { PhotoButtons } from './photo-buttons';
import { PhotoImage } from './photo-image';

/** Photos that the plan wants at a step: before a joint closes nobody can look into it again. */
export function PhotosWanted({ step }: { step: PlanStep }) {
  const { state, readOnly } = useBuild();
  const photos = photosOf(state);
  return (
    <section aria-labelledby="photos-wanted" className="grid gap-3">
      <h2 id="photos-wanted" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Photo wanted
      </h2>
      {step.photosWanted.map((wanted) => {
        const taken = photos.filter(({ value }) => value.wantedId === wanted.id);
        return (
          <div key={wanted.id} className="grid gap-3">
            <p>
              {wanted.of[0]?.toUpperCase()}
              {wanted.of.slice(1)}
              {wanted.before && <span className="text-soft">, before {wanted.before}</span>}
            </p>
            {taken.length > 0 ? (
              <div className="grid grid-cols-3 gap-2">
                {taken.map(({ id, value }) => (
                  <PhotoImage key={id} sha256={value.sha256} alt={value.caption || wanted.of} square />
                ))}
              </div>
            ) : (
              !readOnly && <PhotoButtons stepId={step.id} wantedId={wanted.id} of={wanted.of} />
            )}
          </div>
        );
      })}
    </section>
  );
}
