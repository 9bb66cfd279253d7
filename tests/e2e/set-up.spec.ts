import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { DEMO_ACCOUNTS } from '../../db/demo/people';
import { startApp, type RunningApp } from '../support/start-app';

const PASSWORD = 'reeds by the weir';
let app: RunningApp;

test.beforeAll(async () => {
  test.setTimeout(180_000);
  app = await startApp({ DEMO: '0', SESSION_SECRET: 'a secret of the tests, long enough to be taken' });
});
test.afterAll(() => app.stop());

test('an empty real laboratory is set up with the code of the terminal, once', async ({ page }) => {
  const code = /code, good once: (\S+)/.exec(app.printed())?.[1] ?? '';
  await page.goto(app.url);
  await expect(page.getByRole('heading', { level: 1, name: 'Set up the laboratory' })).toBeVisible();
  const found = await new AxeBuilder({ page }).analyze();
  expect(found.violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);

  const fill = async (given: string, password: string) => {
    await page.getByLabel('Code').fill(given);
    await page.getByLabel('New password', { exact: true }).fill(password);
    await page.getByLabel('New password, again').fill(password);
    await page.getByRole('button', { name: 'Set up the laboratory' }).click();
  };
  await page.getByLabel('Name of the laboratory').fill('Fen laboratory');
  await page.getByLabel('Time zone').selectOption('Europe/Lisbon');
  await page.getByLabel('Your name').fill('Aud Finn');
  await page.getByLabel('Your e-mail address').fill('aud@example.org');
  await fill('aaaa-bbbb-cccc-dddd', PASSWORD);
  await expect(page.getByText('This is not the code that the terminal printed last')).toBeVisible();
  await expect(page.getByLabel('Name of the laboratory')).toHaveValue('Fen laboratory');
  await expect(page.getByLabel('Time zone')).toHaveValue('Europe/Lisbon');
  await fill(code, DEMO_ACCOUNTS[0]?.password ?? '');
  await expect(page.getByText('This password is public')).toBeVisible();
  await fill(code, PASSWORD);
  await expect(page.getByRole('heading', { level: 1, name: 'Before you begin' })).toBeVisible();
  await expect(page.getByText('the passwords are public')).toHaveCount(0);

  await page.getByRole('button', { name: 'I have read this, go on' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
  expect((await page.goto(`${app.url}/set-up`))?.status()).toBe(404);
  await page.goto(`${app.url}/people`);
  await expect(page.getByRole('rowheader', { name: 'Aud Finn' })).toBeVisible();
  await page.goto(`${app.url}/sign-in`);
  await expect(page.getByText('Demonstration accounts')).toHaveCount(0);
});
