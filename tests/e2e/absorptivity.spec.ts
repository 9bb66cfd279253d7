import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { makeNotebook, signInAs } from './support/sign-in';

/* Results without a standard curve: ferroin at 510 nm, ε 11 100 L/(mol cm) as textbooks give it (from memory). */

const results = (page: Page) => page.getByRole('table', { name: 'Results', exact: true });
const rowOf = (page: Page, sample: string) =>
  results(page)
    .getByRole('row')
    .filter({ has: page.getByRole('rowheader', { name: sample }) });

async function seriousFindings(page: Page) {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
}

/** Type into the cell the keyboard stands in, and go on to the next one. */
async function typeCells(page: Page, texts: readonly string[]) {
  await page.getByRole('grid', { name: 'Samples and readings' }).getByRole('gridcell').first().click();
  for (const text of texts) {
    await page.keyboard.type(text);
    await page.keyboard.press('Tab');
  }
}

async function fillFerroin(page: Page) {
  await page.getByLabel('Analyte').fill('Iron(II) as ferroin');
  await page.getByLabel('Counted as').fill('Fe');
  await page.getByLabel('Absorptivity, ε').fill('11100');
  await page.getByLabel('Its standard uncertainty u').fill('100');
  await page.getByLabel('Formula mass of the basis').fill('55.845');
  await page.getByLabel('Wavelength').fill('510');
  await page.getByLabel('u of the path length').fill('0.02');
  await page.getByLabel('Hazard note').fill('Hydroxylamine is toxic: wear gloves.');
}

const heading = (page: Page, name: string | RegExp) => page.getByRole('heading', { level: 1, name });

/** A saved absorptivity through its form; the page shows it. */
async function makeAbsorptivity(page: Page, notebook: string) {
  await page.goto(`${notebook}/absorptivities/new`);
  await fillFerroin(page);
  await page.getByLabel('Source').fill('analytical textbooks');
  await page.getByLabel('Conditions').fill('water, pH 3 to 9');
  await page.getByRole('button', { name: 'Save this absorptivity' }).click();
  await expect(heading(page, 'Iron(II) as ferroin, 510 nm')).toBeVisible();
}

test('a known absorptivity is entered, says what a reading means, and gives results without a curve', async ({
  page,
}) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Iron without standards');
  await page.goto(`${notebook}/curves`);
  await page.getByRole('link', { name: 'New known absorptivity' }).click();
  await expect(heading(page, 'New known absorptivity')).toBeVisible();
  await expect(page.getByText('Enter the absorptivity, and this line says')).toBeVisible();
  await fillFerroin(page);
  await expect(page.getByText(/A = 0\.5 in 10 mm would mean 2\.51\d mg\/L as Fe/)).toBeVisible();
  await expect(page.getByText('1 mg/L reads A = 0.1988')).toBeVisible();

  await page.getByRole('button', { name: 'Save this absorptivity' }).click();
  await expect(page.getByText('Say where the value comes from')).toBeVisible();
  await expect(page.getByLabel('Source')).toBeFocused();
  await expect(page.getByLabel('Absorptivity, ε')).toHaveValue('11100');
  expect(await seriousFindings(page)).toEqual([]);
  await page.getByLabel('Source').fill('analytical textbooks');
  await page.getByLabel('Conditions').fill('water, pH 3 to 9');
  await page.getByRole('button', { name: 'Save this absorptivity' }).dblclick();

  await expect(heading(page, 'Iron(II) as ferroin, 510 nm')).toBeVisible();
  await expect(page.getByText('analytical textbooks')).toBeVisible();
  await expect(page.getByText('No standards were measured')).toBeVisible();
  await expect(page.getByText('Hydroxylamine is toxic')).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);

  await page.getByRole('link', { name: 'New batch on it' }).click();
  await page.getByLabel('Title').fill('July weirs');
  await expect(page.getByLabel('Known absorptivity')).toBeVisible();
  await page.getByRole('button', { name: 'Create batch' }).click();
  await expect(heading(page, 'Add samples')).toBeVisible();
  await typeCells(page, ['Weir 3', '0.1980', '0.1996', '', '10 in 100']);
  await expect(page.getByRole('table', { name: 'Results as you type' })).toContainText(/10\.00\d*\s+±/);
  await page.getByRole('button', { name: 'Save 1 sample' }).click();

  await expect(heading(page, 'July weirs')).toBeVisible();
  await expect(rowOf(page, 'Weir 3')).toContainText(/10\.0\d*\s+±\s+0\.\d+/);
  await expect(rowOf(page, 'Weir 3')).toContainText('By the known absorptivity');
  await expect(results(page).getByRole('columnheader', { name: 'Place on the curve' })).toHaveCount(0);
  await expect(page.getByRole('link', { name: 'Models and limits' })).toHaveCount(0);
  await expect(page.getByRole('link', { name: 'Read on another curve' })).toHaveCount(0);
  await expect(page.getByText('No standards were measured')).toBeVisible();
  expect(await seriousFindings(page)).toEqual([]);

  await page.getByRole('link', { name: 'Weir 3' }).click();
  await expect(heading(page, 'Weir 3')).toBeVisible();
  const budget = page.getByRole('table', { name: 'Uncertainty budget' });
  await expect(budget.getByRole('rowheader', { name: 'absorptivity' })).toBeVisible();
  await expect(budget.getByRole('rowheader', { name: 'path length' })).toBeVisible();
  await page.getByText('Every step from the readings to the report').click();
  await expect(page.getByText('Beer-Lambert law')).not.toHaveCount(0);
  await page.getByText('The known absorptivity behind it').click();
  await expect(page.getByText('molar absorptivity').first()).toBeVisible();
  await expect(page.getByText('The same by Monte Carlo')).toHaveCount(0);
  expect(await seriousFindings(page)).toEqual([]);
});

