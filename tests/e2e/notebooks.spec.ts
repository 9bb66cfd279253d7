import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { makeNotebook, signInAs } from './support/sign-in';

test('a stranger is sent to sign in, and learns nothing about what is there', async ({ page, request }) => {
  await page.goto('/notebooks');
  await expect(page).toHaveURL(/\/sign-in$/);
  const answer = await request.get('/api/v1/notebooks');
  expect(answer.status()).toBe(401);
  expect(answer.headers()['content-type']).toContain('application/problem+json');
});

test('a PI makes a notebook, and nonsense gets its sentence and keeps what was typed', async ({ page }) => {
  await signInAs(page, 'pi');
  await page.goto('/notebooks/new');
  await page.getByLabel('Purpose').fill('kept while the title is missing');
  await page.getByRole('button', { name: 'Create notebook' }).click();
  await expect(page.getByText('Give the notebook a title')).toBeVisible();
  await expect(page.getByLabel('Title')).toBeFocused();
  await expect(page.getByLabel('Purpose')).toHaveValue('kept while the title is missing');
  await page.getByLabel('Title').fill('Iron in the weirs');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { level: 1, name: 'Iron in the weirs' })).toBeVisible();
  await expect(page.getByText('Nothing has been measured yet')).toBeVisible();
  await page.getByRole('link', { name: 'Record' }).click();
  await expect(page.getByRole('cell', { name: /notebook created/ })).toBeVisible();
  const found = await new AxeBuilder({ page }).analyze();
  expect(found.violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
});

test('another person sees none of it: page, API and list', async ({ page, browser }) => {
  await signInAs(page, 'pi');
  const address = await makeNotebook(page, 'For the owner alone');
  const other = await (await browser.newContext()).newPage();
  await signInAs(other, 'student');
  expect((await other.goto(address))?.status()).toBe(404);
  expect((await other.request.get(`/api/v1${address}`)).status()).toBe(404);
  await other.goto('/notebooks');
  await expect(other.getByText('For the owner alone')).toHaveCount(0);
  await other.context().close();
});

test('members read, and lose it at the next click when they are removed', async ({ page, browser }) => {
  await signInAs(page, 'pi');
  const address = await makeNotebook(page, 'With a reader');
  await page.goto(`${address}/members`);
  await page.getByLabel('Person', { exact: true }).selectOption({ label: 'Isolde Quillan, viewer' });
  await page.getByRole('button', { name: 'Add to the notebook' }).click();
  await expect(page.getByRole('rowheader', { name: 'Isolde Quillan' })).toBeVisible();
  const reader = await (await browser.newContext()).newPage();
  await signInAs(reader, 'viewer');
  await reader.goto(address);
  await expect(reader.getByRole('heading', { level: 1, name: 'With a reader' })).toBeVisible();
  await page.getByRole('button', { name: 'Remove Isolde Quillan' }).click();
  await expect(page.getByRole('rowheader', { name: 'Isolde Quillan' })).toHaveCount(0);
  expect((await reader.reload())?.status()).toBe(404);
  await reader.context().close();
});

test('a share link opens the notebook in a browser without an account until it is withdrawn', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'pi');
  const address = await makeNotebook(page, 'Shared by a link');
  await page.goto(`${address}/members`);
  await page.getByLabel('Who is it for').fill('the client');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const link = (await page.getByTestId('share-address').textContent())?.trim() ?? '';
  const secret = link.split('/').at(-1) ?? '';
  expect(secret.length).toBeGreaterThan(30);

  const visitor = await (await browser.newContext()).newPage();
  await visitor.goto(new URL(link).pathname);
  await expect(visitor).toHaveURL(new RegExp(`${address}$`));
  await expect(visitor.getByRole('heading', { level: 1, name: 'Shared by a link' })).toBeVisible();
  await expect(visitor.getByText('Nothing can be changed here')).toBeVisible();
  expect(await visitor.content()).not.toContain(secret);
  expect((await visitor.goto(`${address}/members`))?.status()).toBe(404);
  expect((await visitor.request.post('/api/v1/notebooks', { data: {} })).status()).toBeGreaterThanOrEqual(
    400,
  );

  await page.reload();
  await page.getByRole('button', { name: 'Withdraw the link for the client' }).click();
  await expect(page.getByText('withdrawn', { exact: true })).toBeVisible();
  await visitor.goto(address);
  await expect(visitor).toHaveURL(/\/sign-in$/);
  await visitor.goto(new URL(link).pathname);
  await expect(visitor.getByRole('heading', { name: 'This link opens nothing' })).toBeVisible();
  await visitor.context().close();
});
