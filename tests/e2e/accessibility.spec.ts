import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { signIn, takeToBench } from './support/people';
import { Program } from './support/program';

let program: Program;
let page: Page;
let buildId: string;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  program = await Program.prepare({ seed: true });
  await program.start();
  page = await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage();
  await signIn(page, program, 'builder@holdfast.example');
  const [build] = await program.rows<{ id: string; name: string }>('select id, name from builds order by created_at');
  buildId = build!.id;
  await takeToBench(page, program, build!.name);
});
test.afterAll(async () => {
  await program.end();
});

/** What axe finds against WCAG 2.2 A and AA, as lines that name the rule and the place. */
async function violations(): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return found.flatMap(({ id, nodes }) =>
    nodes.map(({ target, html }) => `${id}: ${target.join(' ')} ${html.slice(0, 160)}`),
  );
}

const screens: [string, () => string, RegExp][] = [
  ['sign-up', () => '/sign-up', /Sign up/],
  ['forgotten password', () => '/forgotten', /password/i],
  ['builds at the desk', () => '/desk', /Hall bench/],
  ['build log at the desk', () => `/desk/builds/${buildId}`, /log/i],
  ['plans at the desk', () => '/desk/plans', /Hall bench/],
  ['account at the desk', () => '/desk/account', /Sign out/],
  ...(
    ['now', 'steps', 'cuts', 'timers', 'photos', 'notes', 'sizes', 'drawings', 'log', 'close', 'more', 'sync'] as const
  ).map((view): [string, () => string, RegExp] => [
    `bench ${view}`,
    () => `/bench?build=${buildId}&view=${view}`,
    /held here|sent/i,
  ]),
  ['a step', () => `/bench?build=${buildId}&view=step&step=rip-carcass`, /Rip/],
  ['a glue-up', () => `/bench?build=${buildId}&view=step&step=glue-halves`, /glue/i],
  ['builds on the phone', () => '/bench', /Builds on this phone/],
  ['settings', () => '/bench?view=settings', /Settings/],
  ['emergency card', () => `/bench?build=${buildId}&view=emergency`, /Emergency/],
];

for (const light of ['light', 'dark'] as const) {
  test(`no screen has a barrier that axe knows, ${light === 'light' ? 'by day' : 'dim'}`, async () => {
    await page.emulateMedia({ colorScheme: light, reducedMotion: 'reduce' });
    const found: string[] = [];
    for (const [name, address, shows] of screens) {
      await page.goto(program.url + address());
      await expect(page.getByText(shows).first(), name).toBeVisible();
      found.push(...(await violations()).map((line) => `${name}: ${line}`));
    }
    expect(found).toEqual([]);
  });
}

test('a step is ticked, undone and left with the keyboard alone', async () => {
  await page.goto(`${program.url}/bench?build=${buildId}&view=steps`);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  const tabTo = async (name: RegExp, role: 'button' | 'link' | 'slider' = 'button') => {
    const target = page.getByRole(role, { name }).first();
    await expect(target).toBeVisible();
    for (let i = 0; i < 200; i += 1) {
      if (await target.evaluate((element) => element === document.activeElement)) return target;
      await page.keyboard.press('Tab');
    }
    throw new Error(`Tab never reaches ${String(name)}`);
  };
  const [step] = await program.rows<{ id: string }>(`select 'cut-thin-ply' as id`);
  await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=${step!.id}`);
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
