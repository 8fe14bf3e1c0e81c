import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, test, type Page } from '@playwright/test';
import { buildAtBench } from './support/builds';
import { signUp } from './support/people';
import { entriesOnPhone, recordsOnPhone } from './support/phone-records';
import { phonePhoto } from './support/photos';
import { Program } from './support/program';

const builder = { name: 'Toni Birch', email: 'toni@holdfast.example', password: 'two-trestles-and-a-plane' };

let program: Program;
let page: Page;
let buildId: string;
test.describe.configure({ mode: 'serial' });
test.beforeAll(async ({ browser }) => {
  program = await Program.prepare();
  await program.start();
  page = await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage();
  await signUp(page, program, builder);
  buildId = await buildAtBench(page, program, 'Trestles for the shed');
});
test.afterAll(async () => {
  await program.end();
});

const bench = (view: string) => page.goto(`${program.url}/bench?build=${buildId}&view=${view}`);
const photosHere = () => recordsOnPhone<{ sha256: string; length: number }>(page, 'photos');

async function choose(name: string, buffer: Buffer): Promise<void> {
  await page.getByLabel('Choose a photo', { exact: true }).setInputFiles({ name, mimeType: 'image/jpeg', buffer });
}

test('a photo of 50 MB and a text file named .jpg are told apart from photos; the next real one is kept', async () => {
  await bench('photos');
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

  await choose('letter.jpg', Buffer.from('Dear bench,\nthis is no photo.\n'));
  await expect(trouble).toContainText('letter.jpg is not a photo');

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
  await bench('notes');
  const note = page.getByLabel('New note');
  const megabyte = 'Sawdust everywhere. '.repeat(50_000);
  await note.fill(megabyte);
  await page.getByRole('button', { name: 'Keep the note' }).click();
  await expect(page.getByRole('alert').filter({ hasText: /Not saved/ })).toContainText(/at most/);
  expect(await note.inputValue()).toBe(megabyte);
  expect((await entriesOnPhone(page)).filter(({ kind }) => kind === 'note-written')).toHaveLength(0);

  await note.fill('Short enough.');
  // A second touch that comes too soon is passed over.
  await expect(async () => {
    await page.getByRole('button', { name: 'Keep the note' }).click();
    await expect(page.getByRole('listitem').getByText('Short enough.')).toBeVisible({ timeout: 1_000 });
  }).toPass();
});

test('a full phone says that an act was not saved, shows nothing as done, and goes on when there is room', async () => {
  await page.goto(`${program.url}/bench?build=${buildId}&view=step&step=choose-strips`);
  const done = page.getByRole('button', { name: 'Done', exact: true });
  await expect(done).toBeVisible();
  const before = await entriesOnPhone(page);

  // What the browser does on a full disk: the write fails with its own name for it.
  await page.evaluate(() => {
    const store = IDBObjectStore.prototype as unknown as Record<'add' | 'put', (...args: unknown[]) => unknown>;
    const kept = { add: store.add, put: store.put };
    Object.assign(window, { roomAgain: () => Object.assign(store, kept) });
    store.add = store.put = () => {
      throw new DOMException('The phone is full.', 'QuotaExceededError');
    };
  });
  await done.click();
  await expect(page.getByText(/Not saved: this phone’s storage is full/)).toBeVisible();
  await expect(done).toBeVisible();
  expect(await entriesOnPhone(page)).toHaveLength(before.length);

  await page.evaluate(() => (window as unknown as { roomAgain: () => void }).roomAgain());
  await expect(async () => {
    if (await done.isVisible()) await done.click({ timeout: 1_000 });
    await expect(done).toHaveCount(0, { timeout: 1_000 });
  }).toPass();
  await expect(page.getByText(/storage is full/)).toHaveCount(0);
  await page.reload();
  await expect(page.getByRole('slider')).toBeVisible();
  await expect(done).toHaveCount(0);
  expect((await entriesOnPhone(page)).length).toBeGreaterThan(before.length);
});

test('a malformed plan file is refused with the place and what was expected, beside the plans that are there', async () => {
  await page.goto(`${program.url}/desk/plans`);
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
