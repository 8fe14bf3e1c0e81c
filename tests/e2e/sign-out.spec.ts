import { readFileSync } from 'node:fs';
import { expect, test, type Page } from '@playwright/test';
import { startBench, type Bench } from './support/builds';
import { signIn, takeToBench, toni } from './support/people';
import { heldOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';

const BUILD = 'Trestles for the shed';
const nobody = (page: Page) => page.getByRole('heading', { name: 'Nobody is signed in on this phone' });

let bench: Bench;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  bench = await startBench(browser, BUILD);
});
test.afterAll(async () => {
  await bench.program.end();
});

/** Cuts one more piece, or two, with the phone as it is. */
async function cut(...pieces: number[]): Promise<void> {
  const { page, open } = bench;
  await open('cuts');
  for (const i of pieces) {
    const piece = page.getByRole('button', { name: /, piece \d+ of \d+/ }).nth(i);
    await piece.click();
    await expect(piece).toHaveAttribute('aria-pressed', 'true');
  }
}

async function askToSignOut(): Promise<void> {
  const { page, program } = bench;
  await page.goto(`${program.url}/bench?view=settings`);
  await page.getByRole('button', { name: 'Sign out' }).click();
}

const signedIn = async () =>
  Number(
    (await bench.program.rows<{ n: string }>('select count(*) as n from sessions where revoked_at is null'))[0]!.n,
  );

test('with records held and no signal: how many, a file of them, and the way out that keeps them', async () => {
  const { page, program, open } = bench;
  await program.stop();
  await cut(0, 1);
  await open('photos');
  await page.getByLabel('Choose a photo', { exact: true }).setInputFiles({
    name: 'IMG.JPG',
    mimeType: 'image/jpeg',
    buffer: await phonePhoto(90),
  });
  await expect(page.getByText(/Photo kept/).first()).toBeVisible();
  const held = await heldOnPhone(page);

  await askToSignOut();
  await expect(page.getByText(`${held.length + 1} held here.`)).toBeVisible();
  await expect(page.getByText(`${held.length} entries and 1 photo are only on this phone`)).toBeVisible();
  await expect(page.getByRole('button', { name: 'Send them now' })).toBeVisible();

  const download = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Save them as a file' }).click();
  const file = JSON.parse(readFileSync(await (await download).path(), 'utf8')) as {
    entries: { id: string }[];
    photos: { base64: string }[];
  };
  expect(file.entries.map(({ id }) => id).sort()).toEqual(held.map(({ id }) => id).sort());
  expect(Buffer.from(file.photos[0]!.base64, 'base64').subarray(0, 3)).toEqual(Buffer.from([0xff, 0xd8, 0xff]));

  await page.getByRole('button', { name: 'Keep them here, sign out' }).click();
  await expect(nobody(page)).toBeVisible();
  expect(await heldOnPhone(page)).toEqual(held);
});

test('who signed out with no signal stays out when it is back, and finds the records after signing in', async () => {
  const { page, program, open } = bench;
  const held = await heldOnPhone(page);
  expect(await signedIn()).toBe(1);
  await program.start();
  await page.reload();
  await expect.poll(signedIn).toBe(0);
  await expect(nobody(page)).toBeVisible();
  expect(await heldOnPhone(page)).toEqual(held);

  await signIn(page, program, toni.email, toni.password);
  await open('cuts');
  await expect(page.getByRole('heading', { name: '2 of 16 pieces cut' })).toBeVisible();
  expect(await signedIn()).toBe(1);
  await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
});

test('sent first, then signed out: nothing stays on the phone, all is at the server', async () => {
  const { page, program } = bench;
  // While the sign-in counts for nothing, the phone sends nothing of itself.
  const { now } = (await program.rows<{ now: string }>('select now()::text as now'))[0]!;
  await program.rows(`update sessions set revoked_at = '${now}' where revoked_at is null`);
  await cut(2);
  const [held] = await heldOnPhone(page);
  await askToSignOut();
  await expect(page.getByText('1 held here.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Sign in to send 1' })).toBeVisible();
  await program.rows(`update sessions set revoked_at = null where revoked_at = '${now}'`);
  const send = page.getByRole('button', { name: 'Send them now' });
  // A try that began before may still be under way, and may be the one that gets through.
  await expect(async () => {
    if (await send.isVisible()) await send.click({ timeout: 1_000 });
    await expect(page.getByText(/^All is sent/)).toBeVisible({ timeout: 1_000 });
  }).toPass();
  expect(await program.rows(`select id from log_entries where id = '${held!.id}'`)).toHaveLength(1);
  await page.getByRole('button', { name: 'Sign out', exact: true }).click();
  await expect(nobody(page)).toBeVisible();
  await expect.poll(signedIn).toBe(0);
  await nothingOnPhone(page);
});

test('thrown away only when the word is typed', async () => {
  const { page, program } = bench;
  await signIn(page, program, toni.email, toni.password);
  await takeToBench(page, program, BUILD);
  const before = await program.rows('select id from log_entries');
  await program.stop();
  await cut(3);
  const held = await heldOnPhone(page);
  expect(held).toHaveLength(1);
  await askToSignOut();
  const away = page.getByRole('button', { name: 'Throw them away, sign out' });
  await expect(away).toBeDisabled();
  await page.getByLabel(/throw them away: type/).fill('yes');
  await expect(away).toBeDisabled();
  expect(await heldOnPhone(page)).toEqual(held);
  await page.getByLabel(/throw them away: type/).fill('discard');
  await away.click();
  await expect(nobody(page)).toBeVisible();
  await nothingOnPhone(page);
  await program.start();
  // The desk ends the sign-in too, where that is opened first.
  await page.goto(`${program.url}/desk`);
  await page.waitForURL('**/sign-in');
  expect(await signedIn()).toBe(0);
  expect(await program.rows('select id from log_entries')).toEqual(before);
});

/** No database of an account is in this browser any more. Read again when the page is loaded anew meanwhile. */
const nothingOnPhone = (page: Page) =>
  expect(async () => {
    const names = await page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name ?? ''));
    expect(names.filter((name) => /^holdfast-[0-9a-f]{8}-/.test(name))).toEqual([]);
  }).toPass({ timeout: 15_000 });
