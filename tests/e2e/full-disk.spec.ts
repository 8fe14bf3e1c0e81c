import { expect, test } from '@playwright/test';
import { buildAtBench, startBuild } from './support/builds';
import { signUp, toni } from './support/people';
import { entriesOnPhone, recordsOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';
import { Program } from './support/program';
import { fillStorage, makeRoom } from './support/storage';

/** All that the browser gives Holdfast here: the pack and the program fit well. */
const QUOTA = 40_000_000;

let program: Program;
test.beforeAll(async () => {
  program = await Program.prepare();
  await program.start();
});
test.afterAll(async () => {
  await program.end();
});

test('a full phone says what was not kept, shows none of it as kept, loses nothing, and goes on when there is room', async ({
  page,
  context,
}) => {
  // From the start, since a browser counts on the room that it has seen for half a minute.
  const devtools = await context.newCDPSession(page);
  await devtools.send('Storage.overrideQuotaForOrigin', { origin: program.url, quotaSize: QUOTA });
  await signUp(page, program, toni);
  await startBuild(page, 'Sawhorses');
  const buildId = await buildAtBench(page, program, 'Trestles for the shed');
  const bench = (view: string) => page.goto(`${program.url}/bench?build=${buildId}&view=${view}`);
  const choose = async (red: number) =>
    page
      .getByLabel('Choose a photo', { exact: true })
      .setInputFiles({ name: 'IMG.JPG', mimeType: 'image/jpeg', buffer: await phonePhoto(red) });
  const done = page.getByRole('button', { name: 'Done', exact: true });
  const full = page.getByText(/Not saved: this phone’s storage is full\. Free some space/);
  const photosHere = async () => (await recordsOnPhone<{ sha256: string }>(page, 'photos')).map(({ sha256 }) => sha256);
  const idsHere = async () => (await entriesOnPhone(page)).map(({ id }) => id);

  await bench('photos');
  await choose(200);
  await expect(page.getByText(/Photo kept/).first()).toBeVisible();
  await bench('cuts');
  await page
    .getByRole('button', { name: /, piece 1 of/ })
    .first()
    .click();
  await expect(page.getByRole('heading', { name: '1 of 16 pieces cut' })).toBeVisible();
  const [photos, entries] = [await photosHere(), await idsHere()];
  await fillStorage(page);

  await test.step('a tick', async () => {
    await bench('step&step=choose-strips');
    await done.click();
    await expect(full).toBeVisible();
    await page.reload();
    await expect(done).toBeVisible();
  });

  await test.step('a photo', async () => {
    await bench('photos');
    await expect(page.getByRole('img')).toHaveCount(1);
    await choose(90);
    await expect(full).toBeVisible();
    await expect(page.getByText(/Photo kept/)).toHaveCount(0);
    await expect(page.getByRole('img')).toHaveCount(1);
    expect(await photosHere()).toEqual(photos);
  });

  await test.step('a note, whose words stay where they were typed', async () => {
    await bench('notes');
    await page.getByLabel('New note').fill('The strips are dry.');
    await expect(full).toBeVisible();
    await page.getByRole('button', { name: 'Keep the note' }).click();
    await expect(
      page
        .getByRole('alert')
        .filter({ hasText: /storage is full/ })
        .first(),
    ).toBeVisible();
    await expect(page.getByLabel('New note')).toHaveValue('The strips are dry.');
    await expect(page.getByRole('listitem').getByText('The strips are dry.')).toHaveCount(0);
  });

  await test.step('a build that does not fit', async () => {
    await page.goto(`${program.url}/bench?view=take`);
    const row = page.getByRole('listitem').filter({ hasText: 'Sawhorses' }).first();
    await row.getByRole('button', { name: 'Take it to the bench' }).click();
    await expect(row.getByRole('alert')).toContainText('This phone’s storage is full');
    await expect(row.getByText(/Ready with no signal/)).toHaveCount(0);
  });

  await test.step('nothing that was kept before is lost', async () => {
    expect(await idsHere()).toEqual(entries);
    expect(await photosHere()).toEqual(photos);
    await page.goto(`${program.url}/bench`);
    await expect(page.getByText('0 of 15 steps done')).toBeVisible();
    await bench('cuts');
    await expect(page.getByRole('heading', { name: '1 of 16 pieces cut' })).toBeVisible();
  });

  await test.step('with room again all goes on', async () => {
    await makeRoom(page);
    await bench('photos');
    await choose(90);
    await expect(page.getByText(/Photo kept/).first()).toBeVisible();
    await expect(page.getByRole('img')).toHaveCount(2);
    await bench('step&step=choose-strips');
    await done.click();
    await expect(done).toHaveCount(0);
    await expect(full).toHaveCount(0);
    await expect(page.getByRole('button', { name: /All sent/ })).toBeVisible({ timeout: 40_000 });
    const rows = await program.rows<{ id: string }>('select id from log_entries');
    expect(rows.map(({ id }) => id).sort()).toEqual((await idsHere()).sort());
    expect(await idsHere()).toEqual(expect.arrayContaining(entries));
  });
});
