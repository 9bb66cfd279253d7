import { expect, type Page } from '@playwright/test';
import { DEMO_ACCOUNTS } from '../../../db/demo/people';

export type DemoKey = 'pi' | 'analyst' | 'viewer' | 'student' | 'administrator';

export function demoAccount(key: DemoKey) {
  const account = DEMO_ACCOUNTS.find((candidate) => candidate.key === key);
  if (!account) throw new Error(`there is no demo account ${key}`);
  return account;
}

/** Sign in as one of the demo people through the form, reading the cautions when they are shown. */
export async function signInAs(page: Page, key: DemoKey): Promise<void> {
  const { email, password } = demoAccount(key);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  const confirm = page.getByRole('button', { name: 'I have read this, go on' });
  const notebooks = page.getByRole('heading', { level: 1, name: 'Notebooks' });
  await expect(confirm.or(notebooks)).toBeVisible();
  if (await confirm.isVisible()) await confirm.click();
  await expect(notebooks).toBeVisible();
}

/** A new notebook of one's own; answers with its address. */
export async function makeNotebook(page: Page, title: string): Promise<string> {
  await page.goto('/notebooks/new');
  await page.getByLabel('Title').fill(title);
  await page.getByRole('button', { name: 'Create notebook' }).click();
  await expect(page.getByRole('heading', { level: 1, name: title })).toBeVisible();
  return new URL(page.url()).pathname;
}
