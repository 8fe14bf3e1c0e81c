import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, test, type Page } from '@playwright/test';
import { startBench, type Bench } from './support/builds';
import { entriesOnPhone, recordsOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';

let bench: Bench;
let page: Page;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  bench = await startBench(browser, 'Trestles for the shed');
  ({ page } = bench);
});
test.afterAll(async () => {
  await bench.program.end();
});

const photosHere = () => recordsOnPhone<{ sha256: string; length: number }>(page, 'photos');

async function choose(name: string, buffer: Buffer): Promise<void> {
  await page.getByLabel('Choose a photo', { exact: true }).setInputFiles({ name, mimeType: 'image/jpeg', buffer });
}

test('a photo of 50 MB and a text file named .jpg are told apart from photos; the next real one is kept', async () => {
  await bench.open('photos');
  const photo = await phonePhoto(120);
  const trouble = page.getByRole('alert').filter({ hasText: 'No photo was kept' });

  // From a file, as a browser gets it; so much is not handed over as one message.
  const folder = mkdtempSync(path.join(tmpdir(), 'holdfast-photo-'));
  try {
    const huge = path.join(folder, 'HUGE.JPG');
    writeFileSync(huge, Buffer.concat([photo, Buffer.alloc(50_000_000 - photo.length)]));
    await page.getByLabel('Choose a photo', { exact: true }).setInputFiles(huge);
    await expect(trouble).toContainText('50 MB');
    await expect(trouble).toContainText('40 MB is the most');
  } finally {
    rmSync(folder, { recursive: true });
  }

  // Through the button, as a person chooses: that a photo was asked for is noted before the gallery opens.
  const asked = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'From the gallery' }).click();
  const letter = Buffer.from('Dear bench,\nthis is no photo.\n');
  await (await asked).setFiles({ name: 'letter.jpg', mimeType: 'image/jpeg', buffer: letter });
  await expect(trouble).toContainText('letter.jpg is not a photo');

  // What became of it was said: nothing is asked after at the next opening.
  await expect
    .poll(async () => (await recordsOnPhone<{ key: string }>(page, 'drafts')).map(({ key }) => key))
    .not.toContain('photo-asked');

  await choose('half.jpg', photo.subarray(0, 400));
  await expect(trouble).toContainText('cannot be read');
  expect(await photosHere()).toHaveLength(0);
  expect((await entriesOnPhone(page)).filter(({ kind }) => kind === 'photo-taken')).toHaveLength(0);

  await choose('IMG.JPG', photo);
  await expect(page.getByText(/Photo kept/).first()).toBeVisible();
  await expect(trouble).toHaveCount(0);
  expect(await photosHere()).toHaveLength(1);
});

test('a note of 1 MB is answered in words, and stays where it was typed', async () => {
  await bench.open('notes');
  const note = page.getByLabel('New note');
  const megabyte = 'Sawdust everywhere. '.repeat(50_000);
  await note.fill(megabyte);
  await page.getByRole('button', { name: 'Keep the note' }).click();
  await expect(page.getByRole('alert').filter({ hasText: /Not saved/ })).toContainText(/at most/);
  expect(await note.inputValue()).toBe(megabyte);
  expect((await entriesOnPhone(page)).filter(({ kind }) => kind === 'note-written')).toHaveLength(0);
  await page.reload();
  await expect.poll(() => note.inputValue()).toBe(megabyte);

  await note.fill('Short enough.');
  // A second touch that comes too soon is passed over.
  await expect(async () => {
    await page.getByRole('button', { name: 'Keep the note' }).click();
    await expect(page.getByRole('listitem').getByText('Short enough.')).toBeVisible({ timeout: 1_000 });
  }).toPass();
});

test('a malformed plan file is refused with the place and what was expected, beside the plans that are there', async () => {
  await page.goto(`${bench.program.url}/desk/plans`);
  const planFile = page.getByLabel(/plan file/i);
  await expect(planFile).toBeEnabled();
  const broken = { format: 'holdfast-plan', version: 1, id: 'Shelf!', parts: 'none' };
  await planFile.setInputFiles({
    name: 'shelf.json',
    mimeType: 'application/json',
    buffer: Buffer.from(JSON.stringify(broken)),
  });
  await expect(page.getByText(/lower-case letters/).first()).toBeVisible();
  await expect(
    page
      .getByText('title', { exact: true })
      .or(page.getByText(/"title" is missing/))
      .first(),
  ).toBeVisible();
  await planFile.setInputFiles({ name: 'cut.json', mimeType: 'application/json', buffer: Buffer.from('{"format": ') });
  await expect(page.getByText(/not JSON/).first()).toBeVisible();
  await expect(page.getByText(/Pair of folding trestles/).first()).toBeVisible();
});
