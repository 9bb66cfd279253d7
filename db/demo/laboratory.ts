import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { createFor } from '../access';
import { systemActor } from '../actors';
import { hashPassword } from '../passwords';
import { hashSecret, newSecret } from '../secrets';
import { dataDir, inTransaction } from '../sequelize';
import { DEMO_ACCOUNTS } from './people';

const TOKEN_DAYS = 365;
const tokenFile = () => path.join(dataDir(), 'demo-read-token');

/** The read token that the terminal prints in a demo; null outside one. */
export function demoReadToken(): string | null {
  return existsSync(tokenFile()) ? readFileSync(tokenFile(), 'utf8').trim() : null;
}

/**
 * The laboratory, its people and one read token. Answers with the id of each person by their key.
 */
export async function createDemoLaboratory(): Promise<Map<string, string>> {
  const system = systemActor('Demonstration');
  const ids = new Map<string, string>();
  await inTransaction(async () => {
    await createFor(system, 'laboratory', {
      name: 'Larkmoor Reach Laboratory',
      timeZone: 'Europe/London',
      demo: true,
    });
    for (const { key, name, email, password, role } of DEMO_ACCOUNTS) {
      const passwordHash = await hashPassword(password);
      const row = await createFor(system, 'person', { name, email, role, passwordHash });
      ids.set(key, row.id);
    }
    const token = `hl_${newSecret()}`;
    await createFor(system, 'apiToken', {
      personId: ids.get('pi') ?? '',
      name: 'Demonstration, printed in the terminal',
      tokenHash: hashSecret(token),
      scope: 'read',
      expiresAt: new Date(Date.now() + TOKEN_DAYS * 86_400_000),
    });
    writeFileSync(tokenFile(), token, { mode: 0o600 });
  });
  return ids;
}
