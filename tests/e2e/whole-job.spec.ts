import { readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, test, type Browser, type Page } from '@playwright/test';
import { sharedFile } from '../support/shared';
import { makeNotebook, signInAs } from './support/sign-in';

/*
 * The main job through the pages alone: sign in, new notebook, upload, curve, batch, result, a share link
 * opened in a second browser without an account, sign out.
 */

const fixtures = fileURLToPath(new URL('../../fixtures/demo', import.meta.url));

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });
test.setTimeout(180_000);

interface Job {
  readonly title: string;
  readonly files: readonly string[];
  /** Whether a spectrum belongs to the standards; the others are samples. */
  readonly concentrationOf: (spectrum: string) => { readonly name: string; readonly mg: string } | null;
  readonly analyte: string;
  readonly unit: string;
  readonly formulaMass: string;
  readonly pathKnown: boolean;
  readonly rule: { readonly kind: string; readonly fields: Readonly<Record<string, string>> };
}

async function upload(page: Page, notebook: string, files: readonly string[]) {
  await page.goto(`${notebook}/spectra`);
  await page.getByLabel('Spectrum files').setInputFiles([...files]);
  await expect(page.getByText(`${files.length} of ${files.length} files done`)).toBeVisible({
    timeout: 60_000,
  });
}

async function chooseStandards(page: Page, job: Job) {
  await page.getByRole('button', { name: 'Choose spectra' }).click();
  const dialog = page.getByRole('dialog');
  const standards = new Map<string, { name: string; mg: string }>();
  for (const box of await dialog.getByRole('listitem').all()) {
    const name = ((await box.locator('span.font-medium').textContent()) ?? '').trim();
    // name and file, as the list shows them: a file's own title may leave the sample out
    const standard = job.concentrationOf((await box.textContent()) ?? '');
    if (!standard) continue;
    standards.set(name, standard);
    await box.getByRole('checkbox').check();
  }
  await dialog.getByRole('button', { name: /^Take these/ }).click();
  const grid = page.getByRole('grid', { name: 'Spectra of the standards' });
  const names = (await grid.getByRole('gridcell', { name: /^Spectrum, row/ }).allTextContents()).map((name) =>
    name.trim(),
  );
  const block = names.map((name) => {
    const standard = standards.get(name);
    return `${standard?.name}\t${standard?.mg}`;
  });
  await page.evaluate((text) => navigator.clipboard.writeText(text), block.join('\n'));
  await grid.getByRole('gridcell', { name: /^Standard, row 1:/ }).click();
  await page.keyboard.press('Control+v');
  return names.length;
}

async function makeCurve(page: Page, notebook: string, job: Job) {
  await page.goto(`${notebook}/curves/new`);
  await page.getByLabel('Analyte').fill(job.analyte);
  await page.getByLabel('Concentration unit').selectOption(job.unit);
  await page.getByLabel('Formula mass of the basis').fill(job.formulaMass);
  if (!job.pathKnown) await page.getByLabel('The path length is known, not assumed').uncheck();
  await page.getByRole('radio', { name: 'From spectra' }).check();
  const rule = page.getByRole('group', { name: 'How it is read' });
  await rule.getByLabel('Read', { exact: true }).selectOption({ label: job.rule.kind });
  for (const [label, value] of Object.entries(job.rule.fields)) await rule.getByLabel(label).fill(value);
  const standards = await chooseStandards(page, job);
  await page.getByRole('button', { name: 'Save this curve' }).click();
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/, { timeout: 60_000 });
  return standards;
}

async function makeBatch(page: Page, notebook: string, samples: readonly string[], replicatesOf?: string) {
  await page.goto(`${notebook}/batches/new`);
  await page.getByLabel('Title').fill('First batch');
  await page.getByRole('button', { name: 'Create batch' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Add samples' })).toBeVisible();
  await page.getByRole('link', { name: 'From spectra', exact: true }).click();
  for (const sample of samples) {
    await page.getByLabel('Show those with').fill(sample);
    const boxes = page.getByRole('table', { name: 'Spectra to choose from' }).getByRole('checkbox');
    for (const box of await boxes.all()) await box.check();
  }
  if (replicatesOf !== undefined)
    for (const label of await page.getByLabel(/^Sample of /).all()) {
      await label.fill(replicatesOf);
      await label.press('Enter');
    }
  await page.getByRole('button', { name: /^Save \d+ samples?$/ }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'First batch' })).toBeVisible({ timeout: 60_000 });
  return new URL(page.url()).pathname;
}

/** The values behind the page, from the same API that scripts use, as the person who is signed in. */
async function answers(page: Page, batch: string) {
  const id = batch.split('/').at(-1) ?? '';
  const { items } = (await (await page.request.get(`/api/v1/batches/${id}/determinations`)).json()) as {
    items: { sample: string; result: { measured: { value: number; u: number } | null; report: string } }[];
  };
  return new Map(items.map((item) => [item.sample, item.result]));
}

async function curveOf(page: Page, notebook: string) {
  const list = (await (await page.request.get(`/api/v1${notebook}/curves`)).json()) as {
    items: { id: string }[];
  };
  const id = list.items[0]?.id ?? '';
  const { result } = (await (await page.request.get(`/api/v1/curves/${id}`)).json()) as {
    result: {
      curve: {
        slope: { value: number };
        intercept: { value: number };
        n: number;
        molarAbsorptivity?: object;
      };
    };
  };
  return result.curve;
}

