import { readFileSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { makeNotebook, signInAs } from './support/sign-in';

/** Invented: A = 0.2 c with a little scatter. */
const STANDARDS = [
  ['S1', '0.5', '0.1011', '0.1002'],
  ['S2', '1', '0.2004', '0.2013'],
  ['S3', '2', '0.3989', '0.4006'],
  ['S4', '4', '0.8012', '0.7995'],
];

const SAMPLES = [
  ['Weir 3', '0.4021', '0.4013', '', '10 in 100'],
  ['Drain outfall', '2.4130', '2.3987', '', ''],
  ['Upper creek', '0.0611', '0.0598', '', ''],
  ['Spring', '0.0011', '0.0008', '', ''],
  ['Tide gate', '0.9510', '0.9502', '', ''],
  ['Lamp out', 'OVER', '1.9', '', ''],
];

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });

const results = (page: Page) => page.getByRole('table', { name: 'Results', exact: true });
const rowOf = (page: Page, sample: string) =>
  results(page)
    .getByRole('row')
    .filter({ has: page.getByRole('rowheader', { name: sample }) });

/** Paste rows into a grid as a spreadsheet hands them over. */
async function paste(page: Page, grid: string, rows: readonly (readonly string[])[]) {
  await page.evaluate(
    (text) => navigator.clipboard.writeText(text),
    rows.map((row) => row.join('\t')).join('\n'),
  );
  await page.getByRole('grid', { name: grid }).getByRole('gridcell').first().click();
  await page.keyboard.press('Control+v');
}

async function seriousFindings(page: Page) {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
}

/** A curve made through its form by pasting the standards. */
async function makeCurve(page: Page, notebook: string, standards = STANDARDS) {
  await page.goto(`${notebook}/curves/new`);
  await page.getByLabel('Analyte').fill('Iron(II) as ferroin');
  await page.getByLabel('Counted as').fill('Fe');
  await page.getByLabel('Wavelength').fill('510');
  await page.getByLabel('Hazard note').fill('Hydroxylamine is toxic: wear gloves.');
  await paste(page, 'Standards and their readings', standards);
  await expect(page.getByRole('region', { name: 'Result so far' })).toContainText('readings in the fit');
  await page.getByRole('button', { name: 'Save this curve' }).click();
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/);
}

async function makeBatch(page: Page, notebook: string, title: string) {
  await page.goto(`${notebook}/batches/new`);
  await page.getByLabel('Title').fill(title);
  await page.getByRole('button', { name: 'Create batch' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Add samples' })).toBeVisible();
}

/** A notebook with a curve and a batch with samples on it; the page shows the batch. */
async function batchWithSamples(page: Page, title: string, samples = SAMPLES) {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, title);
  await makeCurve(page, notebook);
  await makeBatch(page, notebook, 'July weirs');
  await paste(page, 'Samples and readings', samples);
  await page.getByRole('button', { name: /^Save \d+ samples?$/ }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'July weirs' })).toBeVisible();
  return notebook;
}

test('pasted samples are calculated as they are typed, saved, and each says what it means', async ({
  page,
}) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Batch from a spreadsheet');
  await page.goto(`${notebook}/batches/new`);
  await expect(page.getByText('A batch needs a standard curve')).toBeVisible();
  await makeCurve(page, notebook);
  await makeBatch(page, notebook, 'July weirs');
  await expect(page.getByText('Hydroxylamine is toxic')).toBeVisible();

  await paste(page, 'Samples and readings', SAMPLES);
  const live = page.getByRole('table', { name: 'Results as you type' });
  await expect(live.getByRole('row')).toHaveCount(SAMPLES.length + 1);
  await expect(page.getByText('10 mL made up to 100 mL: diluted 10 times')).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);
  await page.getByRole('button', { name: 'Save 6 samples' }).dblclick();

  await expect(page.getByRole('heading', { level: 1, name: 'July weirs' })).toBeVisible();
  await expect(results(page).getByRole('row')).toHaveCount(SAMPLES.length + 1);
  await expect(rowOf(page, 'Weir 3')).toContainText(/20\.\d+\s+±\s+0\.\d+/);
  await expect(rowOf(page, 'Weir 3')).toContainText('Within the standards');
  await expect(page.getByRole('columnheader', { name: 'mg/L as Fe' })).toBeVisible();
  for (const [sample, advice] of [
    ['Drain outfall', /0\.39 % of the light gets through\. Dilute at least 1 in/],
    ['Lamp out', /The instrument gave no number\. Dilute at least 1 in 10/],
    ['Tide gate', /Above the top standard \(4 mg\/L\)\. Dilute 1 in/],
  ] as const) {
    await expect(rowOf(page, sample)).toContainText(advice);
    await expect(rowOf(page, sample)).toContainText('no result');
    await expect(rowOf(page, sample)).not.toContainText('±');
  }
  await expect(rowOf(page, 'Upper creek')).toContainText('Detected, below the lowest standard (0.5 mg/L)');
  await expect(rowOf(page, 'Upper creek')).toContainText('±');
  await expect(rowOf(page, 'Spring')).toContainText('< 0.5 mg/L');
  await expect(page.getByText('drifted since the curve was read is not checked')).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);
});

