import { createHash } from 'node:crypto';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '@/lib/errors';

/* Guessing, slowed and limited. The counters live in memory: a restart forgets them, the record does not. */

const WINDOW_S = 15 * 60;
export const TRIES = { account: 10, address: 60, password: 10 } as const;
export type TryKind = keyof typeof TRIES;

type Limiters = Record<TryKind, RateLimiterMemory>;
/** On globalThis for the reason that db/sequelize.ts gives. */
const shared = globalThis as typeof globalThis & { __halflightTries?: Limiters };

function limiter(kind: TryKind): RateLimiterMemory {
  const make = (points: number) =>
    new RateLimiterMemory({ points, duration: WINDOW_S, blockDuration: WINDOW_S });
  shared.__halflightTries ??= {
    account: make(TRIES.account),
    address: make(TRIES.address),
    password: make(TRIES.password),
  };
  return shared.__halflightTries[kind];
}

const keyOf = (who: string) => createHash('sha256').update(who).digest('hex');

function tooMany(waitMs: number): AppError {
  const minutes = Math.max(1, Math.ceil(waitMs / 60_000));
  const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
  return new AppError('TOO_MANY_TRIES', `Too many wrong tries. Wait ${wait}, then try again`);
}

/**
 * Count a try before it is judged, so that tries sent side by side are counted as well.
 *
 * @returns how many there were in the last quarter of an hour, this one included
 * @throws AppError TOO_MANY_TRIES, the same for every name; `onFirst` runs when the limit is met for the first time
 */
export async function countTry(kind: TryKind, who: string, onFirst?: () => Promise<void>): Promise<number> {
  try {
    return (await limiter(kind).consume(keyOf(who))).consumedPoints;
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    if (refusal.consumedPoints === TRIES[kind] + 1) await onFirst?.();
    throw tooMany(refusal.msBeforeNext);
  }
}

/** The try was right: forget those before it. */
export async function forgetTries(kind: TryKind, who: string): Promise<void> {
  await limiter(kind).delete(keyOf(who));
}

/** The try was right, but others from the same place still count: take back this one only. */
export async function takeBackTry(kind: TryKind, who: string): Promise<void> {
  await limiter(kind).reward(keyOf(who));
}

const FREE_TRIES = 3;
const LONGEST_PAUSE_MS = 4000;

/** How long the answer to the n-th wrong try waits: not at all at first, then 0.5 s, 1 s, 2 s, 4 s. */
export function pauseAfterMs(tries: number): number {
  return tries <= FREE_TRIES ? 0 : Math.min(LONGEST_PAUSE_MS, 500 * 2 ** (tries - FREE_TRIES - 1));
}
