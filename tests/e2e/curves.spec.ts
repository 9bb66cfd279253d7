import { AxeBuilder } from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { makeNotebook, signInAs } from './support/sign-in';

/** Total iron, as a spreadsheet of a country with decimal commas hands it over. */
const BLOCK = [
  'Standard\tc, mg/L\tA1\tA2\tA3',
  'S1\t0,5\t0,1012\t0,0993\t0,0997',
  'S2\t1,0\t0,2007\t0,1996\t0,2027',
  'S3\t2,0\t0,3972\t0,3998\t0,3941',
  'S4\t3,0\t0,5978\t0,5960\t0,5991',
  'S5\t4,0\t0,7951\t0,7962\t0,7955',
].join('\n');

const grid = (page: Page) => page.getByRole('grid', { name: 'Standards and their readings' });
const cell = (page: Page, column: string, row: number) =>
  grid(page).getByRole('gridcell', { name: new RegExp(`^${column}.*, row ${row}:`) });
const line = (page: Page) => page.getByLabel('The line and its figures');

async function openNewCurve(page: Page, notebook: string) {
  await page.goto(`${notebook}/curves/new`);
  await expect(grid(page)).toBeVisible();
  await page.waitForLoadState('networkidle');
}

/** Paste as a spreadsheet does; the clipboard itself is closed to tests in some browsers. */
async function pasteBlock(page: Page, text: string) {
  await page.evaluate((block) => {
    const data = new DataTransfer();
    data.setData('text/plain', block);
    const event = new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
  }, text);
}

/** The slope 0.1986 is that of ordinary least squares on these 15 readings, Sxy/Sxx summed independently. */
async function fillCurve(page: Page, analyte: string, block = BLOCK) {
  await page.getByLabel('Analyte').fill(analyte);
  await page.getByLabel('Wavelength').fill('510');
  await cell(page, 'Standard', 1).click();
  await pasteBlock(page, block);
  await expect(line(page)).toContainText('0.1986');
}

async function save(page: Page, name = 'Save this curve') {
  await page.getByRole('button', { name }).click();
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/);
}

