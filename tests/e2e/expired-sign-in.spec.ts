import { expect, test } from '@playwright/test';
import { startBench, type Bench } from './support/builds';
import { signIn, toni } from './support/people';
import { entriesOnPhone, heldOnPhone, recordsOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';

let bench: Bench;
test.beforeAll(async ({ browser }) => {
  bench = await startBench(browser, 'Trestles for the shed');
});
test.afterAll(async () => {
  await bench.program.end();
});

test('a sign-in that ended keeps 30 entries and a photo on the phone, and sends each once after signing in', async () => {
  const { page, program, open } = bench;
  await program.rows('update sessions set revoked_at = now()');

  await open('cuts');
  const pieces = page.getByRole('button', { name: /, piece \d+ of \d+/ });
  await expect(page.getByRole('heading', { name: '0 of 16 pieces cut' })).toBeVisible();
  for (const cut of [true, false]) {
    for (let i = 0; i < (cut ? 16 : 14); i += 1) {
      await pieces.nth(i).click();
      await expect(pieces.nth(i)).toHaveAttribute('aria-pressed', String(cut));
    }
  }
  await open('photos');
  await page.getByLabel('Choose a photo', { exact: true }).setInputFiles({
    name: 'IMG.JPG',
    mimeType: 'image/jpeg',
    buffer: await phonePhoto(140),
  });
  await expect(page.getByText(/Photo kept/).first()).toBeVisible();
  const held = await heldOnPhone(page);
  expect(held.filter(({ kind }) => kind === 'piece-marked')).toHaveLength(30);

  // The phone pauses, keeps all, and says what to do.
  const ask = page.getByRole('button', { name: `Sign in to send ${held.length + 1}` });
  await page.evaluate(() => window.dispatchEvent(new Event('online')));
  await expect(ask).toBeVisible({ timeout: 40_000 });
  expect(await program.rows('select id from log_entries')).toEqual([]);
  await page.reload();
  await expect(ask).toBeVisible();
  expect(await heldOnPhone(page)).toEqual(held);

  await ask.click();
  await expect(page.getByText('Waits for you to sign in')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Sign in to send' })).toBeVisible();
  await signIn(page, program, toni.email, toni.password);
  await open('cuts');
  await expect(page.getByRole('heading', { name: '2 of 16 pieces cut' })).toBeVisible();
  await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });

  const rows = await program.rows<{ id: string; position: number }>(
    'select id, position from log_entries order by position',
  );
  expect(rows.map(({ position }) => position)).toEqual(rows.map((_, i) => i + 1));
  const here = await entriesOnPhone(page);
  expect(rows.map(({ id }) => id).sort()).toEqual(here.map(({ id }) => id).sort());
  expect(here.map(({ id }) => id)).toEqual(expect.arrayContaining(held.map(({ id }) => id)));
  expect(await program.rows('select id from photos')).toHaveLength(1);
  expect(await heldOnPhone(page)).toEqual([]);
  expect((await recordsOnPhone<{ sync: string }>(page, 'photos')).map(({ sync }) => sync)).not.toContain('held');
});