test('the table is copied with the decimal mark asked for and downloaded as CSV', async ({ page }) => {
  await batchWithSamples(page, 'Results that leave');
  await page.getByRole('radio', { name: '0,5' }).check();
  await page.getByRole('button', { name: 'Copy table' }).click();
  await expect(page.getByRole('button', { name: 'Copied' })).toBeVisible();
  const copied = await page.evaluate(() => navigator.clipboard.readText());
  const [names = [], units = [], first = []] = copied.split('\n').map((line) => line.split('\t'));
  expect(units[names.indexOf('value')]).toBe('mg/L');
  expect(first[names.indexOf('mean absorbance as read')]).toBe('0,4017');

  const waiting = page.waitForEvent('download');
  await page.getByRole('link', { name: 'Download CSV' }).click();
  const download = await waiting;
  expect(download.suggestedFilename()).toBe('July-weirs-v1-results.csv');
  const lines = readFileSync(await download.path(), 'utf8').split('\r\n');
  expect(lines[0]).toMatch(/^\uFEFFsample,report,value \(mg\/L\),unit,basis,u \(mg\/L\),U \(mg\/L\),k,/);
  expect(lines).toHaveLength(SAMPLES.length + 2);
  expect(lines.find((line) => line.startsWith('Drain outfall'))).toMatch(
    /"not quantified: dilute [^"]*",,mg\/L,Fe,,,,/,
  );

  await page.getByRole('link', { name: 'Record', exact: true }).click();
  await expect(page.getByText('exported').first()).toBeVisible();
});

test('models are compared by what they do to the results, and limits stand on one ruler', async ({
  page,
}) => {
  await batchWithSamples(page, 'Compared in July');
  await page.getByRole('link', { name: 'Models and limits' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Models and limits' })).toBeVisible();
  const models = page.getByRole('table', { name: 'Models and weightings' });
  await expect(models.getByRole('row').nth(1)).toContainText('line, unweighted');
  await expect(models.getByRole('row').nth(1)).toContainText('in use');
  await expect(models.getByRole('columnheader', { name: /^Weir 3/ })).toBeVisible();
  const limits = page.getByRole('table', { name: 'Limits on one ruler' });
  await expect(limits.getByRole('rowheader', { name: /^ISO 11843-2 critical value/ })).toBeVisible();
  await expect(limits.getByRole('rowheader', { name: 'Results of this batch' })).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);
});

test('a determination opens to its working; a reading is corrected with a reason and the old one stays', async ({
  page,
}) => {
  await batchWithSamples(page, 'Correcting a reading', SAMPLES.slice(0, 1));
  await page.getByRole('link', { name: 'Weir 3' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Weir 3' })).toBeVisible();
  await page.getByText('Every step from the readings to the report').click();
  await expect(page.getByText('y0 = (0.4021 + 0.4013) / 2')).toBeVisible();
  await expect(page.getByText('F = 100 / 10')).toBeVisible();
  await expect(page.getByRole('table', { name: 'Uncertainty budget' }).getByRole('row')).toHaveCount(3);
  await page.getByRole('button', { name: 'Draw 100000 trials' }).click();
  await expect(page.getByText(/^100000 trials\. /)).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);

  await page.getByRole('button', { name: 'Correct reading 1' }).click();
  const dialog = page.getByRole('dialog', { name: 'Correct reading 1' });
  await dialog.getByLabel('New reading').fill('abc');
  await dialog.getByRole('button', { name: 'Save correction' }).click();
  await expect(dialog.getByText('"abc" is not a reading')).toBeVisible();
  await expect(dialog.getByText('Say why')).toBeVisible();
  await expect(dialog.getByLabel('New reading')).toHaveValue('abc');
  await dialog.getByLabel('New reading').fill('0,4121');
  await dialog.getByLabel('Reason').fill('copied the wrong digit');
  await dialog.getByRole('button', { name: 'Save correction' }).click();
  await expect(dialog).toBeHidden();

  const readings = page.getByRole('table', { name: 'Readings' });
  await expect(readings.locator('del')).toHaveText('0.4021');
  await expect(readings).toContainText('0.4121');
  await expect(readings).toContainText('superseded: copied the wrong digit');
  await expect(page.getByText('Reading 1 is now 0.4121 (was 0.4021)')).toBeVisible();
  await expect(page.getByText('y0 = (0.4121 + 0.4013) / 2')).toBeVisible();
});

test('two people correct the same reading: the second is told what changed and loses nothing', async ({
  page,
}) => {
  await batchWithSamples(page, 'Two at once', SAMPLES.slice(0, 1));
  await page.getByRole('link', { name: 'Weir 3' }).click();
  await page.getByRole('button', { name: 'Correct reading 1' }).click();
  const mine = page.getByRole('dialog');
  await mine.getByLabel('New reading').fill('0.4222');
  await mine.getByLabel('Reason').fill('mine');

  const other = await page.context().newPage();
  await other.goto(page.url());
  await other.getByRole('button', { name: 'Correct reading 1' }).click();
  await other.getByLabel('New reading').fill('0.4111');
  await other.getByLabel('Reason').fill('theirs');
  await other.getByRole('button', { name: 'Save correction' }).click();
  await expect(other.getByRole('dialog')).toBeHidden();

  await mine.getByRole('button', { name: 'Save correction' }).click();
  await expect(
    mine.getByText(/changed this meanwhile: reading 1 is now 0\.4111 \(was 0\.4021\)/),
  ).toBeVisible();
  await expect(mine.getByLabel('New reading')).toHaveValue('0.4222');
  await mine.getByRole('button', { name: 'Save correction' }).click();
  await expect(mine).toBeHidden();
  await expect(page.getByText('Reading 1 is now 0.4222 (was 0.4111)')).toBeVisible();
});

test('bad rows get their sentence at their cell and nothing typed is lost', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Nonsense in a batch');
  await makeCurve(page, notebook);
  await makeBatch(page, notebook, 'July weirs');
  await paste(page, 'Samples and readings', [
    ['Weir 3', '0.4021', '', '', '100 in 10'],
    ['', '0.3', '', '', ''],
  ]);
  await page.getByRole('button', { name: 'Save 2 samples' }).click();
  await expect(page.getByText('Some entries need another look')).toBeVisible();
  const grid = page.getByRole('grid', { name: 'Samples and readings' });
  await expect(grid.locator('[aria-invalid="true"]')).toHaveCount(2);
  await grid.getByRole('gridcell', { name: /^Dilution in mL, row 1/ }).click();
  await expect(page.getByText('the end volume is smaller than what was taken')).toBeVisible();
  await page.keyboard.type('10 in 100');
  await page.keyboard.press('Enter');
  await grid.getByRole('gridcell', { name: /^Sample, row 2/ }).click();
  await page.keyboard.type('Weir 4');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'Save 2 samples' }).click();
  await expect(rowOf(page, 'Weir 4')).toBeVisible();
});

