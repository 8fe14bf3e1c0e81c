'use client';
import type { PlanStep } from '@/lib/domain/plan/document';
import { PartGlyph } from '@/components/diagrams/part-glyph';
import { TrueFractions } from '../entry/true-fractions';
import { SizeText } from '../entry/size-text';
import { Working } from '../entry/working';
import { BenchLink } from '../shell/bench-link';
import { useBench } from '../shell/bench-context';
import { precisionWords } from '../shell/length-style';
import { useBuild } from '../shell/build-context';
import { takenSizes } from './taken-sizes';

const HANDS = { left: 'left-handed', right: 'right-handed', pair: 'half left-, half right-handed' } as const;

/** A part that the step works on: drawing, label, finished size, how many; sizes taken from the work in blue. */
export function PartLine({ step, use }: { step: PlanStep; use: PlanStep['uses'][number] }) {
  const { format, formatRead, settings } = useBench();
  const { build, plan, parts, values } = useBuild();
  const resolved = parts.get(use.part);
  if (!resolved) return null;
  const { part, length, width, thickness, uses, working, estimate } = resolved;
  const stock = plan.stock.find(({ id }) => id === part.stock);
  const pieces = use.pieces ?? part.quantity;
  const taken = takenSizes(plan, uses);
  const sizes = [length, width, thickness].map(format);
  const computed = [part.length, part.width, part.thickness].some((size) => typeof size === 'string');
  return (
    <li className="border-b border-line pb-2">
      <div className="grid grid-cols-[68px_auto_1fr] items-center gap-x-3">
        <PartGlyph part={part} operation={step.operation} stock={stock?.kind ?? 'lumber'} />
        <b className="font-figures text-[1.625rem] font-semibold">{part.label}</b>
        <div className="pl-1">
          <SizeText sizes={sizes} className="block text-[1.625rem] leading-tight font-semibold" />
          <p className="text-[1.0625rem] leading-snug text-soft">
            {pieces} × {part.name}
            {part.hand && `, ${HANDS[part.hand]}`}
            {use.note && `, ${use.note}`}
            {sizes.some(({ rounded }) => rounded) && `; sizes to the nearest ${precisionWords(settings)}`}
          </p>
          {part.referenceFace && (
            <p className="text-[1.0625rem] leading-snug text-soft">Reference: {part.referenceFace}</p>
          )}
        </div>
      </div>
      {taken.length > 0 && (
        <ul className="mt-1">
          {taken.map((size) => {
            const value = values[size.id];
            const measured = value?.from === 'measured';
            return (
              <li key={size.id} className="font-semibold text-blue">
                <TrueFractions text={size.name} />{' '}
                {measured && value ? (
                  <>
                    <SizeText sizes={[formatRead(value.length)]} />, measured
                  </>
                ) : (
                  'not measured yet'
                )}
                {!measured && (
                  <BenchLink
                    to={{ buildId: build.id, view: 'sizes', stepId: step.id, open: size.id }}
                    className="ml-3 inline-flex min-h-[48px] items-center underline underline-offset-4"
                  >
                    Measure it
                  </BenchLink>
                )}
              </li>
            );
          })}
        </ul>
      )}
      {estimate && <p className="text-[1.0625rem]">As drawn until then; do not cut to it.</p>}
      {computed && (
        <Working
          of={`${part.label}’s size`}
          rows={[
            ...(['length', 'width', 'thickness'] as const).map((side) => ({
              name: side[0]!.toUpperCase() + side.slice(1),
              says: working[side].replace(/^=\s*/, ''),
            })),
            ...uses.map((id) => ({
              name: plan.keySizes.find((size) => size.id === id)?.name ?? id,
              says: values[id]
                ? `${formatRead(values[id].length).text}: ${values[id].working.replace(/^=\s*/, '')}`
                : 'unknown',
            })),
          ]}
        />
      )}
    </li>
  );
}
