import {
  expect,
  test,
  type APIRequestContext,
  type Browser,
  type BrowserContext,
  type Page,
} from '@playwright/test';
import { signInAs } from './support/sign-in';

/*
 * The demo laboratory's notebook, shared by a link: a visitor without an account walks every link and every
 * call of the API, and tries every write that the owner's pages and the API have.
 */

test.setTimeout(240_000);

const PAGES_AT_MOST = 80;

interface Listed {
  readonly items: readonly { readonly id: string; readonly kind?: string }[];
}

async function idsOf(request: APIRequestContext, path: string): Promise<string[]> {
  const answer = await request.get(path);
  expect(answer.status(), path).toBe(200);
  return ((await answer.json()) as Listed).items.map(({ id }) => id);
}

async function demoNotebook(page: Page): Promise<string> {
  await page.getByRole('link', { name: 'Total iron, outfalls of the Tessel' }).first().click();
  await expect(page.getByRole('heading', { level: 1, name: /^Total iron/ })).toBeVisible();
  return new URL(page.url()).pathname;
}

async function visit(page: Page, browser: Browser, notebook: string): Promise<BrowserContext> {
  await page.goto(`${notebook}/members`);
  await page.getByLabel('Who is it for').fill('the walk of every link');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const link = (await page.getByTestId('share-address').textContent())?.trim() ?? '';
  // without JavaScript a page shows its forms as they are, and is read as fast as it is sent
  const visitor = await browser.newContext({ javaScriptEnabled: false });
  await (await visitor.newPage()).goto(new URL(link).pathname);
  return visitor;
}

/** Every page that can be reached from the front page of the notebook. */
async function walk(visitor: BrowserContext, notebook: string): Promise<string[]> {
  const page = visitor.pages()[0] ?? (await visitor.newPage());
  const [seen, queue] = [new Set<string>([notebook]), [notebook]];
  for (let next = queue.shift(); next !== undefined && seen.size < PAGES_AT_MOST; next = queue.shift()) {
    const answer = await page.goto(next, { waitUntil: 'commit' });
    expect(answer?.status(), next).toBe(200);
    await page.waitForLoadState('domcontentloaded');
    expect(await page.locator('form[method="post" i]').count(), `forms that write on ${next}`).toBe(0);
    const links = await page
      .locator('a[href]')
      .evaluateAll((all) => all.map((one) => (one as HTMLAnchorElement).href));
    for (const href of links) {
      const { origin, pathname } = new URL(href);
      if (origin !== new URL(page.url()).origin || pathname.startsWith('/api/') || seen.has(pathname))
        continue;
      seen.add(pathname);
      queue.push(pathname);
    }
  }
  return [...seen];
}

/** Every call of the API that reads something of the notebook. */
async function readCalls(request: APIRequestContext, notebook: string): Promise<string[]> {
  const base = `/api/v1${notebook}`;
  const [files, spectra, curves, batches] = await Promise.all(
    ['source-files', 'spectra', 'curves', 'batches'].map((list) => idsOf(request, `${base}/${list}`)),
  );
  const determinations = await idsOf(request, `/api/v1/batches/${batches?.[0]}/determinations`);
  return [
    '/api/v1/notebooks',
    base,
    `${base}/absorptivities`,
    `${base}/record`,
    `/api/v1/source-files/${files?.[0]}`,
    `/api/v1/source-files/${files?.[0]}/bytes`,
    `/api/v1/spectra/${spectra?.[0]}`,
    `/api/v1/spectra?ids=${spectra?.slice(0, 3).join(',')}`,
    `/api/v1/curves/${curves?.[0]}`,
    `/api/v1/batches/${batches?.[0]}`,
    `/api/v1/determinations/${determinations[0]}`,
  ];
}

/** What the owner's pages would send: the fields of every form that writes, page by page. */
async function ownersForms(owner: BrowserContext, paths: readonly string[]) {
  const page = await owner.newPage();
  const forms: { path: string; fields: Record<string, string> }[] = [];
  for (const path of paths) {
    await page.goto(path);
    const found = await page.locator('form[method="post" i]').evaluateAll((all) =>
      all.map((form) => {
        const data = new FormData(form as HTMLFormElement);
        return Object.fromEntries(
          [...data].filter((entry): entry is [string, string] => typeof entry[1] === 'string'),
        );
      }),
    );
    forms.push(...found.map((fields) => ({ path, fields })));
  }
  return forms;
}

const newestEntry = async (request: APIRequestContext, notebook: string) =>
  (await idsOf(request, `/api/v1${notebook}/record?limit=1`))[0];

test('a visitor with a link reads everything and changes nothing', async ({ page, browser, baseURL }) => {
  await signInAs(page, 'pi');
  const notebook = await demoNotebook(page);
  const visitor = await visit(page, browser, notebook);

  const pages = await walk(visitor, notebook);
  expect(pages.filter((path) => path.startsWith(`${notebook}/`)).length).toBeGreaterThan(15);
  expect(pages.filter((path) => /\/(members|settings|new|add|new-version|version)$/.test(path))).toEqual([]);
  for (const path of await readCalls(visitor.request, notebook))
    expect((await visitor.request.get(path)).status(), path).toBe(200);

  const before = await newestEntry(page.request, notebook);
  const owner = await browser.newContext({
    javaScriptEnabled: false,
    storageState: await page.context().storageState(),
  });
  const curve = pages.find((path) => /\/curves\/[0-9a-f-]{36}$/.test(path)) ?? '';
  const batch = pages.find((path) => /\/batches\/[0-9a-f-]{36}$/.test(path)) ?? '';
  const determination = pages.find((path) => path.includes('/determinations/')) ?? '';
  const spectrum = pages.find((path) => /\/spectra\/[0-9a-f-]{36}$/.test(path)) ?? '';
  const places = ['', '/settings', '/members', '/curves/new', '/absorptivities/new', '/batches/new'].map(
    (end) => notebook + end,
  );
  const forms = await ownersForms(owner, [
    ...places,
    curve,
    `${curve}/new-version`,
    batch,
    `${batch}/add`,
    `${batch}/version`,
    determination,
    spectrum,
  ]);
  expect(forms.length).toBeGreaterThan(6);
  for (const { path, fields } of forms)
    await visitor.request.post(path, { multipart: fields, headers: { origin: baseURL ?? '' } });

  const [spectrumId] = await idsOf(page.request, `/api/v1${notebook}/spectra`);
  const writes = [
    visitor.request.post('/api/v1/notebooks', {
      data: { title: 'x', purpose: '', ownerId: crypto.randomUUID() },
    }),
    visitor.request.post(`/api/v1${notebook}/source-files`, {
      multipart: {
        file: {
          name: 'a.csv',
          mimeType: 'text/csv',
          buffer: Buffer.from('nm,A\n400,0.1\n401,0.2\n402,0.3\n'),
        },
      },
    }),
    visitor.request.patch(`/api/v1/spectra/${spectrumId}`, { data: { name: 'renamed' } }),
  ];
  for (const answer of await Promise.all(writes)) expect([403, 404, 405]).toContain(answer.status());
  expect(await newestEntry(page.request, notebook)).toBe(before);
  await owner.close();
  await visitor.close();
});
