import { expect, test } from '@playwright/test';
import { buildAtBench, startBench, type Bench } from './support/builds';
import { ira, signIn, signUp, toni } from './support/people';
import { heldOnPhone, recordsOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';

const BUILD = 'Trestles for the shed';
const WORDS_OF_FIRST = [BUILD, 'Glue on the floor', 'Half a thought'];

let bench: Bench;
test.beforeAll(async ({ browser }) => {
  bench = await startBench(browser, BUILD);
});
test.afterAll(async () => {
  await bench.program.end();
});

test('a second account on the same phone sees nothing of the first, whose records wait for it', async () => {
  const { page, program, context, buildId, accountId, open } = bench;
  const addPhoto = async (red: number) => {
    await open('photos');
    await page.getByLabel('Choose a photo', { exact: true }).setInputFiles({
      name: 'IMG.JPG',
      mimeType: 'image/jpeg',
      buffer: await phonePhoto(red),
    });
    await expect(page.getByText(/Photo kept/).first()).toBeVisible();
  };
  let sent = '';

  await test.step('the first sends a photo and looks at it at the desk; its sign-in ends; more is held', async () => {
    await addPhoto(200);
    await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
    // "All sent" may still be that of before the photo.
    await expect.poll(() => program.rows('select 1 from photos'), { timeout: 40_000 }).toHaveLength(1);
    sent = (await recordsOnPhone<{ sha256: string }>(page, 'photos'))[0]!.sha256;
    await page.goto(`${program.url}/desk/builds/${buildId}`);
    await expect(page.getByRole('img').first()).toBeVisible();
    await program.rows('update sessions set revoked_at = now()');
    await addPhoto(60);
    await open('notes');
    await page.getByLabel('New note').fill('Glue on the floor.');
    await page.getByRole('button', { name: 'Keep the note' }).click();
    await expect(page.getByRole('listitem').getByText('Glue on the floor.')).toBeVisible();
    await page.getByLabel('New note').fill('Half a thought');
    await expect
      .poll(async () => (await recordsOnPhone<{ text: string }>(page, 'drafts')).map(({ text }) => text))
      .toContain('Half a thought');
  });
  const held = await heldOnPhone(page, accountId);
  expect(held.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['photo-taken', 'note-written']));

  await test.step('the second sees none of it, at the bench or from the server', async () => {
    await context.clearCookies();
    // Not even for a moment: every page that is opened is watched from its first line.
    await page.addInitScript((words) => {
      new MutationObserver(() => {
        const seen = words.find((word) => document.body?.textContent?.includes(word));
        if (seen) sessionStorage.setItem('seen', `${seen} at ${window.location.pathname}`);
      }).observe(document, { childList: true, subtree: true, characterData: true });
    }, WORDS_OF_FIRST);
    await signUp(page, program, ira);
    await page.goto(`${program.url}/bench`);
    await expect(page.getByText(/^Nothing yet\. A build that you take/)).toBeVisible();
    await page.goto(`${program.url}/bench?view=take`);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    for (const view of ['now', 'log', 'notes', 'photos', 'drawings', 'emergency']) {
      await open(view);
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
      await expect(page.locator('img')).toHaveCount(0);
    }
    for (const path of ['', '/log', '/pack', `/photos/${sent}`]) {
      const status = await page.evaluate(
        (url) => fetch(url).then((answer) => answer.status),
        `/api/builds/${buildId}${path}`,
      );
      expect([403, 404], path).toContain(status);
    }
    await page.goto(`${program.url}/desk/builds/${buildId}`);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    expect(await page.evaluate(() => sessionStorage.getItem('seen'))).toBeNull();
  });

  await test.step('the second works on a build of its own', async () => {
    await page.goto(`${program.url}/desk`);
    const own = await buildAtBench(page, program, 'Sawhorses');
    await page.goto(`${program.url}/bench?build=${own}&view=cuts`);
    await page
      .getByRole('button', { name: /, piece 1 of/ })
      .first()
      .click();
    await expect(page.getByRole('heading', { name: '1 of 16 pieces cut' })).toBeVisible();
    await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
    // Nothing of the first was sent in the second's name.
    expect(
      await program.rows(`select id from log_entries where account_id <> '${accountId}' and build_id <> '${own}'`),
    ).toEqual([]);
    expect(await heldOnPhone(page, accountId)).toEqual(held);
    expect(await page.evaluate(() => sessionStorage.getItem('seen'))).toBeNull();
  });

  await test.step('the first comes back to all that it left, and sends it', async () => {
    await context.clearCookies();
    await signIn(page, program, toni.email, toni.password);
    await open('notes');
    await expect(page.getByRole('listitem').getByText('Glue on the floor.')).toBeVisible();
    await expect(page.getByLabel('New note')).toHaveValue('Half a thought');
    await expect(page.getByText('Sawhorses')).toHaveCount(0);
    // The watch of the pages does see such words when they are there.
    expect(await page.evaluate(() => sessionStorage.getItem('seen'))).toContain(' at /bench');
    await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
    expect(await heldOnPhone(page, accountId)).toEqual([]);
    const rows = await program.rows<{ id: string; account_id: string }>(
      `select id, account_id from log_entries where build_id = '${buildId}'`,
    );
    expect(rows.filter(({ id }) => held.some((each) => each.id === id))).toHaveLength(held.length);
    expect(new Set(rows.map(({ account_id }) => account_id))).toEqual(new Set([accountId]));
    expect(await program.rows('select id from photos')).toHaveLength(2);
  });
});
