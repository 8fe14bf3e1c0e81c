import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { signIn, takeToBench } from './support/people';
import { phonePhoto } from './support/photos';
import { Program } from './support/program';

let program: Program;
let page: Page;
let buildId: string;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  program = await Program.prepare({ seed: true });
  await program.start();
  page = await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage();
});
test.afterAll(async () => {
  await program.end();
});

const bench = (search: string) => `/bench?build=${buildId}&view=${search}`;

/** What axe finds against WCAG 2.2 A and AA by day, and in the colours when dim, as lines that name rule and place. */
async function violations(): Promise<string[]> {
  const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
  const found: string[] = [];
  // Both on the page as it stands: a second loading would take most of the time.
  for (const light of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme: light });
    // In one pass: without frames there is nothing to put together on a page of its own.
    const axe = new AxeBuilder({ page }).setLegacyMode(true);
    // Only the colours are others when dim.
    if (light === 'light') axe.withTags(tags);
    else axe.withRules(['color-contrast', 'link-in-text-block']);
    for (const { id, nodes } of (await axe.analyze()).violations)
      for (const { target, failureSummary } of nodes)
        found.push(`${light} ${id}: ${target.join(' ')} ${failureSummary}`);
  }
  return found;
}

interface Screen {
  name: string;
  address: string;
  /** Is there when the screen is whole. */
  shows: RegExp;
  /** What is opened on it first. */
  open?: RegExp;
}

async function expectNoBarriers(screens: Screen[]): Promise<void> {
  const found: string[] = [];
  for (const { name, address, shows, open } of screens) {
    await page.goto(program.url + address);
    if (open) await page.getByRole('button', { name: open }).click();
    await expect(page.getByText(shows).first(), name).toBeVisible();
    await expect(page.getByRole('heading').first(), name).toBeVisible();
    found.push(...(await violations()).map((line) => `${name}: ${line}`));
  }
  expect(found).toEqual([]);
}

test('before the sign-in no screen has a barrier that axe knows, by day or dim', async () => {
  await expectNoBarriers([
    { name: 'sign-in', address: '/sign-in', shows: /^Password$/ },
    { name: 'sign-up', address: '/sign-up', shows: /^Password$/ },
    { name: 'forgotten password', address: '/forgotten', shows: /^E-mail$/ },
    { name: 'bench of nobody', address: '/bench', shows: /Nobody is signed in on this phone/ },
  ]);
});

test('at the desk no screen has a barrier that axe knows, by day or dim', async () => {
  await signIn(page, program, 'builder@holdfast.example');
  const [build] = await program.rows<{ id: string; name: string }>('select id, name from builds order by created_at');
  buildId = build!.id;
  await takeToBench(page, program, build!.name);
  await expectNoBarriers([
    { name: 'builds', address: '/desk', shows: /Hall bench/ },
    { name: 'build log', address: `/desk/builds/${buildId}`, shows: /knot to the hinge|with the knot goes/ },
    { name: 'plans', address: '/desk/plans', shows: /Hall bench/ },
    { name: 'account', address: '/desk/account', shows: /Sign out/ },
  ]);
});

/** Views of the build: name, view, words that are there when it is whole, what is opened on it first. */
const views = (...rows: [name: string, view: string, shows: RegExp, open?: RegExp][]): Screen[] =>
  rows.map(([name, view, shows, open]) => ({ name, address: bench(view), shows, open }));

test('the steps and timers of the bench have no barrier that axe knows, by day or dim', async () => {
  for (const [step, press, then] of [
    ['rip-seat', 'Done', /On with step/],
    ['glue-halves', 'First glue', /Clamps on/],
  ] as const) {
    await page.goto(program.url + bench(`step&step=${step}`));
    await page.getByRole('button', { name: press, exact: true }).click();
    await expect(page.getByRole('button', { name: then })).toBeVisible();
  }
  await expectNoBarriers(
    views(
      ['what now', 'now', /Lid halves/],
      ['steps', 'steps', /Rip/],
      ['a step', 'step&step=rip-carcass', /Rip/],
      ['a step that waits', 'step&step=glue-lid', /Do it all the same/, /Touch to go past it|Not yet/],
      ['a glue-up', 'step&step=glue-halves', /Clamps on/],
      ['timers', 'timers', /Lid halves/],
      ['cut list', 'cuts', /pieces cut/],
      ['what to buy', 'cutting', /All stock is planned/],
      ['sizes', 'sizes', /Thickness of/],
      ['drawings', 'drawings', /Front and side/],
      ['a drawing, large', 'drawings', /Larger/, /Front and side, with the main sizes: show it large/],
    ),
  );
});

test('the log and the rest of the bench have no barrier that axe knows, by day or dim', async () => {
  await page.goto(program.url + bench('photos'));
  await page
    .getByLabel('Choose a photo', { exact: true })
    .setInputFiles({ name: 'IMG.JPG', mimeType: 'image/jpeg', buffer: await phonePhoto(180) });
  await expect(page.getByRole('img')).toBeVisible();
  await expectNoBarriers([
    ...views(
      ['photos', 'photos', /Add a caption/],
      ['notes', 'notes', /Saw drifts a little/],
      ['log', 'log', /Saw drifts a little/],
      ['close-down', 'close', /clamps/i],
      ['more', 'more', /Build log/],
      ['sync', 'sync', /Last sent/],
      ['emergency card', 'emergency', /Emergency/],
    ),
    { name: 'builds on the phone', address: '/bench', shows: /Builds on this phone/ },
    { name: 'settings', address: '/bench?view=settings', shows: /Accounts on this phone/ },
    { name: 'sign-out', address: '/bench?view=settings', shows: /Stay signed in/, open: /^Sign out$/ },
  ]);
});

test('a step is ticked, undone and left with the keyboard alone', async () => {
  const tabTo = async (name: RegExp, role: 'button' | 'link' | 'slider' = 'button') => {
    const target = page.getByRole(role, { name }).first();
    await expect(target).toBeVisible();
    for (let i = 0; i < 200; i += 1) {
      if (await target.evaluate((element) => element === document.activeElement)) return target;
      await page.keyboard.press('Tab');
    }
    throw new Error(`Tab never reaches ${String(name)}`);
  };
  await page.goto(program.url + bench('step&step=cut-thin-ply'));
  await tabTo(/^Done$/);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: /On with step|What now/ }).first()).toBeVisible();
  await tabTo(/Undo$/);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: 'Done', exact: true })).toBeVisible();
  await tabTo(/^Step$/, 'slider');
  const before = await page.getByRole('heading', { level: 1 }).innerText();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('heading', { level: 1 })).not.toHaveText(before);
});