/** A share link made by the owner, opened in a browser that has no account. */
async function openShared(page: Page, browser: Browser, notebook: string): Promise<Page> {
  await page.goto(`${notebook}/members`);
  await page.getByLabel('Who is it for').fill('a reader without an account');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const link = (await page.getByTestId('share-address').textContent())?.trim() ?? '';
  const visitor = await (await browser.newContext()).newPage();
  await visitor.goto(new URL(link).pathname);
  await expect(visitor).toHaveURL(new RegExp(`${notebook}$`));
  return visitor;
}

async function signOut(page: Page) {
  await page.getByRole('button', { name: 'Sign out' }).first().click();
  await expect(page).toHaveURL(/\/sign-in$/);
}

test('total iron on the files of the demo laboratory', async ({ page, browser }) => {
  const job: Job = {
    title: 'Whole job, iron',
    files: ['LR-114-standards.csv', 'S02.dx', 'S05.dx'].map((name) => path.join(fixtures, name)),
    concentrationOf: (spectrum) => {
      const mg = /^Fe (\d+\.\d+) mg\/L/.exec(spectrum)?.[1];
      return mg === undefined ? null : { name: `Fe ${mg}`, mg };
    },
    analyte: 'Total iron',
    unit: 'mg/L',
    formulaMass: '55.845',
    pathKnown: true,
    rule: { kind: 'at the nearest point', fields: { Wavelength: '510' } },
  };
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, job.title);
  await upload(page, notebook, job.files);
  expect(await makeCurve(page, notebook, job)).toBe(14);
  // domain scenario, unweighted fit: a = 0.004354456, b = 0.198072460 (computed with numpy, outside the project)
  const curve = await curveOf(page, notebook);
  expect(curve.slope.value).toBeCloseTo(0.19807246, 8);
  expect(curve.intercept.value).toBeCloseTo(0.004354456, 8);
  expect(curve.molarAbsorptivity).toBeDefined();

  const batch = await makeBatch(page, notebook, ['S02', 'S05']);
  const results = await answers(page, batch);
  // the same scenario: S02 measures 1.718792934 mg/L with u 0.004818139
  expect(results.get('S02')?.measured?.value).toBeCloseTo(1.718792934, 8);
  expect(results.get('S02')?.measured?.u).toBeCloseTo(0.004818139, 8);
  expect(results.get('S05')?.report).toMatch(/^not quantified: dilute/);
  await expect(page.getByRole('row').filter({ hasText: 'S02' })).toContainText(/1\.719 ± 0\.01/);

  const visitor = await openShared(page, browser, notebook);
  await visitor.goto(batch);
  await visitor.getByRole('link', { name: 'S02' }).click();
  await visitor.getByText('Every step from the readings to the report').click();
  await expect(visitor.getByText('(0.3463 + 0.3433) / 2')).toBeVisible();
  await visitor.context().close();
  await signOut(page);
});

test('rhodamine 6G: fifteen real files, an unknown, and a correction that halves its uncertainty', async ({
  page,
}) => {
  const results = sharedFile('spectra/calibrations/rhodamine6g/results.json');
  if (!results) return;
  const folder = path.dirname(results);
  const mmol: Readonly<Record<string, string>> = { A: '0.055', D: '0.03', E: '0.01', F: '0.1' };
  const rhodamine = (rule: Job['rule']): Job => ({
    title: 'Whole job, rhodamine 6G',
    files: readdirSync(folder)
      .filter((name) => name.startsWith('Rhodamine'))
      .map((name) => path.join(folder, name)),
    concentrationOf: (spectrum) => {
      const letter = /methanol_([ADEF])\d\.csv/.exec(spectrum)?.[1];
      return letter ? { name: letter, mg: mmol[letter] ?? '' } : null;
    },
    analyte: 'Rhodamine 6G',
    unit: 'mmol/L',
    formulaMass: '479.02',
    pathKnown: false,
    rule,
  });
  await signInAs(page, 'pi');
  const byMaximum = rhodamine({ kind: 'maximum in a window', fields: { From: '450', To: '550' } });
  const notebook = await makeNotebook(page, byMaximum.title);
  await upload(page, notebook, byMaximum.files);

  // Expected: a calibration published by A. Mey and J. Gueven, University of Edinburgh (CC BY 4.0), computed outside.
  expect(await makeCurve(page, notebook, byMaximum)).toBe(12);
  const maximum = await curveOf(page, notebook);
  expect(maximum.slope.value).toBeCloseTo(0.9672, 4);
  expect(maximum.molarAbsorptivity).toBeUndefined();
  const first = [...(await answers(page, await makeBatch(page, notebook, ['_C'], 'C'))).values()][0];
  expect(first?.measured?.value).toBeCloseTo(0.073754, 5);
  expect(first?.measured?.u).toBeCloseTo(0.003, 4);

  const corrected = rhodamine({
    kind: 'at the nearest point',
    fields: { Wavelength: '528', 'Minus the reading at': '700' },
  });
  await makeCurve(page, notebook, corrected);
  const second = [...(await answers(page, await makeBatch(page, notebook, ['_C'], 'C'))).values()][0];
  expect(second?.measured?.value).toBeCloseTo(0.074973, 5);
  expect(second?.measured?.u).toBeCloseTo(0.0018, 4);
});
