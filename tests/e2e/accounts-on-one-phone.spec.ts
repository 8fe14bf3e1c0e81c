import { readFileSync } from 'node:fs';
import { expect, test, type BrowserContext, type Page } from '@playwright/test';
import { buildAtBench } from './support/builds';
import { signIn, signUp } from './support/people';
import { entriesOnPhone } from './support/phone-records';
import { Program } from './support/program';

const first = { name: 'Toni Birch', email: 'toni@holdfast.example', password: 'two-trestles-and-a-plane' };
const second = { name: 'Ira Beech', email: 'ira@holdfast.example', password: 'a-bench-and-four-feet' };
const BUILD = 'Trestles for the shed';

let program: Program;
let context: BrowserContext;
let page: Page;
let buildId: string;
let firstId: string;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  program = await Program.prepare();
  await program.start();
  context = await browser.newContext({ viewport: { width: 390, height: 844 }, acceptDownloads: true });
  page = await context.newPage();
  await signUp(page, program, first);
  buildId = await buildAtBench(page, program, BUILD);
  firstId = (await program.rows<{ id: string }>('select id from accounts'))[0]!.id;
});
test.afterAll(async () => {
  await program.end();
});

const heldOnPhone = async () => (await entriesOnPhone(page, firstId)).filter(({ sync }) => sync === 'held');
const onServer = async () => (await program.rows<{ id: string }>('select id from log_entries')).map(({ id }) => id);

async function writeNotes(count: number, of: string): Promise<void> {
  await page.goto(`${program.url}/bench?build=${buildId}&view=notes`);
  for (let i = 1; i <= count; i += 1) {
    await expect(async () => {
      await page.getByLabel('New note').fill(`${of} ${i}.`);
      await page.getByRole('button', { name: 'Keep the note' }).click();
      await expect(page.getByRole('listitem').getByText(`${of} ${i}.`, { exact: true })).toBeVisible({
        timeout: 2_000,
      });
    }).toPass();
  }
}

test('a sign-in that ended keeps 30 entries on the phone and sends each once after signing in', async () => {
  await program.rows('update sessions set revoked_at = now()');
  await writeNotes(30, 'Knot');
  const held = await heldOnPhone();
  expect(held.length).toBeGreaterThanOrEqual(30);
  await page.evaluate(() => window.dispatchEvent(new Event('online')));
  await expect(page.getByRole('button', { name: /Sign in to send \d+/ })).toBeVisible({ timeout: 40_000 });
  expect(await onServer()).toEqual([]);

  await page.getByRole('button', { name: /Sign in to send/ }).click();
  await expect(page.getByRole('link', { name: /^Sign in/ })).toBeVisible();
  await signIn(page, program, first.email, first.password);
  await page.goto(`${program.url}/bench?build=${buildId}`);
  await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
  expect((await onServer()).sort()).toEqual((await entriesOnPhone(page, firstId)).map(({ id }) => id).sort());
  expect(await heldOnPhone()).toEqual([]);
});

test('signing out with records held says how many, saves them as a file, and throws away only what is typed', async () => {
  await program.stop();
  await writeNotes(2, 'Glue on the floor');
  const held = await heldOnPhone();
  await page.goto(`${program.url}/bench?view=settings`);
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page.getByText(new RegExp(`${held.length} held here`)).first()).toBeVisible();

  const download = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Save them as a file' }).click();
  const file = readFileSync(await (await download).path(), 'utf8');
  for (const { id } of held) expect(file).toContain(id);

  const away = page.getByRole('button', { name: 'Throw them away, sign out' });
  await expect(away).toBeDisabled();
  await page.getByLabel(/throw them away: type/).fill('yes');
  await expect(away).toBeDisabled();
  expect(await heldOnPhone()).toHaveLength(held.length);

  await page.getByRole('button', { name: 'Keep them here, sign out' }).click();
  await expect(page.getByRole('heading', { name: 'Nobody is signed in on this phone' })).toBeVisible();
  expect(await heldOnPhone()).toHaveLength(held.length);
  await program.start();
});

test('a second account on the same phone sees nothing of the first, whose records wait for it', async () => {
  const held = await heldOnPhone();
  expect(held.length).toBeGreaterThan(0);
  await page.evaluate(() => fetch('/api/auth/signout', { method: 'POST' }).catch(() => undefined));
  await context.clearCookies();
  await signUp(page, program, second);
  await page.goto(`${program.url}/bench`);
  await expect(page.getByText(/No build is on this phone|Take a build to the bench/).first()).toBeVisible();
  await expect(page.getByText(BUILD)).toHaveCount(0);
  await page.goto(`${program.url}/bench?build=${buildId}`);
  await expect(page.getByRole('heading', { name: 'This build is not on this phone' })).toBeVisible();
  await page.goto(`${program.url}/bench?build=${buildId}&view=log`);
  await expect(page.getByText(/Glue on the floor/)).toHaveCount(0);
  // Nothing of the first was sent in the second's name.
  const mine = await program.rows<{ n: string }>(
    `select count(*) as n from log_entries where account_id <> '${firstId}'`,
  );
  expect(Number(mine[0]!.n)).toBe(0);
  expect(await heldOnPhone()).toHaveLength(held.length);

  await context.clearCookies();
  await signIn(page, program, first.email, first.password);
  await page.goto(`${program.url}/bench?build=${buildId}&view=notes`);
  await expect(page.getByText('Glue on the floor 2.', { exact: true })).toBeVisible();
  await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
  expect(await heldOnPhone()).toEqual([]);
  const rows = await onServer();
  expect(new Set(rows).size).toBe(rows.length);
});