test('a new version takes its place, a void one takes no batch, and all of it stands in the list and the record', async ({
  page,
}) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Versions of an absorptivity');
  await makeAbsorptivity(page, notebook);
  const first = page.url();
  await page.getByRole('link', { name: 'New version' }).click();
  await expect(heading(page, /^New version of/)).toBeVisible();
  await page.getByLabel('Absorptivity, ε').fill('11072');
  await page.getByLabel('What is different in this version').fill('measured here');
  await page.getByRole('button', { name: 'Save as version 2' }).click();
  const versions = page.getByRole('table', { name: 'Versions of this absorptivity' });
  await expect(versions.getByRole('row').nth(1)).toContainText('measured here');
  await page.goto(first);
  await expect(page.getByText('Version 1 is superseded')).toBeVisible();
  await page.getByRole('link', { name: 'Go to version 2' }).click();
  await expect(page.getByText('Version 2, shown here')).toBeVisible();

  await page.getByRole('button', { name: 'Void' }).click();
  const dialog = page.getByRole('dialog', { name: 'Declare version 2 void' });
  await dialog.getByLabel('Reason').fill('wrong table');
  await dialog.getByRole('button', { name: 'Declare it void' }).click();
  await expect(page.getByText('Version 2 is void')).toBeVisible();
  await expect(page.getByRole('link', { name: 'New batch on it' })).toHaveCount(0);

  await page.goto(`${notebook}/curves`);
  const list = page.getByRole('table', { name: 'Known absorptivities' });
  await expect(list.getByRole('row')).toHaveCount(3);
  await expect(list).toContainText('analytical textbooks');
  await page.goto(`${notebook}/batches/new`);
  await expect(page.getByRole('option', { name: /version 2, void$/ })).toBeDisabled();
  await page.goto(`${notebook}/record`);
  await expect(page.getByText('known absorptivity created').first()).toBeVisible();
});

test('two people make a version: the second is told, keeps what was typed, and saves after the first', async ({
  page,
}) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Two versions at once');
  await makeAbsorptivity(page, notebook);
  await page.getByRole('link', { name: 'New version' }).click();
  await page.getByLabel('Absorptivity, ε').fill('11050');
  const other = await page.context().newPage();
  await other.goto(page.url());
  await other.getByLabel('Absorptivity, ε').fill('11072');
  await other.getByRole('button', { name: 'Save as version 2' }).click();
  await expect(other.getByText('Version 2, shown here')).toBeVisible();

  await page.getByRole('button', { name: 'Save as version 2' }).click();
  await expect(page.getByText(/saved version 2 on .* after you opened this form/)).toBeVisible();
  await page.getByRole('button', { name: 'Save mine after it' }).click();
  await expect(page.getByLabel('Absorptivity, ε')).toHaveValue('11050');
  await page.getByRole('button', { name: 'Save as version 3' }).click();
  await expect(page.getByText('Version 3, shown here')).toBeVisible();
});

test('a reader of the notebook sees an absorptivity and finds no way to change it', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'An absorptivity to look at');
  await makeAbsorptivity(page, notebook);
  const address = page.url();
  await page.goto(`${notebook}/members`);
  await page.getByLabel('Who is it for').fill('a look at an absorptivity');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const link = (await page.getByTestId('share-address').textContent())?.trim() ?? '';
  const visitor = await browser.newContext();
  const shared = await visitor.newPage();
  await shared.goto(new URL(link).pathname);
  await shared.goto(new URL(address).pathname);
  await expect(heading(shared, 'Iron(II) as ferroin, 510 nm')).toBeVisible();
  for (const name of ['New version', 'New batch on it'])
    await expect(shared.getByRole('link', { name })).toHaveCount(0);
  await expect(shared.getByRole('button', { name: 'Void' })).toHaveCount(0);
  expect((await shared.goto(`${notebook}/absorptivities/new`))?.status()).toBe(404);
  await visitor.close();
});
