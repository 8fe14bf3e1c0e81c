'use client';
import { progressOf } from '@/lib/domain/build/progress';
import { TrueFractions } from '../entry/true-fractions';
import { SizeText } from '../entry/size-text';
import { useClock } from '../entry/use-clock';
import { useBench } from '../shell/bench-context';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';
import { CutPart } from './cut-part';
import { cutGroups, type CutGroup } from './cut-groups';

/** The cut list: by stock and section, every piece with its own tick. */
export function CutsView() {
  const { build, plan, parts, state } = useBuild();
  const { groups, madeUp } = cutGroups(plan, parts);
  const { piecesCut, piecesInAll } = progressOf(plan, state, useClock(60_000));
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`cuts ${build.id}`} over="Cut list">
          {piecesCut} of {piecesInAll} pieces cut
        </ViewHeading>
        {groups.map((group) => (
          <Group key={`${group.stock.id} ${group.section?.width} ${group.section?.thickness}`} group={group} />
        ))}
        {madeUp.length > 0 && (
          <section aria-labelledby="made-up">
            <h2 id="made-up" className="border-b-2 border-iron pb-1 text-[1.5rem]">
              Made up from other parts
            </h2>
            <ul>
              {madeUp.map((resolved) => (
                <CutPart key={resolved.part.id} resolved={resolved} tickable={false} />
              ))}
            </ul>
          </section>
        )}
      </div>
    </BuildFrame>
  );
}

function Group({ group }: { group: CutGroup }) {
  const { format } = useBench();
  const { stock, section, parts } = group;
  const id = `group-${stock.id}-${section?.width ?? 0}-${section?.thickness ?? 0}`;
  return (
    <section aria-labelledby={id}>
      <div className="border-b-2 border-iron pb-1">
        <h2 id={id} className="text-[1.5rem]">
          <TrueFractions text={stock.name} />
        </h2>
        <p className="text-[1.0625rem] text-soft">
          {section ? (
            <>
              section <SizeText sizes={[format(section.width), format(section.thickness)]} /> from{' '}
              {stock.kind === 'lumber' && stock.nominal}
            </>
          ) : (
            <TrueFractions text={stock.kind === 'sheet' ? `sheet, sold as ${stock.nominalThickness}` : ''} />
          )}
        </p>
      </div>
      <ul>
        {parts.map((resolved) => (
          <CutPart key={resolved.part.id} resolved={resolved} tickable />
        ))}
      </ul>
    </section>
  );
}
