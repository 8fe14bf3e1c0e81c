'use client';
import type { Elevation } from '@/components/diagrams/project-box';

interface ElevationFrom {
  elevation: Elevation;
  word: string;
  from: string;
}

export const ELEVATIONS: readonly [ElevationFrom, ...ElevationFrom[]] = [
  { elevation: 'front', word: 'Front', from: 'from the front' },
  { elevation: 'side', word: 'Side', from: 'from the right' },
  { elevation: 'top', word: 'Top', from: 'from above' },
];

interface ElevationChoiceProps {
  chosen: ElevationFrom;
  onChoose: (elevation: ElevationFrom) => void;
}

/** Which side the piece is seen from. */
export function ElevationChoice({ chosen, onChoose }: ElevationChoiceProps) {
  return (
    <span className="flex" role="group" aria-label="Seen from">
      {ELEVATIONS.map((each) => (
        <button
          key={each.elevation}
          type="button"
          aria-pressed={each.elevation === chosen.elevation}
          onClick={() => onChoose(each)}
          className={`min-h-[52px] px-4 font-figures text-[1.125rem] font-medium active:bg-line ${
            each.elevation === chosen.elevation ? 'text-iron shadow-[inset_0_-4px_0_var(--iron)]' : 'text-blue'
          }`}
        >
          {each.word}
        </button>
      ))}
    </span>
  );
}
