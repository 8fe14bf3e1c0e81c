import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { parseLength, UNITS_PER_MM } from '@/lib/domain/measure';

/** Source: GNU units 2.22, definitions file 3.15 (Debian package `units`): inch = 2.54 cm, foot = 12 inch, exactly. */
const cases: [ours: string, theirs: string][] = [
  ['1 in', 'inch'],
  ['8 ft', '8 foot'],
  ['8\' 2 1/2"', '8 foot + 2 inch + 1|2 inch'],
  ['3 1/4', '3 inch + 1|4 inch'],
  ['23/32', '23|32 inch'],
  ['1/128', '1|128 inch'],
  ['127/128', '127|128 inch'],
  ['82.5 mm', '82.5 mm'],
  ['8.25 cm', '8.25 cm'],
  ['2.44 m', '2.44 m'],
  ['0.1 mm', '0.1 mm'],
  ['97 63/64', '97 inch + 63|64 inch'],
  ['16 ft', '16 foot'],
];

describe('lengths against GNU units', () => {
  const answers = askUnits(cases.map(([, theirs]) => `${theirs}\nmm\n`).join(''));

  it('answers every question', () => expect(answers).toHaveLength(cases.length));

  it.each(cases.map(([ours, theirs], i) => ({ ours, theirs, mm: Number(answers[i]) })))(
    '$ours is $theirs',
    ({ ours, mm }) => {
      const result = parseLength(ours, { defaultUnit: 'in' });
      expect(mm).toBeGreaterThan(0);
      expect(result.ok && result.length / UNITS_PER_MM).toBeCloseTo(mm, 9);
      expect(result.ok && result.rounded).toBe(false);
    },
  );
});

function askUnits(input: string): string[] {
  const run = spawnSync('units', ['--terse', '--digits', '15', '-f', ''], { input, encoding: 'utf8' });
  if (run.error) throw new Error('This check needs GNU units: apt-get install units', { cause: run.error });
  if (run.status !== 0) throw new Error(`units: ${run.stderr || run.stdout}`);
  return run.stdout.trim().split('\n');
}
