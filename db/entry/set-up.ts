import { randomInt, timingSafeEqual } from 'node:crypto';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { AppError } from '@/lib/errors';
import type { SetUpForm } from '@/lib/schemas/account';
import { createFor } from '../access';
import { openSession, systemActor } from '../actors';
import { hashPassword, refuseKnownPassword } from '../passwords';
import { hashSecret } from '../secrets';
import { dataDir, inTransaction } from '../sequelize';
import { laboratory } from './settings';
import type { SignedIn } from './sign-in';

/* The first step of a real laboratory, open to whoever can read the terminal that the server was started in. */

const LETTERS = 'abcdefghjkmnpqrstuvwxyz23456789'; // none that is taken for another: no i, l, o, 0, 1
const GROUPS = 4;
const GROUP_LENGTH = 4;
const TRIES = 10;

interface StoredCode {
  readonly hash: string;
  readonly triesLeft: number;
}

const file = () => path.join(dataDir(), 'set-up-code.json');
const plain = (code: string) => code.toLowerCase().replace(/[\s-]/g, '');
const keep = (stored: StoredCode) => writeFileSync(file(), JSON.stringify(stored), { mode: 0o600 });

/** A new one-time code for the set-up page; one printed before is good no more. Only its hash is kept. */
export async function newSetUpCode(): Promise<string> {
  const letter = () => LETTERS[randomInt(LETTERS.length)];
  const group = () => Array.from({ length: GROUP_LENGTH }, letter).join('');
  const code = Array.from({ length: GROUPS }, group).join('-');
  keep({ hash: hashSecret(plain(code)), triesLeft: TRIES });
  return code;
}

function refuse(detail: string): never {
  throw new AppError('INVALID_INPUT', undefined, [{ pointer: 'code', detail }]);
}

/** Read, count and compare in one go without waiting for anything, so that no two tries count as one. */
function checkCode(code: string): void {
  if (!existsSync(file())) refuse('There is no code to compare with. Start Halflight again; it prints one');
  const stored = JSON.parse(readFileSync(file(), 'utf8')) as StoredCode; // written by keep() above
  if (stored.triesLeft < 1) refuse('Too many wrong codes. Start Halflight again; it prints a new one');
  keep({ ...stored, triesLeft: stored.triesLeft - 1 });
  const given = Buffer.from(hashSecret(plain(code)), 'hex');
  if (!timingSafeEqual(given, Buffer.from(stored.hash, 'hex')))
    refuse('This is not the code that the terminal printed last');
}

async function refuseWhenSetUp(): Promise<void> {
  if (await laboratory()) throw new AppError('NOT_FOUND', 'This laboratory has been set up. Sign in instead');
}

/**
 * Make the laboratory and its first administrator, and sign them in.
 *
 * @throws AppError NOT_FOUND once there is a laboratory; INVALID_INPUT at `code` or `password`
 */
export async function setUp(input: SetUpForm): Promise<SignedIn> {
  await refuseWhenSetUp();
  refuseKnownPassword(input.password, input.email);
  checkCode(input.code);
  const passwordHash = await hashPassword(input.password);
  const system = systemActor('Set-up');
  const sessionId = await inTransaction(async () => {
    await refuseWhenSetUp(); // again: two people may hold the code
    const { laboratory: name, timeZone, email } = input;
    await createFor(system, 'laboratory', { name, timeZone, demo: false });
    const person = { name: input.name, email, role: 'administrator' as const, passwordHash };
    return openSession((await createFor(system, 'person', person)).id);
  });
  rmSync(file(), { force: true });
  return { sessionId, welcomed: false };
}
