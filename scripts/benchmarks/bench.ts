import { gzipSync } from 'node:zlib';
import { readFileSync } from 'node:fs';
import { chromium, type BrowserContext, type Page } from '@playwright/test';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { post } from '@/tests/e2e/support/builds';
import { signIn, takeToBench } from '@/tests/e2e/support/people';
import { Program } from '@/tests/e2e/support/program';

/**
 * Figures of the bench in Debian's Chromium, printed and never judged: first-load JavaScript, cold open with the server
 * stopped at a quarter of the speed, and the time from a tap to a durable entry in a build of 300 steps.
 */
const STEPS = 300;
const TAPS = 60;
const OPENS = 7;
const BUILD_NAME = 'Three hundred steps';

/** As text, since the page knows nothing of what the loader wraps functions in. */
const MARK_USABLE = `
  const observer = new MutationObserver(() => {
    if (![...document.querySelectorAll('button')].some((button) => button.textContent.trim() === 'Done')) return;
    observer.disconnect();
    requestAnimationFrame(() => requestAnimationFrame(() => performance.mark('usable')));
  });
  observer.observe(document, { subtree: true, childList: true });
`;

const program = await Program.prepare({ seed: true });
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
try {
  await program.start();
  console.log(`first-load JavaScript of /bench: ${await firstLoadKb()} KB gzip`);
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } });
  const page = await context.newPage();
  await signIn(page, program, 'builder@holdfast.example');
  const buildId = await startLongBuild(page);
  await takeToBench(page, program, BUILD_NAME);
  await program.stop();
  await page.close();
  print('cold open offline to usable, CPU at a quarter', await coldOpens(context, buildId));
  print(`tap to durable, ${STEPS} steps`, await taps(context, buildId, 1));
  print(`tap to durable, ${STEPS} steps, CPU at a quarter`, await taps(context, buildId, 4));
} finally {
  await browser.close();
  await program.end();
}

async function firstLoadKb(): Promise<string> {
  const html = await (await fetch(`${program.url}/bench`)).text();
  // A noModule script is for browsers without modules: none that the bench runs in fetches it.
  const tags = [...html.matchAll(/<script[^>]+src="([^"]+)"[^>]*>/g)].filter(([tag]) => !/ nomodule/i.test(tag));
  const sources = new Set(tags.map((match) => match[1]!));
  let bytes = 0;
  for (const source of sources)
    bytes += gzipSync(Buffer.from(await (await fetch(program.url + source)).arrayBuffer())).length;
  return (bytes / 1_000).toFixed(0);
}

/** A plan of many steps that wait for nothing, brought in and started through the program's own routes. */
async function startLongBuild(page: Page): Promise<string> {
  const plan = JSON.parse(readFileSync('plans/folding-trestles.json', 'utf8')) as PlanDocument;
  const [first] = plan.steps;
  const more = Array.from({ length: STEPS - plan.steps.length }, (_, i) => ({
    ...first!,
    id: `extra-${i + 1}`,
    title: `Extra step ${i + 1}`,
    checks: [],
    photosWanted: [],
  }));
  const long = { ...plan, id: 'long-plan', title: BUILD_NAME, steps: [...more, ...plan.steps] };
  const { planId } = await post<{ planId: string }>(page, '/api/plans/import', JSON.stringify(long));
  const { buildId } = await post<{ buildId: string }>(
    page,
    '/api/builds',
    JSON.stringify({ planId, name: BUILD_NAME }),
  );
  return buildId;
}

async function slowPage(context: BrowserContext, rate: number): Promise<Page> {
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send('Emulation.setCPUThrottlingRate', { rate });
  return page;
}

/** From the start of the navigation until the plate to tap stands there and is painted, as the page itself saw it. */
async function coldOpens(context: BrowserContext, buildId: string): Promise<number[]> {
  const times: number[] = [];
  for (let i = 0; i < OPENS; i += 1) {
    const page = await slowPage(context, 4);
    await page.addInitScript(MARK_USABLE);
    await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=extra-${200 + i}`, { waitUntil: 'commit' });
    await page.waitForFunction(() => performance.getEntriesByName('usable').length > 0);
    times.push(await page.evaluate(() => performance.getEntriesByName('usable')[0]!.startTime));
    await page.close();
  }
  return times;
}

async function taps(context: BrowserContext, buildId: string, rate: number): Promise<number[]> {
  const page = await slowPage(context, rate);
  const times: number[] = [];
  const offset = rate === 1 ? 1 : 1 + TAPS;
  for (let i = 0; i < TAPS; i += 1) {
    await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=extra-${offset + i}`);
    await page.getByRole('button', { name: 'Done', exact: true }).waitFor();
    times.push(
      await page.evaluate(async () => {
        const plate = [...document.querySelectorAll('button')].find((button) => button.textContent?.trim() === 'Done')!;
        const from = performance.now();
        const saved = new Promise<void>((resolve) => {
          // The screen says so only when the transaction has completed.
          const observer = new MutationObserver(() => {
            if (!document.body.textContent.includes('On with step')) return;
            observer.disconnect();
            resolve();
          });
          observer.observe(document.body, { subtree: true, childList: true, characterData: true });
        });
        plate.click();
        await saved;
        return performance.now() - from;
      }),
    );
  }
  await page.close();
  return times;
}

function print(what: string, times: number[]): void {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (share: number) => sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))]!.toFixed(0);
  console.log(`${what}: p50 ${at(0.5)} ms, p95 ${at(0.95)} ms, of ${times.length}`);
}
