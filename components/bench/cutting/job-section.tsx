'use client';
import type { CuttingJob } from '@/lib/domain/cutting';
import { formatMoney } from '@/lib/domain/measure';
import { findPart } from '@/lib/domain/plan/find';
import { CuttingDiagram } from '@/components/diagrams/cutting-diagram';
import { Notice } from '@/components/ui/notice';
import { TrueFractions } from '../entry/true-fractions';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { drawnPieces, type DrawnPiece } from './drawn-pieces';
import type { PlannedJob } from './planned-job';
import type { JobAnswer } from './use-cutting-plans';

/** One stock: how much of it, what that costs, how good the plan is, and a diagram of every board or sheet. */
export function JobSection({ job, answer }: { job: CuttingJob; answer: JobAnswer }) {
  const id = `cutting-${job.stock.id}`;
  return (
    <section aria-labelledby={id} className="grid gap-4" aria-busy={answer.state === 'planning'}>
      <h2 id={id} className="border-b-2 border-iron pb-1 text-[1.5rem]">
        <TrueFractions text={job.stock.name} />
      </h2>
      {answer.state === 'planning' && <p className="text-soft">Planning the cuts.</p>}
      {answer.state === 'fault' && (
        <Notice tone="danger" title="No plan.">
          {answer.words}
        </Notice>
      )}
      {answer.state === 'planned' && <Planned planned={answer.planned} />}
    </section>
  );
}

function Planned({ planned }: { planned: PlannedJob }) {
  const { format } = useBench();
  const { plan } = useBuild();
  const { job } = planned;
  const labelOf = (partId: string) => findPart(plan, partId)?.label ?? partId;
  const drawn = drawnPieces(planned, labelOf);
  const unplaced = [...job.unplaced, ...planned.plan.unplaced];
  const estimates = job.estimates.map(labelOf);
  const share = shares(drawn);
  return (
    <>
      <p className="text-[1.25rem]">
        <b>{buyWords(drawn, (length) => format(length).text)}</b>
        {costWords(planned)}
      </p>
      <p className="text-[1.0625rem] text-soft">
        {drawn.length > 0 && `${share.waste} % waste, ${share.kept} % left over in pieces worth keeping. `}
        {planned.plan.proved
          ? 'No cheaper plan exists for this list; that is proved.'
          : 'It may be possible with less; this is the best found in two seconds.'}
      </p>
      {estimates.length > 0 && (
        <Notice tone="wait" title="Not to be cut yet.">
          {estimates.join(', ')}: a size is still to be taken from the work. Room is kept for{' '}
          {estimates.length === 1 ? 'it' : 'them'}.
        </Notice>
      )}
      {unplaced.map(({ partId, quantity, reason }) => (
        <Notice key={partId} tone="danger" title={`${labelOf(partId)}: ${quantity} not planned.`}>
          {reason}
        </Notice>
      ))}
      <ol className="grid gap-5">
        {drawn.map((each, index) => (
          <li key={index} className="grid gap-1">
            <CuttingDiagram
              length={each.length}
              width={each.width}
              pieces={each.pieces}
              grain={each.grain}
              label={`${each.times > 1 ? `${each.times} times ` : ''}${format(each.length).text}: ${each.pieces
                .filter(({ look }) => look !== 'kept')
                .map(({ label }) => label)
                .join(', ')}`}
            />
            <p className="text-[1.0625rem]">
              {each.times > 1 && <b>{each.times} of these. </b>}
              <TrueFractions text={each.cuts.map((cut) => `${cut.word} ${format(cut.setting).text}`).join(' · ')} />
            </p>
          </li>
        ))}
      </ol>
    </>
  );
}

function buyWords(drawn: readonly DrawnPiece[], size: (length: number) => string): string {
  const counts = new Map<string, number>();
  for (const { sold, times } of drawn) {
    const words = sold.width === null ? size(sold.length) : `${size(sold.length)} × ${size(sold.width)}`;
    counts.set(words, (counts.get(words) ?? 0) + times);
  }
  return counts.size === 0 ? 'Nothing to buy' : [...counts].map(([words, count]) => `${count} of ${words}`).join(', ');
}

function costWords({ job, plan }: PlannedJob): string {
  const currency = job.stock.price?.amount.currency;
  return currency === undefined
    ? ''
    : `, ${formatMoney({ minor: plan.cost, currency }, navigator.language)} before tax`;
}

/** Whole per cents of what is bought that become dust and scrap, and that are left over to keep. */
function shares(drawn: readonly DrawnPiece[]): { waste: number; kept: number } {
  const area = (rows: readonly { length: number; width: number }[]) =>
    rows.reduce((sum, { length, width }) => sum + length * width, 0);
  const bought = drawn.reduce((sum, { length, width, times }) => sum + length * width * times, 0);
  const of = (look: (kept: boolean) => boolean) =>
    drawn.reduce(
      (sum, { pieces, times }) => sum + times * area(pieces.filter((each) => look(each.look === 'kept'))),
      0,
    );
  const percent = (part: number) => Math.round((part / Math.max(1, bought)) * 100);
  const kept = percent(of((isKept) => isKept));
  return { kept, waste: 100 - kept - percent(of((isKept) => !isKept)) };
}
