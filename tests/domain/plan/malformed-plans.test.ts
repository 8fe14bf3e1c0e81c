import { describe, expect, it } from 'vitest';
import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { MAX_PLAN_BYTES } from '@/lib/domain/plan/document';
import { readPlan } from '@/lib/domain/plan/read-plan';
import { bootTray } from '@/plans/boot-tray/index';

type Loose = { [key: string]: Loose } & Loose[] & (string | number | boolean | null | undefined);

/** The example plan with one thing broken. Loose on purpose: what is put in is what the types would refuse. */
function broken(breakIt: (plan: Loose) => void): unknown {
  const plan = JSON.parse(JSON.stringify(bootTray satisfies PlanDocumentInput)) as Loose;
  breakIt(plan);
  return plan;
}

const put = (holder: Loose, key: string | number, value: unknown) => {
  (holder as Record<string, unknown>)[key] = value;
};

/** What is wrong, the plan, where it must be found, what must be said to be expected there, words of the message. */
const cases: [string, () => unknown, string, RegExp, RegExp][] = [
  ['no JSON', () => '{"format": "holdfast-plan",\n "title": }', '', /JSON text/, /line 2, column \d+/],
  ['an empty file', () => '', '', /JSON text/, /not JSON/],
  ['a list', () => [], '', /a JSON object/, /a list of 0/],
  ['nothing but null', () => 'null', '', /a JSON object/, /null/],
  ['another format', () => broken((p) => put(p, 'format', 'shelf')), 'format', /"holdfast-plan"/, /"shelf"/],
  ['a version to come', () => broken((p) => put(p, 'version', 99)), 'version', /^1$/, /99/],
  ['no title', () => broken((p) => delete (p as Record<string, unknown>).title), 'title', /text/, /missing/],
  ['a blank title', () => broken((p) => put(p, 'title', '   ')), 'title', /some text/, /title/],
  [
    'an unknown field',
    () => broken((p) => put(p.parts![0]!, 'colour', 'red')),
    'parts[0].colour',
    /only fields/,
    /"colour"/,
  ],
  [
    'text for a length',
    () => broken((p) => put(p.stock![0]!, 'width', '3 in')),
    'stock[0].width',
    /whole number/,
    /"3 in"/,
  ],
  [
    'half a unit',
    () => broken((p) => put(p.parts![0]!, 'width', 640.5)),
    'parts[0].width',
    /whole number of 1\/640 mm or a formula/,
    /640\.5/,
  ],
  ['a length below zero', () => broken((p) => put(p.stock![0]!, 'width', -1)), 'stock[0].width', /above zero/, /-1/],
  [
    'an id with capitals',
    () => broken((p) => put(p.stages![0]!, 'id', 'Wood')),
    'stages[0].id',
    /lower-case/,
    /"Wood"/,
  ],
  [
    'an unknown kind of stock',
    () => broken((p) => put(p.stock![0]!, 'kind', 'stone')),
    'stock[0].kind',
    /"lumber" or "sheet"/,
    /"stone"/,
  ],
  [
    'a range upside down',
    () => broken((p) => put(p, 'hours', { min: 9, max: 2 })),
    'hours',
    /min is not above/,
    /hours/,
  ],
  ['no steps', () => broken((p) => put(p, 'steps', [])), 'steps', /./, /a list of 0/],
  [
    'a step of no stage',
    () => broken((p) => put(p.steps![0]!, 'stage', 'roof')),
    'steps[0].stage',
    /id of a stage/,
    /"roof"/,
  ],
  [
    'a part of no stock',
    () => broken((p) => put(p.parts![1]!, 'stock', 'elm')),
    'parts[1].stock',
    /id of a stock/,
    /"elm"/,
  ],
  [
    'an unknown part used',
    () => broken((p) => put(p.steps![0]!.uses![0]!, 'part', 'lid')),
    'steps[0].uses[0].part',
    /id of a part/,
    /"lid"/,
  ],
  [
    'an unknown step waited for',
    () => broken((p) => put(p.steps![2]!.after!, 0, 'plane-it')),
    'steps[2].after[0]',
    /id of a step/,
    /"plane-it"/,
  ],
  [
    'steps in a circle',
    () => broken((p) => put(p.steps![0]!, 'after', ['oil-first'])),
    'steps[0].after',
    /without circles/,
    /cut-base/,
  ],
  [
    'glue waited for where there is none',
    () => broken((p) => put(p.steps![3]!, 'after', [{ step: 'cut-rim', glue: 'cured' }])),
    'steps[3].after[0].glue',
    /glue-up/,
    /glues nothing/,
  ],
  [
    'an id used twice',
    () => broken((p) => put(p.parts![1]!, 'id', 'base')),
    'parts[1].id',
    /used once/,
    /"base" is used twice/,
  ],
  [
    'a label used twice',
    () => broken((p) => put(p.parts![1]!, 'label', 'A')),
    'parts[1].label',
    /label used once/,
    /labelled A/,
  ],
  [
    'odd pairs',
    () => broken((p) => put(p.parts![1]!, 'quantity', 3)),
    'parts[1].quantity',
    /even quantity/,
    /3 pieces/,
  ],
  [
    'a formula of an unknown size',
    () => broken((p) => put(p.parts![0]!, 'length', '=shelf-length - 40 mm')),
    'parts[0].length',
    /comes to a length/,
    /shelf-length/,
  ],
  [
    'a formula cut off',
    () => broken((p) => put(p.parts![0]!, 'length', '=tray-length -')),
    'parts[0].length',
    /comes to a length/,
    /missing before the end/,
  ],
  [
    'a formula that comes to less than nothing',
    () => broken((p) => put(p.parts![0]!, 'length', '=tray-length - 5 m')),
    'parts[0].length',
    /above zero/,
    /nothing or less/,
  ],
  [
    'formulas in a circle',
    () =>
      broken((p) => {
        put(p.keySizes![0]!, 'formula', '=base-length + 40 mm');
      }),
    'keySizes[2].formula',
    /comes to a length/,
    /waits for/,
  ],
  [
    'a default outside its range',
    () => broken((p) => put(p.keySizes![0]!, 'default', 64)),
    'keySizes[0].default',
    /within its range/,
    /outside its own range/,
  ],
  [
    'a piece too many',
    () => broken((p) => put(p.placements![0]!, 'piece', 2)),
    'placements[0].piece',
    /from 1 to 1/,
    /no piece 2/,
  ],
  [
    'a piece in two places',
    () => broken((p) => put(p.placements![2]!, 'piece', 1)),
    'placements[2]',
    /one place/,
    /placed twice/,
  ],
  ['half a character', () => broken((p) => put(p, 'title', 'Tray \ud83d')), 'title', /half characters/, /character/],
  [
    'a null character',
    () => broken((p) => put(p.steps![1]!, 'body', 'a\u0000b')),
    'steps[1].body',
    /null characters/,
    /character/,
  ],
  [
    'a value nested too deep',
    () =>
      broken((p) => {
        let at: Loose = p;
        for (let i = 0; i < 40; i++) {
          put(at, 'x', {});
          at = at.x!;
        }
      }),
    Array.from({ length: 16 }, () => 'x').join('.'),
    /at most 16 levels/,
    /deeper/,
  ],
  ['a file too large', () => `${' '.repeat(MAX_PLAN_BYTES)}{}`, '', /at most 12 MB/, /12\.0 MB/],
];