test('samples from spectra: replicates found by name, read by the rule, and saved', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Batch from spectra');
  await page.goto(`${notebook}/spectra`);
  await page
    .getByLabel('Spectrum files')
    .setInputFiles([spectrumFile('S01 (1)', 0.402), spectrumFile('S01 (2)', 0.401)]);
  await expect(page.getByText('2 of 2 files done')).toBeVisible();
  await makeCurve(page, notebook);
  await makeBatch(page, notebook, 'From the instrument');
  await page.getByRole('link', { name: 'From spectra', exact: true }).click();
  await page.getByRole('button', { name: 'Choose all shown' }).click();
  await expect(page.getByRole('list', { name: 'Spectra of S01' }).getByRole('listitem')).toHaveCount(2);
  await page.getByLabel('Dilution of S01').fill('1+9');
  await expect(
    page.getByText('1 part plus 9 parts, 10 parts in all: diluted 10 times').first(),
  ).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);
  await page.getByRole('button', { name: 'Save 1 sample' }).click();
  await expect(rowOf(page, 'S01')).toContainText('0.4020');
  await expect(rowOf(page, 'S01')).toContainText(/20\.\d+\s+±/);
});

test('a batch is read on another curve as a new version; an outdated curve is said', async ({ page }) => {
  const notebook = await batchWithSamples(page, 'Another curve', SAMPLES.slice(0, 1));
  const batch = page.url();
  await makeCurve(
    page,
    notebook,
    STANDARDS.map(([name = '', c = '', ...readings]) => [
      name,
      c,
      ...readings.map((a) => (1.1 * Number(a)).toFixed(4)),
    ]),
  );
  await page.goto(batch);
  await page.getByRole('link', { name: 'Read on another curve' }).click();
  await page.getByLabel('Reason').fill('standards made afresh');
  await page.getByRole('button', { name: 'Make version on this curve' }).click();
  await expect(page.getByText('version 2', { exact: true })).toBeVisible();
  await expect(rowOf(page, 'Weir 3')).toContainText(/18\.\d+\s+±/);
  await page.goto(batch);
  await expect(page.getByText('of this batch is the one in use')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Add samples' })).toHaveCount(0);
});

/** A dye-like band about 510 nm with invented numbers. */
function spectrumFile(name: string, height: number) {
  const points = Array.from({ length: 301 }, (_, i) => {
    const absorbance = height * Math.exp(-(((400 + i - 510) / 40) ** 2));
    return `${400 + i},${absorbance.toFixed(5)}`;
  });
  const text = ['wavelength (nm),absorbance', ...points, ''].join('\n');
  return { name: `${name}.csv`, mimeType: 'text/csv', buffer: Buffer.from(text) };
}
