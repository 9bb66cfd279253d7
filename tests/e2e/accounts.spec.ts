import { randomUUID } from 'node:crypto';
import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Browser, type Page } from '@playwright/test';
import { signInAs } from './support/sign-in';

const PASSWORD = 'reeds by the weir';

async function anotherBrowser(
  browser: Browser,
  options: { javaScriptEnabled?: boolean } = {},
): Promise<Page> {
  return (await browser.newContext(options)).newPage();
}

async function expectNoSeriousFinding(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
}

/** An administrator adds somebody; answers with the link that the page shows once. */
async function addPerson(administrator: Page, role: string) {
  const mark = randomUUID().slice(0, 8);
  const person = { name: `Guest ${mark}`, email: `guest.${mark}@example.org` };
  await administrator.goto('/people/new');
  await administrator.getByLabel('Name').fill(person.name);
  await administrator.getByLabel('E-mail address').fill(person.email.toUpperCase());
  await administrator.getByRole('radio', { name: new RegExp(`^${role}`) }).check();
  await administrator.getByRole('button', { name: 'Add and make a link' }).click();
  const shown = administrator.getByRole('group', { name: 'Link to set a password' });
  const link = (await shown.textContent())?.trim() ?? '';
  return { ...person, link: new URL(link).pathname };
}

