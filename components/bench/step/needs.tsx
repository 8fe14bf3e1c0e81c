'use client';
import { getOut } from '@/lib/domain/build/get-out';
import type { PlanStep } from '@/lib/domain/plan/document';
import { minutesWords } from '../entry/time-words';
import { useBuild } from '../shell/build-context';

/** Tools, hardware, clamps, people and time that a step takes, as one short list. */
export function Needs({ step }: { step: PlanStep }) {
  const { plan, state } = useBuild();
  const { tools, items, clamps, people } = getOut(plan, state, step);
  const rows: [string, string][] = [
    ['Time', `${minutesWords(step.minutes)} of hands-on work`],
    ...(tools.length > 0 ? ([['Tools', tools.join(', ')]] as [string, string][]) : []),
    ...items.map(({ item, quantity, unit }): [string, string] => ['Takes', `${quantity} ${unit} ${item}`]),
    ...(clamps > 0 ? ([['Clamps', String(clamps)]] as [string, string][]) : []),
    ...(people > 1 ? ([['People', `${people}: this needs help`]] as [string, string][]) : []),
  ];
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 border-t border-line text-[1.125rem]">
      {rows.map(([name, says]) => (
        <div key={`${name} ${says}`} className="col-span-2 grid grid-cols-subgrid border-b border-line py-2">
          <dt className="font-figures text-soft">{name}</dt>
          <dd>{says}</dd>
        </div>
      ))}
    </dl>
  );
}
