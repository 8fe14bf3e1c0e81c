'use client';
import { useMemo, useState } from 'react';
import type { PlanFace, PlanStep } from '@/lib/domain/plan/document';
import { evaluateSize } from '@/lib/domain/plan/key-sizes';
import { FaceMap } from '@/components/diagrams/face-map';
import { PlacementDrawing } from '@/components/diagrams/placement-drawing';
import { ELEVATIONS, ElevationChoice } from '../drawings/elevation-choice';
import { PackFileFigure } from '../drawings/pack-file-figure';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

/** Where this step's parts go in the piece, and the faces that it fastens or cuts. */
export function StepDrawings({ step }: { step: PlanStep }) {
  const { plan, parts, now } = useBuild();
  const [view, setView] = useState<(typeof ELEVATIONS)[number]>(ELEVATIONS[0]);
  const done = useMemo(
    () => new Set(plan.steps.filter(({ id }) => now.statuses[id]?.mark === 'done').map(({ id }) => id)),
    [plan, now],
  );
  const used = useMemo(() => withWhatTheyAreMadeOf(step, plan), [step, plan]);
  const standing = useMemo(
    () =>
      new Set(
        plan.steps
          .filter(({ id }) => done.has(id))
          .flatMap(({ uses, makes }) => [...uses.map(({ part }) => part), ...makes]),
      ),
    [plan, done],
  );
  const placed = plan.placements.some(({ part }) => used.has(part));
  const faces = plan.faces.filter(
    (face) =>
      face.cuts.some((cut) => cut.step === step.id) ||
      face.fasteners.some((fastener) => fastener.step === step.id || fastener.removedIn === step.id),
  );
  const files = plan.attachments.filter(({ steps }) => steps.includes(step.id));
  if (!placed && faces.length === 0 && files.length === 0) return null;
  const labels = [...used].flatMap((id) => parts.get(id)?.part.label ?? []);
  return (
    <section aria-label="Drawings" className="grid gap-4">
      {placed && (
        <figure className="grid gap-2">
          <PlacementDrawing
            placements={plan.placements}
            highlighted={used}
            standing={standing}
            elevation={view.elevation}
            label={`Where ${labels.join(', ')} go, seen ${view.from}`}
          />
          <figcaption className="flex flex-wrap items-center justify-between gap-2 text-[1.0625rem] text-soft">
            <span>{labels.join(', ')} in the piece</span>
            <ElevationChoice chosen={view} onChoose={setView} />
          </figcaption>
        </figure>
      )}
      {faces.map((face) => (
        <FaceFigure key={face.id} face={face} stepId={step.id} done={done} />
      ))}
      {files.map((file) => (
        <PackFileFigure key={file.id} file={file} />
      ))}
    </section>
  );
}

function FaceFigure({ face, stepId, done }: { face: PlanFace; stepId: string; done: ReadonlySet<string> }) {
  const { format } = useBench();
  const { plan, values } = useBuild();
  const length = evaluateSize(face.length, values, plan);
  const width = evaluateSize(face.width, values, plan);
  if (!length.ok || !width.ok) return null;
  const temporary = face.fasteners.some((fastener) => fastener.temporary);
  const clear = face.cuts.some(({ step }) => !done.has(step));
  return (
    <figure className="grid gap-2">
      <FaceMap
        face={face}
        length={length.length}
        width={width.length}
        stepId={stepId}
        done={done}
        format={(value) => format(value).text}
      />
      <figcaption className="text-[1.0625rem] text-soft">
        <b className="text-iron first-letter:uppercase inline-block">{face.name}.</b> {face.orientation}. Crosses are
        fasteners
        {temporary && ', ringed ones come out again'}
        {clear && '; no metal in the red hatching, a later cut goes there'}.
      </figcaption>
    </figure>
  );
}

/** Parts of the step, those it makes, and the placed pieces that a made part consists of or belongs to. */
function withWhatTheyAreMadeOf(
  step: PlanStep,
  plan: { parts: readonly { id: string; madeFrom?: readonly string[] }[] },
) {
  const ids = new Set([...step.uses.map(({ part }) => part), ...step.makes]);
  for (const part of plan.parts) if (part.madeFrom?.some((id) => ids.has(id))) ids.add(part.id);
  return ids;
}
