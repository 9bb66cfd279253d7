import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { makeNotebook, signInAs } from './support/sign-in';

/** A dye-like band about 510 nm with invented numbers, as JCAMP-DX. */
function spectrumFile(name: string, height: number) {
  const points = Array.from({ length: 301 }, (_, i) => {
    const absorbance = height * Math.exp(-(((400 + i - 510) / 40) ** 2));
    return `${400 + i}, ${absorbance.toFixed(5)}`;
  });
  const text = [
    `##TITLE=${name}`,
    '##JCAMP-DX=4.24',
    '##DATA TYPE=UV/VIS SPECTRUM',
    '##ORIGIN=invented for a test',
    '##OWNER=nobody',
    '##XUNITS=NANOMETERS',
    '##YUNITS=ABSORBANCE',
    '##PATHLENGTH=1.0',
    '##FIRSTX=400',
    '##LASTX=700',
    '##NPOINTS=301',
    '##XFACTOR=1',
    '##YFACTOR=1',
    '##XYPOINTS=(XY..XY)',
    ...points,
    '##END=',
    '',
  ].join('\n');
  return { name: `${name}.jdx`, mimeType: 'chemical/x-jcamp-dx', buffer: Buffer.from(text) };
}

const spreadsheet = {
  name: 'site-notes.xlsx',
  mimeType: 'application/octet-stream',
  buffer: Buffer.from([0x50, 0x4b, 0x03, 0x04, 1, 2, 3, 4]),
};

async function upload(page: Page, address: string, files: ReturnType<typeof spectrumFile>[]) {
  await page.goto(`${address}/spectra`);
  await page.getByLabel('Spectrum files').setInputFiles(files);
  const all = files.length === 1 ? '1 of 1 file done' : `${files.length} of ${files.length} files done`;
  await expect(page.getByText(all)).toBeVisible();
}

const readings = (page: Page) => page.getByRole('table', { name: 'Readings' });
const plot = (page: Page) => page.locator('[data-plot="ready"]');

async function seriousFindings(page: Page) {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
}

test('many files at once: each has its verdict, a bad one stops no other, the same bytes are recognised', async ({
  page,
}) => {
  await signInAs(page, 'analyst');
  const address = await makeNotebook(page, 'Upload of several');
  await page.goto(`${address}/spectra`);
  await expect(page.getByRole('heading', { level: 1, name: 'No spectra yet' })).toBeVisible();
  const first = spectrumFile('S1', 0.2);
  await upload(page, address, [
    first,
    spectrumFile('S2', 0.4),
    spreadsheet,
    { ...first, name: 'S1 again.jdx' },
    spectrumFile('Drain outfall', 2.41),
  ]);
  const rows = page.getByRole('list', { name: 'Files of this upload' });
  await expect(rows.getByRole('listitem').filter({ hasText: 'S2.jdx' })).toContainText('read: 1 spectrum');
  await expect(rows.getByRole('listitem').filter({ hasText: 'site-notes.xlsx' })).toContainText(
    'left out: This is a zip archive, most likely a spreadsheet',
  );
  const again = rows.getByRole('listitem').filter({ hasText: 'S1 again.jdx' });
  await expect(again).toContainText('these bytes are here already, as S1.jdx');
  await expect(rows.getByRole('listitem').filter({ hasText: 'Drain outfall' })).toContainText(
    /Above 2 between \d+ and \d+ nm/,
  );
  await expect(page.getByRole('heading', { level: 1, name: 'Three spectra, 400–700 nm' })).toBeVisible();
  const uploaded = page.getByRole('table', { name: 'What was uploaded' });
  await expect(uploaded.getByRole('row').filter({ hasText: 'site-notes.xlsx' })).toContainText(
    'nothing kept',
  );
  await expect(uploaded.getByRole('row')).toHaveCount(5); // head, three files, one left out
});

test('the plot, the readings by each rule, and an address that shows the same to who opens it', async ({
  page,
  context,
}) => {
  await signInAs(page, 'analyst');
  const address = await makeNotebook(page, 'Reading by rules');
  await upload(page, address, [spectrumFile('S1', 0.2), spectrumFile('S2', 0.4), spectrumFile('S3', 0.8)]);
  await expect(plot(page)).toBeVisible();
  await expect(page.getByRole('figure', { name: 'Spectra of 3 solutions' })).toBeVisible();

  // 10^-0.8 = 15.8 % at the top of the band, which is where the page reads until somebody says otherwise
  await expect(page.getByLabel('Wavelength', { exact: true })).toHaveValue('510');
  const s3 = readings(page).getByRole('row').filter({ hasText: 'S3' });
  await expect(s3).toContainText('15.8 %');
  await expect(s3).toContainText('0.8000');
  await expect(s3.getByRole('img', { name: /16 % of the light gets through/ })).toBeVisible();

  await page.getByLabel('Wavelength', { exact: true }).fill('1,234');
  await expect(page.getByText('Is this 1.234 or 1234?')).toBeVisible();
  await page.getByLabel('Wavelength', { exact: true }).fill('900');
  await expect(s3).toContainText('900 nm is outside this spectrum');

  await page.getByLabel('Read', { exact: true }).selectOption({ label: 'maximum in a window' });
  await page.getByLabel('From', { exact: true }).fill('450');
  await page.getByLabel('To', { exact: true }).fill('550');
  await page.getByLabel('Minus the reading at').fill('700');
  await expect(s3).toContainText('510');
  await page.getByRole('checkbox', { name: 'Plot S1 of S1.jdx' }).uncheck();
  await expect(readings(page).getByRole('row')).toHaveCount(3);

  const other = await context.newPage();
  await other.goto(page.url());
  await expect(other.getByRole('heading', { name: 'Maximum in 450–550 nm, minus 700 nm' })).toBeVisible();
  await expect(other.getByRole('figure', { name: 'Spectra of 2 solutions' })).toBeVisible();
  await expect(other.getByRole('checkbox', { name: 'Plot S1 of S1.jdx' })).not.toBeChecked();
  await expect(readings(other).getByRole('row').filter({ hasText: 'S3' })).toContainText('0.8000');
  expect(await seriousFindings(other)).toEqual([]);
});

