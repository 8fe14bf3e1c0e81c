import type { PlanCaution } from '@/lib/domain/plan/document';
import { TrueFractions } from '../entry/true-fractions';

/** Cautions next to the action: what can hurt a person in red, first; what can spoil the work in iron. */
export function Cautions({ cautions }: { cautions: readonly PlanCaution[] }) {
  if (cautions.length === 0) return null;
  const ordered = [...cautions].sort((a, b) => Number(b.level === 'danger') - Number(a.level === 'danger'));
  return (
    <ul className="grid gap-3" aria-label="Cautions">
      {ordered.map(({ level, about, do: what }) => (
        <li
          key={`${about} ${what}`}
          className={`rounded-[3px] border-2 bg-paper px-4 py-3 text-[1.1875rem] ${
            level === 'danger' ? 'border-red border-l-[12px]' : 'border-iron'
          }`}
        >
          <b className={`font-figures text-[1.3125rem] font-semibold ${level === 'danger' ? 'text-red' : ''}`}>
            {about}.
          </b>{' '}
          <TrueFractions text={what} />
        </li>
      ))}
    </ul>
  );
}
