import type { EntryValue } from '@/lib/domain/build/kinds';
import type { PlanCheck } from '@/lib/domain/plan/document';
import type { FormattedLength } from '@/lib/domain/measure';

type Format = (length: number) => Pick<FormattedLength, 'text'>;

/** Result of a check in a word or two. */
export function verdictWords(value: EntryValue<'check-recorded'> | undefined): string {
  switch (value?.verdict) {
    case 'within':
      return 'Within';
    case 'outside':
      return 'Outside: see to it';
    case 'accepted':
      return 'Accepted as it is';
    default:
      return 'Not taken yet';
  }
}

/** What the check holds a reading against: "17 1/4″, up to 1/32″ more, 1/16″ less". */
export function toleranceWords(check: PlanCheck, target: number | null, format: Format): string {
  const { judge } = check;
  if (judge.kind === 'yes') return judge.question;
  if (judge.kind === 'difference')
    return `${judge.of[0]} and ${judge.of[1]} agree within ${format(judge.tolerance).text}`;
  if (target === null) return 'The size is not known yet';
  const { plus, minus } = judge;
  if (plus === minus) return `${format(target).text}, ${format(plus).text} more or less`;
  return `${format(target).text}, at most ${format(plus).text} more or ${format(minus).text} less`;
}
