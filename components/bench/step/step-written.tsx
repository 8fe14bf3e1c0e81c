'use client';
import { measurementsOf, notesOf, photosOf } from '@/lib/domain/build/views';
import { SizeText } from '../entry/size-text';
import { clockTime } from '../entry/time-words';
import { PhotoImage } from '../photos/photo-image';
import { BenchLink } from '../shell/bench-link';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

/** What was kept with this step: photos, notes, measurements. */
export function StepWritten({ stepId }: { stepId: string }) {
  const { formatRead: format } = useBench();
  const { build, state } = useBuild();
  const here = <V extends { stepId: string | null }>(items: { value: V; id: string; madeAt: number }[]) =>
    items.filter(({ value }) => value.stepId === stepId);
  const photos = here(photosOf(state));
  const notes = here(notesOf(state));
  const measurements = here(measurementsOf(state));
  if (photos.length + notes.length + measurements.length === 0) return null;
  return (
    <section aria-label="Kept with this step" className="grid gap-3">
      {photos.length > 0 && (
        <ul className="grid grid-cols-3 gap-2">
          {photos.map(({ id, value }) => (
            <li key={id}>
              <BenchLink to={{ buildId: build.id, view: 'photos', stepId, open: id }}>
                <PhotoImage sha256={value.sha256} alt={value.caption || 'Photo of this step'} square />
              </BenchLink>
            </li>
          ))}
        </ul>
      )}
      <ul>
        {measurements.map(({ id, value, madeAt }) => (
          <li key={id} className="border-b border-line py-2">
            {value.what}: <SizeText sizes={[format(value.length)]} className="font-semibold" />{' '}
            <span className="text-[1rem] text-soft">{clockTime(madeAt)}</span>
          </li>
        ))}
        {notes.map(({ id, value, madeAt }) => (
          <li key={id} className="border-b border-line py-2 whitespace-pre-line">
            {value.text} <span className="text-[1rem] text-soft">{clockTime(madeAt)}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
