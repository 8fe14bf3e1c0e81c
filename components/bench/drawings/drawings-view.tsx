'use client';
import { useMemo, useState } from 'react';
import { PlacementDrawing } from '@/components/diagrams/placement-drawing';
import { ELEVATIONS, ElevationChoice } from './elevation-choice';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { PackFileFigure } from './pack-file-figure';

const NONE: ReadonlySet<string> = new Set();

/** The piece from three sides as far as it stands, then every drawing and file that goes with the plan. */
export function DrawingsView() {
  const { build, plan, now } = useBuild();
  const [elevation, setElevation] = useState<(typeof ELEVATIONS)[number]>(ELEVATIONS[0]);
  const standing = useMemo(
    () =>
      new Set(
        plan.steps
          .filter(({ id }) => now.statuses[id]?.mark === 'done')
          .flatMap(({ uses, makes }) => [...uses.map(({ part }) => part), ...makes]),
      ),
    [plan, now],
  );
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`drawings ${build.id}`} over={build.name}>
          Drawings
        </ViewHeading>
        {plan.placements.length > 0 && (
          <figure className="grid gap-2">
            <PlacementDrawing
              placements={plan.placements}
              highlighted={NONE}
              standing={standing}
              elevation={elevation.elevation}
              label={`The piece seen ${elevation.from}, what stands already in strong lines`}
            />
            <figcaption className="flex flex-wrap items-center justify-between gap-2 text-[1.0625rem] text-soft">
              <span>The whole piece; what stands already has strong lines</span>
              <ElevationChoice chosen={elevation} onChoose={setElevation} />
            </figcaption>
          </figure>
        )}
        {plan.attachments.map((file) => (
          <PackFileFigure key={file.id} file={file} />
        ))}
        {plan.attachments.length === 0 && (
          <p className="text-[1.125rem] text-soft">No drawings or other files go with this plan.</p>
        )}
      </div>
    </BuildFrame>
  );
}
