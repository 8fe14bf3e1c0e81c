import { readFileSync } from 'node:fs';
import type { Browser, BrowserContext, Page } from '@playwright/test';
import { signUp, takeToBench, toni } from './people';
import { Program } from './program';

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

/** Starts a build of the trestles for who is signed in on the page that is open. */
export async function startBuild(page: Page, name: string): Promise<string> {
  const plan = readFileSync('plans/folding-trestles.json', 'utf8');
  const { planId } = await post<{ planId: string }>(page, '/api/plans/import', plan);
  return (await post<{ buildId: string }>(page, '/api/builds', JSON.stringify({ planId, name }))).buildId;
}

/** A build of the trestles, taken to the bench. */
export async function buildAtBench(page: Page, program: Program, name: string): Promise<string> {
  const buildId = await startBuild(page, name);
  await takeToBench(page, program, name);
  return buildId;
}

/** A phone at the bench of a program of its own. */
export interface Bench {
  program: Program;
  context: BrowserContext;
  page: Page;
  buildId: string;
  accountId: string;
  /** Opens a view of the build by a whole load. */
  open: (view: string) => Promise<unknown>;
}

/** The program started, Toni signed up on a phone, and a build of the trestles taken to the bench. */
export async function startBench(browser: Browser, name: string): Promise<Bench> {
  const program = await Program.prepare();
  await program.start();
  const context = await browser.newContext({ viewport: { width: 390, height: 844 }, acceptDownloads: true });
  const page = await context.newPage();
  await signUp(page, program, toni);
  const buildId = await buildAtBench(page, program, name);
  const [account] = await program.rows<{ id: string }>('select id from accounts');
  const open = (view: string) => page.goto(`${program.url}/bench?build=${buildId}&view=${view}`);
  return { program, context, page, buildId, accountId: account!.id, open };
}