async function expectNoSeriousFinding(page: Page) {
  const { violations } = await new AxeBuilder({ page }).analyze();
  const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
  expect(serious.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
}

test('a curve is typed, corrected and saved by the keyboard alone', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Typed by keyboard');
  await openNewCurve(page, notebook);
  await page.getByLabel('Analyte').focus();
  await page.keyboard.type('Phosphate');
  await page.getByLabel('Wavelength').focus();
  await page.keyboard.type('880');
  await cell(page, 'Standard', 1).focus();
  for (const row of [
    ['S1', '0,2', '0.132', '0.130'],
    ['S2', '0.4', '0.259', '0.262'],
    ['S3', '0.6', '0.391', '0.388'],
  ]) {
    for (const text of row) {
      await page.keyboard.type(text);
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Tab');
  }
  await expect(cell(page, 'A2', 3)).toHaveAccessibleName(/0\.388/);
  await expect(line(page)).toContainText('6 readings in the fit');

  // a number that could be two is asked about, and undone
  await cell(page, 'A1', 3).focus();
  await page.keyboard.type('1,234');
  await page.keyboard.press('Enter');
  await expect(cell(page, 'A1', 3)).toHaveAttribute('aria-invalid', 'true');
  await page.keyboard.press('ArrowUp');
  await expect(page.getByRole('status').filter({ hasText: '1.234 or 1234' }).first()).toBeVisible();
  await page.keyboard.press('Control+z');
  await expect(cell(page, 'A1', 3)).not.toHaveAttribute('aria-invalid', 'true');

  // fill down copies the cell above; undo takes it back
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Control+d');
  await expect(cell(page, 'A1', 4)).toHaveAccessibleName(/0\.391/);
  await page.keyboard.press('Control+z');

  // Escape, then Tab leaves the grid
  await page.keyboard.press('Escape');
  await page.keyboard.press('Tab');
  await expect(grid(page).locator(':focus')).toHaveCount(0);
  await page.getByRole('button', { name: 'Save this curve' }).focus();
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Phosphate, 880 nm');
});

test('a pasted block, a standard and a reading left out with reasons, a new version, void', async ({
  page,
}) => {
  test.slow();
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Pasted curve');
  await page.goto(`${notebook}/curves`);
  await expect(page.getByText('No standard curve yet')).toBeVisible();
  await openNewCurve(page, notebook);
  await page.getByLabel('Hazard note').fill('Hydroxylamine: toxic. Gloves.');
  await fillCurve(page, 'Iron');
  await expect(
    page.getByText(
      'Pasted 25 cells in 5 rows; the line of headings left out; decimal commas read as points.',
    ),
  ).toBeVisible();
  await expect(line(page)).toContainText('0.5 to 4');
  await expectNoSeriousFinding(page);

  await page.getByRole('button', { name: 'Leave out S5, or a reading of it' }).click();
  const dialog = page.getByRole('dialog');
  await expect(
    dialog.getByText(/^Without it the slope is .* The curve would cover 0\.5 to 3 mg\/L only\.$/),
  ).toBeVisible();
  await dialog.getByRole('button', { name: 'Leave it out' }).click();
  await expect(dialog.getByText('Say why it is left out')).toBeVisible();
  await dialog.getByLabel('Why').fill('flask overfilled');
  await dialog.getByRole('button', { name: 'Leave it out' }).click();
  await expect(line(page)).toContainText('0.5 to 3');

  // a single reading, picked from the list of the plot's points
  await page.getByText('The points of this plot as a table').first().click();
  await page.getByRole('button', { name: 'Choose S2, reading 3, 0.2027' }).first().click();
  await dialog.getByLabel('Why').fill('bubble in the cell');
  await dialog.getByRole('button', { name: 'Leave it out' }).click();
  await expect(line(page)).toContainText('11 readings in the fit');
  await save(page);

  const leftOut = page.getByRole('list', { name: 'Left out of the fit' });
  await expect(leftOut).toContainText('S5 left out: flask overfilled');
  await expect(leftOut).toContainText('S2, reading 3 left out: bubble in the cell');
  await expect(page.getByText('Hydroxylamine: toxic. Gloves.')).toBeVisible();
  await page.getByRole('button', { name: 'Show the working' }).click();
  await expect(dialog.getByRole('cell', { name: 'Readings in the fit' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expectNoSeriousFinding(page);

  await page.getByRole('link', { name: 'New version' }).click();
  await expect(cell(page, 'Standard', 5)).toHaveAccessibleName(/left out, flask overfilled/);
  await page.getByRole('button', { name: 'Leave out S5, or a reading of it' }).click();
  await dialog.getByRole('button', { name: 'Take it back into the fit' }).click();
  await page.getByLabel('What is different in this version').fill('S5 made up again');
  await save(page, 'Save as version 2');
  await expect(page.getByRole('table', { name: 'Versions of this curve' })).toContainText('S5 made up again');
  await page.getByRole('link', { name: 'Version 1', exact: true }).click();
  await expect(page.getByText('Version 1 is superseded')).toBeVisible();
  await page.getByRole('link', { name: 'Go to version 2' }).click();
  await expect(page.getByText('Version 2, shown here')).toBeVisible();

  await page.getByRole('button', { name: 'Void' }).click();
  await dialog.getByRole('button', { name: 'Declare it void' }).click();
  await expect(dialog.getByLabel('Reason')).toHaveAttribute('aria-invalid', 'true');
  await dialog.getByLabel('Reason').fill('wrong cell');
  await dialog.getByRole('button', { name: 'Declare it void' }).click();
  await expect(page.getByText('Version 2 is void')).toBeVisible();
  await expect(page.getByText('wrong cell').first()).toBeVisible();
});

/** A band about 510 nm with invented numbers, as a table of two columns. */
function spectrumFile(name: string, height: number) {
  const lines = Array.from({ length: 101 }, (_, i) => {
    const nm = 460 + i;
    return `${nm},${(0.01 + height * Math.exp(-(((nm - 510) / 30) ** 2))).toFixed(5)}`;
  });
  const text = ['Wavelength (nm),Absorbance', ...lines, ''].join('\n');
  return { name: `${name}.csv`, mimeType: 'text/csv', buffer: Buffer.from(text) };
}

test('a curve from spectra: chosen, given concentrations, read by a rule, a reading outside refused', async ({
  page,
}) => {
  test.slow();
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Curve off spectra');
  await page.goto(`${notebook}/spectra`);
  const files = [0.2, 0.4, 0.81, 1.2].map((height, index) => spectrumFile(`std ${index + 1}`, height));
  await page.getByLabel('Spectrum files').setInputFiles(files);
  await expect(page.getByText('4 of 4 files done')).toBeVisible();
  await openNewCurve(page, notebook);
  await page.getByLabel('Analyte').fill('Dye');
  await page.getByRole('radio', { name: 'From spectra' }).check();
  await page.getByRole('group', { name: 'How it is read' }).getByLabel('Wavelength').fill('510');
  await page.getByRole('button', { name: 'Choose spectra' }).click();
  await page.getByRole('button', { name: 'Choose all 4' }).click();
  await page.getByRole('button', { name: 'Take these 4 spectra' }).click();
  const spectra = page.getByRole('grid', { name: 'Spectra of the standards' });
  await expect(spectra.getByRole('gridcell', { name: 'A read, row 1: 0.2100' })).toBeVisible();
  await spectra.getByRole('gridcell', { name: /^Concentration.*, row 1:/ }).click();
  await pasteBlock(page, '1\n2\n4\n6');
  await expect(line(page)).toContainText('1 to 6');

  await page.getByRole('group', { name: 'How it is read' }).getByLabel('Wavelength').fill('900');
  await expect(
    page
      .getByRole('status')
      .filter({ hasText: /outside/ })
      .first(),
  ).toBeVisible();
  await page.getByRole('group', { name: 'How it is read' }).getByLabel('Wavelength').fill('510');
  await expect(line(page)).toContainText('1 to 6');
  await save(page);
  await expect(page.getByText('4 readings, from spectra, interpolated at 510 nm')).toBeVisible();
  const standards = page.getByRole('table', { name: 'Standards' });
  await expect(standards.getByRole('link', { name: '0.2100' })).toHaveAttribute(
    'href',
    /\/spectra\/[0-9a-f-]{36}$/,
  );
  await page.getByRole('link', { name: 'New version' }).click();
  await expect(spectra.getByRole('gridcell', { name: /^Concentration.*, row 4: 6$/ })).toBeVisible();
});

test('what is wrong is said at its place, and nothing typed is lost', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Nonsense');
  await openNewCurve(page, notebook);
  await cell(page, 'Standard', 1).click();
  await pasteBlock(page, 'S1\t1\t0.2\nS2\t1\t0.21\nS3\t1\t0.19');
  await expect(
    page.getByRole('status').filter({ hasText: /same concentration|different concentrations/ }),
  ).toBeVisible();
  await page.getByLabel('Path length', { exact: true }).fill('0');
  await expect(page.getByText('The path length must be above zero').first()).toBeVisible();
  await page.getByLabel('Concentration unit').selectOption('mmol/L');
  await page.getByRole('button', { name: 'Save this curve' }).click();
  await expect(page.getByText('Say what is measured')).toBeVisible();
  await expect(page.getByText(/enter the formula mass/).first()).toBeVisible();
  await expect(page.getByLabel('Analyte')).toBeFocused();
  await expect(cell(page, 'Standard', 3)).toHaveAccessibleName(/S3/);
  expect(page.url()).toContain('/curves/new');
});

test('a double click saves one curve', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Double click');
  await openNewCurve(page, notebook);
  await fillCurve(page, 'Iron');
  await page.getByRole('button', { name: 'Save this curve' }).dblclick();
  await page.waitForURL(/\/curves\/[0-9a-f-]{36}$/);
  await page.goto(`${notebook}/curves`);
  await expect(page.getByRole('table', { name: 'Curves in use' }).getByRole('row')).toHaveCount(2);
});

test('two people change the same curve: the second is told who, keeps every entry, and can go on', async ({
  page,
}) => {
  test.slow();
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Two at once');
  await openNewCurve(page, notebook);
  await fillCurve(page, 'Iron');
  await save(page);
  const curve = new URL(page.url()).pathname;

  const second = await page.context().newPage();
  for (const tab of [page, second]) {
    await tab.goto(`${curve}/new-version`);
    await tab.waitForLoadState('networkidle');
  }
  await second.getByLabel('What is different in this version').fill('mine, a minute later');
  await page.getByLabel('What is different in this version').fill('the first to be saved');
  await save(page, 'Save as version 2');

  await second.getByRole('button', { name: 'Save as version 2' }).click();
  await expect(second.getByText(/Maren Oldacre saved version 2 on/)).toBeVisible();
  await expect(second.getByLabel('What is different in this version')).toHaveValue('mine, a minute later');
  await expect(cell(second, 'Standard', 5)).toHaveAccessibleName(/S5/);
  await second.getByRole('button', { name: 'Save mine after it' }).click();
  await save(second, 'Save as version 3');
  await expect(second.getByRole('table', { name: 'Versions of this curve' }).getByRole('row')).toHaveCount(4);
});

test('the API calculates, refuses with a pointer, and lists what was saved', async ({ page }) => {
  await signInAs(page, 'pi');
  const notebook = await makeNotebook(page, 'Through the API');
  await openNewCurve(page, notebook);
  await fillCurve(page, 'Iron');
  await save(page);
  const api = page.request;
  const list = await api.get(`/api/v1${notebook}/curves?limit=1`);
  const { items } = (await list.json()) as { items: { id: string; slope: { value: number } }[] };
  const one = await api.get(`/api/v1/curves/${items[0]?.id}`);
  expect(one.headers().etag).toBeTruthy();
  const { request, result } = await one.json();

  const post = (data: unknown) =>
    api.post('/api/v1/calculations/standard-curve', {
      data: data as object,
      headers: { 'sec-fetch-site': 'same-origin' },
    });
  const calculated = await (await post(request)).json();
  expect(calculated.curve.slope).toEqual(result.curve.slope);

  const wrong = await post({ ...request, pathLengthMm: 0 });
  expect(wrong.status()).toBe(422);
  expect(wrong.headers()['content-type']).toContain('application/problem+json');
  expect((await wrong.json()).errors).toEqual([expect.objectContaining({ pointer: '/pathLengthMm' })]);
  const typed = await post({ ...request, standards: [{ concentration: 'one', readings: [1] }] });
  expect((await typed.json()).errors[0].pointer).toBe('/standards/0/concentration');
  const broken = await api.post('/api/v1/calculations/standard-curve', {
    data: Buffer.from('{'),
    headers: { 'content-type': 'application/json', 'sec-fetch-site': 'same-origin' },
  });
  expect(broken.status()).toBe(400);
});
