import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { signInAs } from './support/sign-in';

test('a stranger sees every published value agree in this browser and on the server', async ({ page }) => {
  const scripts: Promise<string>[] = [];
  page.on('response', (answer) => {
    // a script that a navigation cuts off has no text
    if (answer.request().resourceType() === 'script') scripts.push(answer.text().catch(() => ''));
  });
  await page.goto('/cautions');
  await page.getByRole('contentinfo').getByRole('link', { name: 'Is it right?' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Is it right?' })).toBeVisible();

  const sentence = page.getByText(/\d+ of \d+ published values agree in this browser and on the server/);
  await expect(sentence).toBeVisible();
  const [, agree, total] = /(\d+) of (\d+)/.exec((await sentence.textContent()) ?? '') ?? [];
  expect(agree).toBe(total);
  await expect(page.getByText(/Engine version \d+\.\d+\.\d+\./)).toBeVisible();
  await expect(page.getByText('does not agree')).toHaveCount(0);

  const rows = await page.locator('tbody tr').all();
  expect(String(rows.length)).toBe(total);
  for (const row of rows) {
    const [, browser, server] = await row.getByRole('cell').allTextContents();
    expect(browser).toMatch(/\d/);
    expect(browser).toBe(server);
  }

  const slope = page
    .getByRole('table', { name: 'Published and calculated: A straight line, and a sample read twice' })
    .getByRole('row', { name: /^slope/ });
  await expect(slope.getByRole('cell').first()).toHaveText('0.2410');
  await expect(slope).toContainText('all 4 printed digits');

  const found = await new AxeBuilder({ page }).analyze();
  expect(found.violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
  // the class Plotly gives every plot stands in its bundle and nowhere else
  const loaded = await Promise.all(scripts);
  expect(loaded.length).toBeGreaterThan(0);
  expect(loaded.filter((text) => text.includes('js-plotly-plot'))).toEqual([]);
});

test('at 390 px the verdicts stand under their values and only the tables scroll sideways', async ({
  page,
}) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto('/is-it-right');
  await expect(page.getByText(/published values agree in this browser and on the server/)).toBeVisible();
  await expect(page.getByRole('rowheader', { name: /^weighted: slope.*agrees/ })).toBeVisible();
  const wider = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(wider).toBeLessThanOrEqual(0);
});

test('a person finds the page at the foot of the notebooks', async ({ page }) => {
  await signInAs(page, 'viewer');
  await page.goto('/notebooks');
  await page.getByRole('link', { name: 'Is it right?' }).click();
  await expect(page).toHaveURL(/\/is-it-right$/);
});