async function setPassword(page: Page, link: string): Promise<void> {
  await page.goto(link);
  await page.getByLabel('New password', { exact: true }).fill(PASSWORD);
  await page.getByLabel('New password, again').fill(PASSWORD);
  await page.getByRole('button', { name: 'Set the password and sign in' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Before you begin' })).toBeVisible();
}

/** Set the password, find every way past the cautions closed, and read them. */
async function join(page: Page, link: string): Promise<void> {
  await setPassword(page, link);
  await page.goto('/account');
  await expect(page).toHaveURL(/\/welcome$/);
  await page.getByRole('button', { name: 'I have read this, go on' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
}

async function typeSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

async function openPerson(administrator: Page, name: string): Promise<void> {
  await administrator.goto('/people');
  await administrator.getByRole('link', { name }).click();
  await expect(administrator.getByRole('heading', { level: 1, name })).toBeVisible();
}

test('in the demonstration the keyboard signs in with four keys, and the page says the passwords are public', async ({
  page,
}) => {
  await page.goto('/sign-in');
  await expect(page.getByText('the passwords are public').first()).toBeVisible();
  await expectNoSeriousFinding(page);
  await expect(page.getByLabel('E-mail address')).toBeFocused();
  for (let n = 0; n < 3; n += 1) await page.keyboard.press('Tab');
  await expect(page.getByRole('button', { name: 'Sign in as Maren Oldacre' })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page).not.toHaveURL(/sign-in/);
  await expect(page.getByText('Maren Oldacre').first()).toBeVisible();
});

test('an unknown address and a wrong password get the same sentence, and nothing that was typed is lost but the password', async ({
  page,
}) => {
  await typeSignIn(page, 'nobody', 'x');
  await expect(page.getByText('Enter an e-mail address, such as name@example.org')).toBeVisible();
  await expect(page.getByLabel('E-mail address')).toBeFocused();
  await expect(page.getByLabel('E-mail address')).toHaveValue('nobody');
  await typeSignIn(page, `nobody.${randomUUID()}@example.org`, 'not the right one');
  await expect(page.getByText('This e-mail address and password do not go together')).toBeVisible();
  await expect(page.getByLabel('E-mail address')).toHaveValue(/^nobody\./);
  await expect(page.getByLabel('Password')).toHaveValue('');
});

test('an administrator adds a person, who sets a password in another browser and is in until the account is closed', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'administrator');
  const guest = await addPerson(page, 'analyst');
  await expectNoSeriousFinding(page);

  const theirs = await anotherBrowser(browser);
  await setPassword(theirs, guest.link);
  await expectNoSeriousFinding(theirs);
  await theirs.getByRole('button', { name: 'I have read this, go on' }).click();
  await expect(theirs.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
  await expect(theirs.getByRole('link', { name: 'People' })).toHaveCount(0);
  expect((await theirs.goto('/people'))?.status()).toBe(404);
  expect((await theirs.goto('/people/new'))?.status()).toBe(404);

  // the link is spent: in a third browser it says so
  const third = await anotherBrowser(browser);
  await third.goto(guest.link);
  await expect(third.getByText('This link has been used')).toBeVisible();
  await typeSignIn(third, guest.email, 'not the right one');
  await expect(third.getByText('This e-mail address and password do not go together')).toBeVisible();
  await typeSignIn(third, guest.email, PASSWORD);
  await expect(third.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();

  await openPerson(page, guest.name);
  await expectNoSeriousFinding(page);
  await page.getByLabel('Why').fill('left the laboratory');
  await page.getByRole('button', { name: 'Close the account' }).click();
  await expect(page.getByText('closed', { exact: true })).toBeVisible();
  await theirs.getByRole('link', { name: 'Halflight' }).first().click();
  await expect(theirs).toHaveURL(/\/sign-in$/);
  await third.goto('/account');
  await expect(third).toHaveURL(/\/sign-in$/);
  await typeSignIn(third, guest.email, PASSWORD);
  await expect(third.getByText('This e-mail address and password do not go together')).toBeVisible();
  await theirs.context().close();
  await third.context().close();
});

test('a refused person form says why at the field and keeps the rest; a second link withdraws the first', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'administrator');
  const guest = await addPerson(page, 'viewer');
  await page.goto('/people/new');
  await page.getByLabel('Name').fill('Second of that address');
  await page.getByLabel('E-mail address').fill(guest.email);
  await page.getByRole('button', { name: 'Add and make a link' }).click();
  await expect(page.getByText('Choose a role')).toBeVisible();
  await page.getByRole('radio', { name: /^PI/ }).check();
  await page.getByRole('button', { name: 'Add and make a link' }).click();
  await expect(page.getByText(`${guest.name} has this e-mail address already`)).toBeVisible();
  await expect(page.getByLabel('Name')).toHaveValue('Second of that address');
  await expect(page.getByRole('radio', { name: /^PI/ })).toBeChecked();

  await openPerson(page, guest.name);
  await page.getByRole('button', { name: 'Make a link to set a password' }).click();
  const shown = page.getByRole('group', { name: 'Link to set a password' });
  const second = new URL((await shown.textContent())?.trim() ?? '').pathname;
  const theirs = await anotherBrowser(browser);
  await theirs.goto(guest.link);
  await expect(theirs.getByText('This link was withdrawn')).toBeVisible();
  await theirs.goto(second);
  await theirs.getByLabel('New password', { exact: true }).fill('too short');
  await theirs.getByLabel('New password, again').fill('too short');
  await theirs.getByRole('button', { name: 'Set the password and sign in' }).click();
  await expect(theirs.getByText('This has 9 bytes; a password needs at least 12')).toBeVisible();
  await expect(theirs.getByLabel('New password', { exact: true })).toHaveValue('');
  await setPassword(theirs, second);
  await theirs.context().close();
});

test('a changed role acts at the next click', async ({ page, browser }) => {
  await signInAs(page, 'administrator');
  const guest = await addPerson(page, 'viewer');
  const theirs = await anotherBrowser(browser);
  await join(theirs, guest.link);
  expect((await theirs.goto('/people'))?.status()).toBe(404);
  await openPerson(page, guest.name);
  await page.getByRole('radio', { name: /^administrator/ }).check();
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText('acts from their next click on')).toBeVisible();
  expect((await theirs.goto('/people'))?.status()).toBe(200);
  // put back, so that other tests meet one administrator
  await page.getByRole('radio', { name: /^viewer/ }).check();
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(async () => expect((await theirs.goto('/people'))?.status()).toBe(404)).toPass();
  await theirs.context().close();
});

test('the account page ends one session, then all of them, and changes name and password', async ({
  page,
  browser,
}) => {
  const administrator = await anotherBrowser(browser);
  await signInAs(administrator, 'administrator');
  const guest = await addPerson(administrator, 'analyst');
  await administrator.context().close();
  await join(page, guest.link);

  const second = await anotherBrowser(browser);
  await typeSignIn(second, guest.email, PASSWORD);
  await expect(second.getByRole('heading', { level: 1 })).not.toHaveText('Sign in');
  await page.goto('/account');
  await expectNoSeriousFinding(page);
  const table = page.getByRole('table', { name: 'Where you are signed in' });
  await expect(table.getByText('this browser')).toHaveCount(1);
  await table.getByRole('button', { name: /^End the session/ }).click();
  await expect(table.getByRole('button', { name: /^End the session/ })).toHaveCount(0);
  await second.goto('/account');
  await expect(second).toHaveURL(/\/sign-in$/);

  await page.getByRole('textbox', { name: 'Name' }).fill(`${guest.name} the second`);
  await page.getByRole('button', { name: 'Save the name' }).click();
  await expect(page.getByText(`${guest.name} the second`).first()).toBeVisible();
  await page.getByLabel('Password now').fill('not this');
  await page.getByLabel('New password', { exact: true }).fill(`${PASSWORD} 2`);
  await page.getByLabel('New password, again').fill(`${PASSWORD} 2`);
  await page.getByRole('button', { name: 'Change the password' }).click();
  await expect(page.getByText('This is not the password you have now')).toBeVisible();
  await page.getByLabel('Password now').fill(PASSWORD);
  await page.getByLabel('New password', { exact: true }).fill(`${PASSWORD} 2`);
  await page.getByLabel('New password, again').fill(`${PASSWORD} 2`);
  await page.getByRole('button', { name: 'Change the password' }).click();
  await expect(page.getByText('The new password is set')).toBeVisible();

  await typeSignIn(second, guest.email, `${PASSWORD} 2`);
  await expect(second.getByRole('heading', { level: 1 })).not.toHaveText('Sign in');
  await page.getByRole('button', { name: 'Sign out everywhere' }).click();
  await expect(page).toHaveURL(/\/sign-in$/);
  await second.goto('/account');
  await expect(second).toHaveURL(/\/sign-in$/);
  await second.context().close();
});

test('a token made on its page tells a script whose it is until it is revoked', async ({
  page,
  playwright,
  baseURL,
}) => {
  await signInAs(page, 'student');
  await page.goto('/account/tokens');
  const name = `Balance export ${randomUUID().slice(0, 8)}`;
  await page.getByLabel('What it is for').fill(name);
  await page.getByLabel('Good for').fill('400');
  await page.getByRole('button', { name: 'Make a token' }).click();
  await expect(page.getByText('Enter whole days, from 1 to 366')).toBeVisible();
  await page.getByLabel('Good for').fill('7');
  await page.getByRole('button', { name: 'Make a token' }).click();
  const token = (await page.getByRole('group', { name: 'Access token' }).textContent())?.trim() ?? '';
  await expectNoSeriousFinding(page);

  const script = await playwright.request.newContext({ baseURL });
  const asToken = { headers: { authorization: `Bearer ${token}` } };
  expect((await script.get('/api/v1/me')).status()).toBe(401);
  const me = await script.get('/api/v1/me', asToken);
  expect(await me.json()).toMatchObject({
    kind: 'person',
    via: 'token',
    name: 'Juno Ashmere',
    canWrite: false,
  });
  expect((await script.post('/api/v1/notebooks', { ...asToken, data: {} })).status()).toBeGreaterThanOrEqual(
    400,
  );

  await page.reload();
  await expect(page.getByText(token)).toHaveCount(0);
  await page.getByRole('button', { name: `Revoke the token ${name}` }).click();
  await expect(page.getByRole('row', { name: new RegExp(name) }).getByText('revoked')).toBeVisible();
  expect((await script.get('/api/v1/me', asToken)).status()).toBe(401);
  await script.dispose();
});

test('without JavaScript one can be refused, sign in, set a password and sign out', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'administrator');
  const guest = await addPerson(page, 'viewer');
  const plain = await anotherBrowser(browser, { javaScriptEnabled: false });
  await setPassword(plain, guest.link);
  await plain.getByRole('button', { name: 'I have read this, go on' }).click();
  await expect(plain.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
  await plain.getByRole('button', { name: 'Sign out' }).click();
  await expect(plain).toHaveURL(/\/sign-in$/);
  await typeSignIn(plain, guest.email, 'not the right one');
  await expect(plain.getByText('This e-mail address and password do not go together')).toBeVisible();
  await expect(plain.getByLabel('E-mail address')).toHaveValue(guest.email);
  await typeSignIn(plain, guest.email, PASSWORD);
  await expect(plain.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
  await plain.context().close();
});

test('cautions stand at the foot of every page, for strangers and for people signed in', async ({ page }) => {
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Cautions' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Cautions' })).toBeVisible();
  await expect(page.getByText('not a medical device')).toBeVisible();
  await expectNoSeriousFinding(page);
  await signInAs(page, 'analyst');
  await page.getByRole('link', { name: 'Cautions' }).click();
  await page.getByRole('link', { name: 'Back to the notebooks' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Notebooks' })).toBeVisible();
});

test('the set-up page is not there once there is a laboratory', async ({ page }) => {
  expect((await page.goto('/set-up'))?.status()).toBe(404);
});
