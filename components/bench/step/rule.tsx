'use client';
import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { markAt, markPlace, numberedMarks, ruleValueText, type RuleMark, type RuleMarkLook } from './rule-marks';

interface RuleProps {
  marks: readonly RuleMark[];
  /** Index of the step shown. */
  here: number;
  /** Called on release, or on a key. `by` says which, since a key keeps the focus on the rule. */
  onMove: (index: number, by: 'touch' | 'key') => void;
}

const STROKES: Record<RuleMarkLook, { stroke: string; width: number; dash?: string }> = {
  done: { stroke: 'var(--iron)', width: 4 },
  waiting: { stroke: 'var(--amber)', width: 5 },
  ready: { stroke: 'var(--iron)', width: 2 },
  locked: { stroke: 'var(--soft)', width: 1 },
  skipped: { stroke: 'var(--iron)', width: 4, dash: '3 3' },
};

const EDGE = 43;

/**
 * The rule down the left edge: progress, map and navigation in one. A tap goes there; pressing and moving along shows
 * where a release would go. With a keyboard it is a slider: arrows by step, page keys by stage, home and end.
 */
export function Rule({ marks, here, onMove }: RuleProps) {
  const rule = useRef<HTMLDivElement>(null);
  const [height, setHeight] = useState(600);
  const [aimed, setAimed] = useState<number | null>(null);

  useEffect(() => {
    const element = rule.current;
    if (!element || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => entry && setHeight(entry.contentRect.height));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);

  const indexUnder = (event: PointerEvent) => {
    const box = rule.current!.getBoundingClientRect();
    return markAt((event.clientY - box.top) / box.height, marks.length);
  };

  function release(event: PointerEvent) {
    if (aimed === null) return;
    const to = indexUnder(event);
    setAimed(null);
    if (to !== here) onMove(to, 'touch');
  }

  function press(event: KeyboardEvent) {
    const to = keyTarget(event.key, here, marks);
    if (to === null) return;
    event.preventDefault();
    if (to !== here) onMove(to, 'key');
  }

  const shown = aimed ?? here;
  const mark = marks[shown];
  if (!mark) return null;
  const numbered = numberedMarks(marks, height, shown);

  return (
    <div className="step-rule relative border-r-2 border-iron bg-paper">
      <div
        ref={rule}
        role="slider"
        tabIndex={0}
        aria-label="Step"
        aria-orientation="vertical"
        aria-valuemin={1}
        aria-valuemax={marks.length}
        aria-valuenow={mark.number}
        aria-valuetext={ruleValueText(mark, marks.length)}
        onKeyDown={press}
        onPointerDown={(event) => {
          event.currentTarget.setPointerCapture(event.pointerId);
          setAimed(indexUnder(event));
        }}
        onPointerMove={(event) => aimed !== null && setAimed(indexUnder(event))}
        onPointerUp={release}
        onPointerCancel={() => setAimed(null)}
        className="absolute inset-y-0 left-0 z-10 w-[60px] cursor-pointer touch-none select-none"
      >
        <svg className="h-full w-[44px] overflow-visible" aria-hidden="true">
          <Graduations marks={marks} height={height} numbered={numbered} />
          <Pointer place={markPlace(shown, marks.length)} number={mark.number} />
        </svg>
      </div>
      {aimed !== null && (
        <p
          className="pointer-events-none absolute left-[64px] z-20 w-[min(70vw,24rem)] -translate-y-1/2 rounded-plate border-2 border-blue bg-paper px-3 py-2 font-figures text-[1.375rem] font-semibold"
          style={{ top: `clamp(32px, ${markPlace(shown, marks.length) * 100}%, calc(100% - 32px))` }}
          aria-hidden="true"
        >
          {mark.number} · {mark.title}
        </p>
      )}
    </div>
  );
}

interface GraduationsProps {
  marks: readonly RuleMark[];
  height: number;
  numbered: ReadonlySet<number>;
}

/** One path for each look, since a rule of some hundred steps is drawn anew at every tick. */
function Graduations({ marks, height, numbered }: GraduationsProps) {
  const pitch = height / marks.length;
  const looks = Object.entries(STROKES) as [RuleMarkLook, (typeof STROKES)[RuleMarkLook]][];
  return (
    <>
      {looks.map(([look, { stroke, width, dash }]) => (
        <path
          key={look}
          d={graduationPath(marks, look, height, numbered)}
          stroke={stroke}
          strokeWidth={Math.min(width, Math.max(1, pitch * 0.6))}
          strokeDasharray={dash}
        />
      ))}
      {[...numbered].map((index) => (
        <text
          key={index}
          x={4}
          y={markPlace(index, marks.length) * height}
          dy="0.36em"
          className="figures"
          fontSize={16}
          fontWeight={600}
          fill="var(--iron)"
        >
          {marks[index]!.number}
        </text>
      ))}
    </>
  );
}

function graduationPath(marks: readonly RuleMark[], look: RuleMarkLook, height: number, numbered: ReadonlySet<number>) {
  return marks
    .map((mark, index) => {
      if (mark.look !== look) return '';
      const from = mark.stageStart ? (numbered.has(index) ? 8 + 7.5 * String(mark.number).length : 18) : 29;
      return `M${from} ${(markPlace(index, marks.length) * height).toFixed(2)}H${EDGE}`;
    })
    .join('');
}

function Pointer({ place, number }: { place: number; number: number }) {
  return (
    <svg y={`${place * 100}%`} overflow="visible">
      <path d="M2 0 12 -14H43V14H12Z" fill="var(--blue)" />
      <text
        x={27.5}
        dy="0.36em"
        textAnchor="middle"
        className="figures"
        fontSize={19}
        fontWeight={600}
        fill="var(--on-blue)"
      >
        {number}
      </text>
    </svg>
  );
}

function keyTarget(key: string, here: number, marks: readonly RuleMark[]): number | null {
  const last = marks.length - 1;
  const stages = [...marks.keys()].filter((index) => marks[index]!.stageStart);
  switch (key) {
    case 'ArrowDown':
    case 'ArrowRight':
      return Math.min(last, here + 1);
    case 'ArrowUp':
    case 'ArrowLeft':
      return Math.max(0, here - 1);
    case 'PageDown':
      return stages.find((index) => index > here) ?? last;
    case 'PageUp':
      return stages.findLast((index) => index < here) ?? 0;
    case 'Home':
      return 0;
    case 'End':
      return last;
    default:
      return null;
  }
}
