import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { environment } from './environment';
import { newSecret } from './secrets';
import { dataDir } from './sequelize';

const file = () => path.join(dataDir(), 'session-secret');

/** In a demo the secret is random and stays beside the data; elsewhere the environment must give it. */
export function keepDemoSecret(): void {
  if (!existsSync(file())) writeFileSync(file(), newSecret(), { mode: 0o600 });
}

/** What seals the session cookie. */
export function sessionSecret(): string {
  const given = environment().SESSION_SECRET;
  if (given) return given;
  if (!existsSync(file())) throw new Error('SESSION_SECRET is missing: start Halflight with npm start');
  return readFileSync(file(), 'utf8').trim();
}
