import { readFileSync } from 'node:fs';
import type { Page } from '@playwright/test';
import { takeToBench } from './people';
import type { Program } from './program';

/** Sends JSON from the page, as the program's own pages do. */
export function post<T>(page: Page, path: string, body: string): Promise<T> {
  return page.evaluate(
    async ([to, text]) => {
      const answer = await fetch(to!, {
        method: 'POST',
        headers: { 'content-type': 'application/json', 'x-holdfast': '1' },
        body: text,
      });
      if (!answer.ok) throw new Error(await answer.text());
      return (await answer.json()) as T;
    },
    [path, body],
  );
}

/** A build of a demo plan for who is signed in, taken to the bench. */
export async function buildAtBench(
  page: Page,
  program: Program,
  name: string,
  plan: 'hall-bench' | 'folding-trestles' = 'folding-trestles',
): Promise<string> {
  const { planId } = await post<{ planId: string }>(
    page,
    '/api/plans/import',
    readFileSync(`plans/${plan}.json`, 'utf8'),
  );
  const { buildId } = await post<{ buildId: string }>(page, '/api/builds', JSON.stringify({ planId, name }));
  await takeToBench(page, program, name);
  return buildId;
}