describe('a malformed plan', () => {
  it.each(cases)('with %s is refused with its path and what was expected', (_, make, path, expected, message) => {
    const read = readPlan(make());
    expect(read.ok).toBe(false);
    if (read.ok) return;
    const at = read.problems.filter((problem) => problem.path === path);
    expect(read.problems.map((problem) => problem.path)).toContain(path);
    expect(at.map((problem) => problem.expected).join(' | ')).toMatch(expected);
    expect(at.map((problem) => problem.message).join(' | ')).toMatch(message);
  });

  it('has at least twenty kinds here, each of which breaks a plan that is taken as it stands', () => {
    expect(cases.length).toBeGreaterThanOrEqual(20);
    expect(readPlan(broken(() => undefined)).ok).toBe(true);
  });

  it('says several problems at once, and no more than fifty', () => {
    const read = readPlan(
      broken((p) =>
        put(
          p,
          'parts',
          Array.from({ length: 80 }, () => ({ id: 'X' })),
        ),
      ),
    );
    expect(read.ok ? 0 : read.problems.length).toBeGreaterThan(10);
    expect(read.ok ? 0 : new Set(read.problems.map(({ path }) => path)).size).toBeGreaterThan(10);
  });

  it('is taken with the mark that some editors put before the text', () => {
    expect(readPlan(`\ufeff${JSON.stringify(bootTray)}`).ok).toBe(true);
  });
});
