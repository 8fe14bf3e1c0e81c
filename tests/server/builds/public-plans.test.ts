import { readFileSync } from 'node:fs';
import { beforeEach, describe, expect, it } from 'vitest';
import * as buildsRoute from '@/app/api/builds/route';
import * as exportRoute from '@/app/api/plans/[planId]/export/route';
import * as importRoute from '@/app/api/plans/import/route';
import * as plansRoute from '@/app/api/plans/route';
import type { PlanProblem } from '@/lib/domain/plan/plan-problem';
import type { Account } from '@/lib/server/auth/read-session';
import { importPlan } from '@/lib/server/commands/import-plan';
import type { PlanRow } from '@/lib/server/queries/plans';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { demoPlan } from '../../support/plans';
import { ownRequest, routeContext } from '../../support/request';

const database = useDatabase();
const bench = readFileSync('plans/hall-bench.json', 'utf8');

let author: Account;
let cookie: string;
beforeEach(async () => {
  author = await makeAccount({ role: 'author' });
  ({ cookie } = await signedIn((await makeAccount()).id));
});

async function listed(): Promise<PlanRow[]> {
  const response = await plansRoute.GET(ownRequest('/api/plans', { cookie }), routeContext({}));
  return ((await response.json()) as { plans: PlanRow[] }).plans;
}

async function start(planId: string): Promise<{ status: number; buildId?: string }> {
  const body = { planId, name: 'Mine' };
  const response = await buildsRoute.POST(
    ownRequest('/api/builds', { method: 'POST', cookie, body }),
    routeContext({}),
  );
  return { status: response.status, ...((await response.json()) as { buildId?: string }) };
}

const save = (planId: string) =>
  exportRoute.GET(ownRequest(`/api/plans/${planId}/export`, { cookie }), routeContext({ planId }));

async function bring(text: string): Promise<{ status: number; problems: PlanProblem[] }> {
  const own = ownRequest('/api/plans/import', { method: 'POST', cookie });
  const response = await importRoute.POST(new Request(own, { body: text }), routeContext({}));
  return { ...((await response.json()) as { problems: PlanProblem[] }), status: response.status };
}

describe('plans of others', () => {
  it('are listed, built and saved as a file where they are public, and are not there where they are private', async () => {
    const open = await importPlan(author, bench, { visibility: 'public' });
    const closed = await importPlan(author, demoPlan('folding-trestles'));
    const rows = (await listed()).filter(({ id }) => id === open.planId || id === closed.planId);
    expect(rows).toMatchObject([
      { id: open.planId, visibility: 'public', isOwn: false, revisionId: open.revisionId, revisionNumber: 1 },
    ]);

    expect(await start(open.planId)).toMatchObject({ status: 200, buildId: expect.any(String) });
    expect(await start(closed.planId)).toMatchObject({ status: 404 });

    const file = await save(open.planId);
    expect(file.headers.get('content-disposition')).toBe('attachment; filename="hall-bench.json"');
    expect((await save(closed.planId)).status).toBe(404);

    expect(await bring(await file.text())).toMatchObject({ status: 200, contentHash: open.contentHash, isNew: true });
    expect((await listed()).filter(({ title }) => title === rows[0]!.title).map(({ isOwn }) => isOwn)).toContain(true);
  });

  it('make the one who begins a build its owner, and no one else of its crew', async () => {
    const { planId } = await importPlan(author, bench, { visibility: 'public' });
    const { buildId } = await start(planId);
    const crew = await database().models.CrewMember.findAll({ where: { buildId } });
    expect(crew.map(({ role }) => role)).toEqual(['owner']);
    expect(crew[0]!.accountId).not.toBe(author.id);
  });

  it('keep their author’s files to themselves: a drawing left out is not filled in from a public plan', async () => {
    await importPlan(author, bench, { visibility: 'public' });
    const plan = JSON.parse(bench) as { attachments: { content?: string }[] };
    delete plan.attachments[0]!.content;
    const answer = await bring(JSON.stringify(plan));
    expect(answer).toMatchObject({ status: 422, problems: [{ path: 'attachments[0].content' }] });
  });
});

describe('a slip in a plan file', () => {
  const lines = bench.split('\n');

  it.each([
    ['a comma too many', [...lines.slice(0, 4), `${lines[4]},`, ...lines.slice(5)].join('\n'), 5],
    ['a quote that is missing', lines.map((line, i) => (i === 2 ? line.replace('"', '') : line)).join('\n'), 3],
    ['an end that is missing', lines.slice(0, 40).join('\n'), 40],
  ])('%s is named by its line and column', async (_name, text, line) => {
    const { status, problems } = await bring(text);
    expect(status).toBe(422);
    expect(problems).toHaveLength(1);
    const found = /line (\d+), column (\d+)/.exec(problems[0]!.message);
    expect(found, problems[0]!.message).not.toBeNull();
    expect(Number(found![1])).toBeGreaterThanOrEqual(line);
    expect(Number(found![1])).toBeLessThanOrEqual(line + 1);
    expect(Number(found![2])).toBeGreaterThan(0);
  });
});
