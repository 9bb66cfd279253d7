import { expect, test, type Locator, type Page } from '@playwright/test';
import { demoAccount } from './support/sign-in';

/*
 * From the sign-in to a concentration with its uncertainty by the keyboard alone: nothing is clicked, filled or
 * focused by the test; it presses keys until the focus is where a person would take it.
 */

test.setTimeout(180_000);

const MOST_TABS = 120;

async function tabTo(page: Page, target: Locator): Promise<void> {
  await expect(target).toBeVisible();
  for (let presses = 0; presses < MOST_TABS; presses += 1) {
    if (await target.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`Tab does not reach ${String(target)}`);
}

async function typeInto(page: Page, target: Locator, text: string): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.press('Control+a');
  await page.keyboard.type(text);
}

async function press(page: Page, target: Locator, key = 'Enter'): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.press(key);
}

/** Rows of a grid whose focus stands in the first cell, each ending with the Tab that leads to the next. */
async function typeRows(page: Page, rows: readonly (readonly string[])[], blankCells: number): Promise<void> {
  for (const row of rows) {
    for (const text of row) {
      await page.keyboard.type(text);
      await page.keyboard.press('Tab');
    }
    for (let blank = 0; blank < blankCells; blank += 1) await page.keyboard.press('Tab');
  }
}

const headed = (page: Page, name: string | RegExp) =>
  expect(page.getByRole('heading', { level: 1, name })).toBeVisible({ timeout: 30_000 });

test('signs in, makes a notebook, a curve and a batch, and reads a concentration, with keys only', async ({
  page,
}) => {
  const { email, password } = demoAccount('pi');
  await page.goto('/sign-in');
  await typeInto(page, page.getByLabel('E-mail address'), email);
  await typeInto(page, page.getByLabel('Password'), password);
  await page.keyboard.press('Enter');
  const confirm = page.getByRole('button', { name: 'I have read this, go on' });
  await expect(confirm.or(page.getByRole('heading', { level: 1, name: 'Notebooks' }))).toBeVisible();
  if (await confirm.isVisible()) await press(page, confirm);
  await headed(page, 'Notebooks');

  await press(page, page.getByRole('link', { name: 'New notebook' }));
  await headed(page, 'New notebook');
  await typeInto(page, page.getByLabel('Title'), 'By keys alone');
  await page.keyboard.press('Enter');
  await headed(page, 'By keys alone');

  await press(page, page.getByRole('main').getByRole('link', { name: 'Type readings into a curve' }));
  await headed(page, 'New standard curve');
  await typeInto(page, page.getByLabel('Analyte'), 'Nitrite');
  await typeInto(page, page.getByLabel('Wavelength'), '543');
  const standards = page.getByRole('grid', { name: 'Standards and their readings' });
  await tabTo(page, standards.getByRole('gridcell', { name: /^Standard, row 1:/ }));
  await typeRows(
    page,
    [
      ['S1', '0.1', '0.105', '0.103'],
      ['S2', '0.2', '0.207', '0.209'],
      ['S3', '0.4', '0.412', '0.415'],
      ['S4', '0.6', '0.621', '0.618'],
    ],
    1,
  );
  await page.keyboard.press('Escape');
  await press(page, page.getByRole('button', { name: 'Save this curve' }));
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/);
  await headed(page, 'Nitrite, 543 nm');

  await press(page, page.getByRole('main').getByRole('link', { name: /batch/i }).last());
  await headed(page, 'New batch');
  await typeInto(page, page.getByLabel('Title'), 'Ditches');
  await page.keyboard.press('Enter');
  await headed(page, 'Add samples');
  const samples = page.getByRole('grid').first();
  await tabTo(page, samples.getByRole('gridcell', { name: /row 1:/ }).first());
  await page.keyboard.type('North ditch');
  await page.keyboard.press('Tab');
  const columns = await samples.getByRole('columnheader').allTextContents();
  for (const column of columns.slice(1).map((text) => text.trim())) {
    if (/^dilution/i.test(column)) await page.keyboard.type('10 in 50');
    else if (/^Reading 1/.test(column)) await page.keyboard.type('0.301');
    else if (/^Reading 2/.test(column)) await page.keyboard.type('0.303');
    await page.keyboard.press('Tab');
  }
  await page.keyboard.press('Escape');
  await press(page, page.getByRole('button', { name: /^Save 1 sample$/ }));
  await headed(page, 'Ditches');
  // By least squares on the eight readings (numpy, apart from the project): c = 0.29176 in the cell, 1.4588 in the sample
  await expect(page.getByRole('row').filter({ hasText: 'North ditch' })).toContainText(/1\.459 ± 0\.0\d+/);
});
