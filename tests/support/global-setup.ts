import { startApp } from './start-app';

/**
 * Starts one demo laboratory for all browser tests and stops it after them. The tests find it through
 * baseURL, and what it printed (accounts, read token) in HALFLIGHT_E2E_PRINTED.
 */
export default async function globalSetup(): Promise<() => Promise<void>> {
  const app = await startApp({ DEMO: '1' });
  process.env.HALFLIGHT_E2E_URL = app.url;
  process.env.HALFLIGHT_E2E_DATA_DIR = app.dataDir;
  process.env.HALFLIGHT_E2E_PRINTED = app.printed();
  return () => app.stop();
}
