import { expect, type Page } from '@playwright/test';
import { demoPassword } from '@/scripts/demo.mjs';
import type { Program } from './program';

interface Person {
  name: string;
  email: string;
  password: string;
}

export const toni: Person = {
  name: 'Toni Birch',
  email: 'toni@holdfast.example',
  password: 'two-trestles-and-a-plane',
};
export const ira: Person = { name: 'Ira Beech', email: 'ira@holdfast.example', password: 'a-bench-and-four-feet' };

/** Signs up, confirms by the letter, and is signed in. */
export async function signUp(page: Page, program: Program, { name, email, password }: Person) {
  await page.goto(`${program.url}/sign-up`);
  await page.getByLabel('Name').fill(name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign up' }).click();
  let link: string | undefined;
  await expect(async () => {
    const letter = (await program.letters()).find(({ to }) => to.includes(email));
    link = /https?:\/\/\S+confirm\S+/.exec(letter?.text ?? '')?.[0];
    expect(link).toBeTruthy();
  }).toPass({ timeout: 20_000 });
  await page.goto(link!);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Confirm and sign in' }).click();
  await page.waitForURL('**/desk**');
}

export async function signIn(page: Page, program: Program, email: string, password = demoPassword) {
  await page.goto(`${program.url}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL('**/desk**');
}

/** Takes the build of that name to the bench and waits until it is said to be ready. */
export async function takeToBench(page: Page, program: Program, buildName: string) {
  await page.goto(`${program.url}/bench?view=take`);
  const row = page.getByRole('listitem').filter({ hasText: buildName }).first();
  await row.getByRole('button', { name: 'Take it to the bench' }).click();
  await expect(row.getByText(/Ready with no signal/)).toBeVisible();
  // The page's own program must be on the phone too.
  await page.evaluate(async () => {
    const registration = await navigator.serviceWorker.ready;
    if (!registration.active) throw new Error('no worker');
  });
  await expect(async () => {
    expect(await page.evaluate(() => navigator.serviceWorker.controller !== null)).toBe(true);
  }).toPass();
}
