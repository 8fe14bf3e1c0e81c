'use client';
import { measurementsOf } from '@/lib/domain/build/views';
import { findStep, stepNumber } from '@/lib/domain/plan/find';
import { takenSizes } from '../step/taken-sizes';
import { useBenchAddress } from '../shell/address';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { SubjectFoot } from '../shell/subject-foot';
import { ViewHeading } from '../shell/view-heading';
import { KeySizeItem } from './key-size-item';
import { MeasurementForm } from './measurement-form';
import { MeasurementItem } from './measurement-item';

/** Sizes taken from the work, and other measurements; of a step or of the whole build. */
export function SizesView({ stepId }: { stepId: string | null }) {
  const { plan, parts, state, readOnly } = useBuild();
  const { open } = useBenchAddress();
  const step = stepId ? findStep(plan, stepId) : undefined;
  const takeFromWork = plan.keySizes.filter((size) => size.takeFromWork);
  const concerned = step
    ? new Set([
        ...takeFromWork.filter((size) => size.takeFromWork?.step === step.id).map(({ id }) => id),
        ...takenSizes(
          plan,
          step.uses.flatMap(({ part }) => parts.get(part)?.uses ?? []),
        ).map(({ id }) => id),
        ...(open ? [open] : []),
      ])
    : null;
  const sizes = concerned ? takeFromWork.filter(({ id }) => concerned.has(id)) : takeFromWork;
  const measurements = measurementsOf(state)
    .filter(({ value }) => !step || value.stepId === step.id)
    .reverse();
  return (
    <BuildFrame foot={step && <SubjectFoot stepId={step.id} />}>
      <div className="bench-page">
        <ViewHeading
          focusKey={`sizes ${stepId ?? ''}`}
          over={step ? `Step ${stepNumber(plan, step.id)}, ${step.title}` : undefined}
        >
          Measure
        </ViewHeading>
        {sizes.length > 0 && (
          <ul className="grid gap-4" aria-label="Sizes to take from the work">
            {sizes.map((size) => (
              <li key={size.id}>
                <KeySizeItem size={size} startOpen={open === size.id} />
              </li>
            ))}
          </ul>
        )}
        {!readOnly && <MeasurementForm stepId={step?.id ?? null} startOpen={sizes.length === 0} />}
        {measurements.length > 0 && (
          <ul className="border-t-2 border-iron" aria-label="Measured">
            {measurements.map((measurement) => (
              <li key={measurement.id} className="border-b border-line py-2">
                <MeasurementItem measurement={measurement} />
              </li>
            ))}
          </ul>
        )}
      </div>
    </BuildFrame>
  );
}
