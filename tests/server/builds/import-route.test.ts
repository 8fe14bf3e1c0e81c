import { beforeAll, describe, expect, it } from 'vitest';
import * as route from '@/app/api/plans/import/route';
import type { PlanDocument } from '@/lib/domain/plan/document';
import type { PlanProblem } from '@/lib/domain/plan/plan-problem';
import { listPlans } from '@/lib/server/queries/plans';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { demoPlan } from '../../support/plans';
import { ownRequest, routeContext } from '../../support/request';

useDatabase();
const whole = JSON.stringify(demoPlan('folding-trestles'));

let accountId: string;
let cookie: string;
beforeAll(async () => {
  accountId = (await makeAccount()).id;
  ({ cookie } = await signedIn(accountId));
});

interface Answer {
  status: number;
  code?: string;
  detail?: string;
  problems?: PlanProblem[];
}

async function bring(body: BodyInit): Promise<Answer> {
  const own = ownRequest('/api/plans/import', { method: 'POST', cookie });
  const response = await route.POST(new Request(own, { body }), routeContext({}));
  return { ...((await response.json()) as Omit<Answer, 'status'>), status: response.status };
}

/** The trestles with one thing changed, as text. */
function but(change: (plan: PlanDocument) => unknown): string {
  const plan = JSON.parse(whole) as PlanDocument;
  change(plan);
  return JSON.stringify(plan);
}
const set = (at: object, name: string, value: unknown) => Object.assign(at, { [name]: value });
const step = (plan: PlanDocument, i: number) => plan.steps[i]!;

/** What is wrong, the file, and the path that is named. */
const malformed: [string, string, string][] = [
  ['nothing at all', '', ''],
  ['no JSON', 'A bench, 1200 long', ''],
  ['JSON cut short', whole.slice(0, 5_000), ''],
  ['a list', '[]', ''],
  ['null', 'null', ''],
  ['another kind of document', but((plan) => set(plan, 'format', 'shopping-list')), 'format'],
  ['a version that is not known', but((plan) => set(plan, 'version', 2)), 'version'],
  ['a field that no plan has', but((plan) => set(plan, 'colour', 'red')), 'colour'],
  ['no title', but((plan) => set(plan, 'title', undefined)), 'title'],
  ['a title that is blank', but((plan) => set(plan, 'title', '   ')), 'title'],
  ['an id with spaces', but((plan) => set(plan, 'id', 'My bench')), 'id'],
  ['no steps', but((plan) => set(plan, 'steps', [])), 'steps'],
  ['a length with decimals', but((plan) => set(plan.keySizes[0]!, 'default', 1.5)), 'keySizes[0].default'],
  ['a length below zero', but((plan) => set(plan.keySizes[0]!, 'default', -640)), 'keySizes[0].default'],
  ['a quantity as text', but((plan) => set(plan.parts[0]!, 'quantity', 'four')), 'parts[0].quantity'],
  ['a part of stock that is not there', but((plan) => set(plan.parts[0]!, 'stock', 'oak')), 'parts[0].stock'],
  ['a step in a stage that is not there', but((plan) => set(step(plan, 0), 'stage', 'x')), 'steps[0].stage'],
  ['a step after one that is not there', but((plan) => set(step(plan, 1), 'after', ['x'])), 'steps[1].after[0]'],
  ['two steps of one id', but((plan) => set(step(plan, 1), 'id', step(plan, 0).id)), 'steps[1].id'],
  ['steps in a circle', but((plan) => set(step(plan, 0), 'after', [plan.steps.at(-1)!.id])), 'steps[0].after'],
  ['a formula that divides by nothing', but((plan) => set(plan.parts[0]!, 'length', '=leg-length / 0')), 'parts[0]'],
  ['a formula of a size that is not there', but((plan) => set(plan.parts[0]!, 'length', '=moon')), 'parts[0].length'],
  [
    'key sizes in a circle',
    but((plan) => set(plan.keySizes[2]!, 'formula', `=${plan.keySizes[2]!.id} + 1`)),
    'keySizes[2]',
  ],
  ['nesting past all reason', `{"a":${'['.repeat(40)}${']'.repeat(40)}}`, 'a'],
  ['a null character in a text', but((plan) => set(plan, 'title', 'Trestles\0')), 'title'],
  ['half an emoji in a text', but((plan) => set(step(plan, 2), 'body', 'Cut \ud83e here')), 'steps[2].body'],
  ['a name of the language as a field', `{"__proto__":{"format":"holdfast-plan"}}`, ''],
];

describe('a plan file that is no plan', () => {
  it.each(malformed)('%s is refused in words, by path', async (_name, text, path) => {
    const answer = await bring(text);
    expect(answer).toMatchObject({ status: 422, code: 'invalid' });
    const paths = answer.problems!.map((problem) => problem.path);
    expect(path === '' ? paths : paths.filter((named) => named.startsWith(path))).not.toEqual([]);
    for (const { expected, message } of answer.problems!) {
      expect(expected).not.toBe('');
      expect(message).not.toMatch(/undefined|\[object|Error/);
    }
  });

  it('a picture is refused as no text', async () => {
    const answer = await bring(new Uint8Array([0xff, 0xd8, 0xff, 0xe0, 0x00, 0x10]));
    expect(answer).toMatchObject({ status: 422, problems: [{ message: 'The file is not text in UTF-8.' }] });
  });

  it('a file past 12 MB is refused before it is read', async () => {
    expect(await bring('x'.repeat(12_000_001))).toMatchObject({ status: 413, code: 'too-large' });
  });

  it('leaves nothing behind', async () => {
    expect(await listPlans(accountId)).toEqual([]);
  });

  it('goes in when it is whole, with or without a byte order mark', async () => {
    expect(await bring(`\ufeff${whole}`)).toMatchObject({ status: 200, isNew: true, number: 1 });
    expect(await bring(whole)).toMatchObject({ status: 200, isNew: false, number: 1 });
  });
});