test('choosing by keyboard alone: search, all, none, one by the space bar', async ({ page }) => {
  await signInAs(page, 'analyst');
  const address = await makeNotebook(page, 'By keyboard');
  await upload(page, address, [
    spectrumFile('Weir 1', 0.2),
    spectrumFile('Weir 2', 0.3),
    spectrumFile('Blank', 0.01),
  ]);
  await expect(readings(page).getByRole('row')).toHaveCount(4);
  await page.getByLabel('Find by name or file').focus();
  await page.keyboard.type('weir');
  await expect(page.getByRole('checkbox', { name: /^Plot / })).toHaveCount(2);
  await page.keyboard.press('Tab');
  await expect(page.getByRole('button', { name: 'Choose these 2' })).toBeFocused();
  await page.keyboard.press('Tab');
  await page.keyboard.press('Enter'); // Choose none
  await expect(readings(page)).toHaveCount(0);
  await page.getByRole('checkbox', { name: 'Plot Weir 2 of Weir 2.jdx' }).focus();
  await page.keyboard.press('Space');
  await expect(readings(page).getByRole('row')).toHaveCount(2);
});

test('a spectrum knows its file; the original comes back to the byte; setting aside needs a reason', async ({
  page,
}) => {
  await signInAs(page, 'analyst');
  const address = await makeNotebook(page, 'One spectrum');
  const file = spectrumFile('S1', 0.5);
  await upload(page, address, [file]);
  // the list is fetched anew after an upload, and may be changed under the first press
  const itsPage = page.getByRole('heading', { level: 1, name: 'S1' });
  await expect(async () => {
    if (!(await itsPage.isVisible()))
      await page.getByRole('link', { name: 'S1', exact: true }).click({ timeout: 5_000 });
    await expect(itsPage).toBeVisible({ timeout: 5_000 });
  }).toPass();
  await expect(page.getByText('checked now: the stored bytes give this hash')).toBeVisible();
  await expect(page.getByText('10 mm, from the file')).toBeVisible();
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'Download the original' }).click(),
  ]);
  expect(download.suggestedFilename()).toBe('S1.jdx');
  const stream = await download.createReadStream();
  const parts: Buffer[] = [];
  for await (const part of stream) parts.push(part as Buffer);
  expect(Buffer.concat(parts).equals(file.buffer)).toBe(true);
  expect(await seriousFindings(page)).toEqual([]);

  await page.getByRole('button', { name: 'Set aside' }).click();
  await expect(page.getByText('Say why, in a few words')).toBeVisible();
  await page.getByLabel('Why it is set aside').fill('the cell was dirty');
  await page.getByRole('button', { name: 'Set aside' }).click();
  await expect(page.getByText('This spectrum is set aside')).toBeVisible();
  await page.goto(`${address}/spectra`);
  await expect(page.getByRole('checkbox', { name: /^Plot S1/ })).toHaveCount(0);
  await page.getByRole('checkbox', { name: 'List the 1 set aside too' }).check();
  await expect(page.getByRole('checkbox', { name: /^Plot S1/ })).toHaveCount(1);
});

test('a reader sees everything and can bring nothing in, on the page or past it', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'pi');
  const address = await makeNotebook(page, 'Spectra to be read');
  await upload(page, address, [spectrumFile('S1', 0.5)]);
  await page.goto(`${address}/members`);
  await page.getByLabel('Person', { exact: true }).selectOption({ label: 'Isolde Quillan, viewer' });
  await page.getByRole('button', { name: 'Add to the notebook' }).click();
  await expect(page.getByRole('rowheader', { name: 'Isolde Quillan' })).toBeVisible();

  const reader = await (await browser.newContext()).newPage();
  await signInAs(reader, 'viewer');
  await reader.goto(`${address}/spectra`);
  await expect(readings(reader).getByRole('row').filter({ hasText: 'S1' })).toContainText('0.5000');
  await expect(reader.getByRole('button', { name: 'Upload spectra' })).toHaveCount(0);
  await reader.getByRole('link', { name: 'S1', exact: true }).click();
  await expect(reader.getByRole('heading', { level: 1, name: 'S1' })).toBeVisible();
  await expect(reader.getByRole('button', { name: 'Set aside' })).toHaveCount(0);
  const past = await reader.request.post(`/api/v1${address}/source-files`, {
    multipart: { file: spectrumFile('S2', 0.3) },
  });
  expect(past.status()).toBe(403);
  await reader.context().close();
});

test('the upload route says in a sentence what is wrong with a request', async ({ page }) => {
  await signInAs(page, 'analyst');
  const address = await makeNotebook(page, 'Requests gone wrong');
  const route = `/api/v1${address}/source-files`;
  const empty = await page.request.post(route, {
    multipart: { file: { ...spreadsheet, name: 'a.csv', buffer: Buffer.alloc(0) } },
  });
  expect(empty.status()).toBe(422);
  expect(((await empty.json()) as { detail: string }).detail).toContain('empty (0 bytes)');
  const plain = await page.request.post(route, { data: 'text', headers: { 'content-type': 'text/plain' } });
  expect(plain.status()).toBe(400);
  const nothing = await page.request.post(route, { multipart: { note: 'no file' } });
  expect(nothing.status()).toBe(400);
  const list = await page.request.get(route);
  expect(((await list.json()) as { items: unknown[] }).items).toEqual([]);
});
