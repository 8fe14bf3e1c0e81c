import { mkdirSync } from 'node:fs';
import { chromium, type Page } from '@playwright/test';
import sharp from 'sharp';
import { signIn, takeToBench } from '@/tests/e2e/support/people';
import { Program } from '@/tests/e2e/support/program';

/**
 * Takes the pictures of the README and the manual from the real program, by day and dim, and writes them to docs/pictures:
 * TEST_DATABASE_URL=… npx tsx scripts/take-pictures.ts, after a build.
 */
const views = [
  ['what-now', ''],
  ['step', '&view=step&step=cut-laps'],
  ['glue', '&view=step&step=glue-halves'],
  ['steps', '&view=steps'],
  ['cut-list', '&view=cuts'],
  ['timers', '&view=timers'],
  ['photos', '&view=photos'],
  ['notes', '&view=notes'],
  ['sizes', '&view=sizes'],
  ['cutting', '&view=cutting'],
  ['drawings', '&view=drawings'],
  ['log', '&view=log'],
  ['close-down', '&view=close'],
  ['emergency', '&view=emergency'],
  ['sending', '&view=sync'],
  ['settings', '&view=settings'],
] as const;
const SIZE = { width: 390, height: 844 };

const program = await Program.prepare({ seed: true });
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
mkdirSync('docs/pictures', { recursive: true });
try {
  await program.start();
  const context = await browser.newContext({
    viewport: SIZE,
    deviceScaleFactor: 1.5,
    hasTouch: true,
    locale: 'en-US',
    colorScheme: 'light',
  });
  const page = await context.newPage();
  await signIn(page, program, 'builder@holdfast.example');
  await takeToBench(page, program, 'Hall bench');
  const buildId = (await program.rows<{ id: string }>('select id from builds'))[0]!.id;
  await workABit(page, buildId);
  for (const scheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme: scheme });
    for (const [name, query] of views) {
      await page.goto(`${program.url}/bench?build=${buildId}${query}`);
      await page.getByRole('heading', { level: 1 }).waitFor();
      if (name === 'cutting') await page.getByText('All stock is planned.').waitFor({ state: 'attached' });
      await page.evaluate(() => document.fonts.ready);
      await page.screenshot({ path: `docs/pictures/${name}-${scheme === 'light' ? 'day' : 'dim'}.png` });
    }
  }
  await joinPictures(['step-day', 'timers-day', 'cut-list-day', 'step-dim', 'timers-dim']);
} finally {
  await browser.close();
  await program.end();
}

/** A few acts, so that the pictures show a build under way. */
async function workABit(page: Page, buildId: string): Promise<void> {
  for (const stepId of ['choose-boards', 'rough-cut-seat', 'measure-sheets', 'rip-seat']) {
    await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=${stepId}`);
    await page.getByRole('slider').waitFor();
    // The demo's build has some of them done.
    const done = page.getByRole('button', { name: 'Done', exact: true });
    if (!(await done.isVisible())) continue;
    await done.click();
    await page.getByRole('button', { name: /On with step/ }).waitFor();
  }
  await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=glue-halves`);
  await page.getByRole('button', { name: 'First glue', exact: true }).click();
  await page.getByRole('button', { name: /Clamps on/ }).waitFor();
}

/** The README's picture: some of them side by side. */
async function joinPictures(names: string[]): Promise<void> {
  const [width, height] = [SIZE.width * 1.5, SIZE.height * 1.5];
  const gap = 18;
  await sharp({ create: { width: names.length * (width + gap) - gap, height, channels: 3, background: '#8a8a8a' } })
    .composite(names.map((name, i) => ({ input: `docs/pictures/${name}.png`, left: i * (width + gap), top: 0 })))
    .png({ palette: true })
    .toFile('docs/pictures/bench.png');
}
