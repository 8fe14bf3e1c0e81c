'use client';
import { pieceNumbers } from '@/lib/domain/build/progress';
import { pieceMark } from '@/lib/domain/build/views';
import { findPart } from '@/lib/domain/plan/find';
import type { ResolvedPart } from '@/lib/domain/plan/resolve-parts';
import { ActButton } from '../entry/act-button';
import { TrueFractions } from '../entry/true-fractions';
import { SizeText } from '../entry/size-text';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { precisionWords } from '../shell/length-style';
import { useBuild } from '../shell/build-context';
import { Tick } from '../step/step-act';
import { takenSizes } from '../step/taken-sizes';
import { handOfPiece } from './cut-groups';

const HAND = { left: 'left', right: 'right' } as const;

/** A part of the cut list: size, grain, reference face, and a tick for each of its pieces. */
export function CutPart({ resolved, tickable }: { resolved: ResolvedPart; tickable: boolean }) {
  const { format, settings } = useBench();
  const { build, plan, state, values, readOnly } = useBuild();
  const { act } = useActs();
  const { part, length, width, thickness, uses, estimate } = resolved;
  const waits = estimate ? takenSizes(plan, uses).filter(({ id }) => values[id]?.from !== 'measured') : [];
  const sizes = [length, width, thickness].map(format);
  const { rough } = part;
  const roughSizes = rough && [
    length + (rough.length ?? 0),
    width + (rough.width ?? 0),
    thickness + (rough.thickness ?? 0),
  ];

  return (
    <li className="grid gap-2 border-b border-line py-3">
      <div className="grid grid-cols-[3.4rem_1fr] items-baseline gap-x-2">
        <b className="font-figures text-[1.75rem] font-semibold">{part.label}</b>
        <div>
          <SizeText sizes={sizes} className="text-[1.625rem] leading-tight font-semibold" />
          <p className="text-[1.0625rem] text-soft">
            {part.name}
            {part.grain === 'across' && ', grain across'}
            {sizes.some(({ rounded }) => rounded) && `; to the nearest ${precisionWords(settings)}`}
            {part.madeFrom && `, from ${part.madeFrom.flatMap((id) => findPart(plan, id)?.label ?? []).join(', ')}`}
          </p>
          {roughSizes && (
            <p className="text-[1.0625rem]">
              Cut first to <SizeText sizes={roughSizes.map(format)} className="font-semibold" />
            </p>
          )}
          {part.referenceFace && <p className="text-[1.0625rem] text-soft">Reference: {part.referenceFace}</p>}
          {part.selection && <p className="text-[1.0625rem] text-soft">{part.selection}</p>}
          {waits.length > 0 && (
            <p className="text-[1.0625rem] font-semibold text-blue">
              Not measured yet: <TrueFractions text={waits.map(({ name }) => name).join(', ')} />
            </p>
          )}
        </div>
      </div>
      {tickable && (
        <div className="grid grid-cols-[repeat(auto-fill,minmax(104px,1fr))] gap-4">
          {pieceNumbers(part.quantity).map((piece) => {
            const cut = pieceMark(state, part.id, piece) === 'cut';
            const hand = handOfPiece(part, piece);
            const name = `${part.label}, piece ${piece} of ${part.quantity}${hand ? `, ${hand}-handed` : ''}`;
            return (
              <ActButton
                key={piece}
                aria-pressed={cut}
                aria-label={name}
                disabled={readOnly}
                className={`flex items-center justify-center gap-2 ${cut ? 'border-green! text-green!' : ''}`}
                onClick={() =>
                  void act(`${name}: ${cut ? 'not cut after all' : 'cut'}`, (acts, db) =>
                    acts.markPiece(db, { buildId: build.id, partId: part.id, piece, mark: cut ? 'open' : 'cut' }),
                  )
                }
              >
                {cut && <Tick size={26} />}
                <span className="text-[1.25rem]">
                  {part.quantity > 1 ? piece : 'Cut'}
                  {hand && <span className="block text-[1rem] leading-tight font-medium">{HAND[hand]}</span>}
                </span>
              </ActButton>
            );
          })}
        </div>
      )}
    </li>
  );
}
