'use client';
import type { StepStatus } from '@/lib/domain/build/locks';
import { checkOf, photosOf } from '@/lib/domain/build/views';
import type { PlanStep } from '@/lib/domain/plan/document';
import { useBuild } from '../shell/build-context';

/** Right above the plate: checks and photos that the step wants and does not have yet. It never stands in the way. */
export function StepReminder({ step, status }: { step: PlanStep; status: StepStatus }) {
  const { state } = useBuild();
  if (status.mark !== 'open' || status.locks.length > 0) return null;
  const taken = new Set(photosOf(state).map(({ value }) => value.wantedId));
  const checks = step.checks.filter(({ id }) => !checkOf(state, step.id, id)).length;
  const photos = step.photosWanted.filter(({ id }) => !taken.has(id)).length;
  const parts = [
    checks > 0 && (checks === 1 ? '1 check' : `${checks} checks`),
    photos > 0 && (photos === 1 ? '1 photo' : `${photos} photos`),
  ].filter(Boolean);
  if (parts.length === 0) return null;
  return (
    <p className="pb-1.5 text-center font-figures text-[1.0625rem] font-medium text-amber">
      {parts.join(' and ')} still wanted here
    </p>
  );
}
