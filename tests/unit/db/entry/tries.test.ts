import { describe, expect, test, vi } from 'vitest';
import { countTry, forgetTries, pauseAfterMs, takeBackTry, TRIES } from '@/db/entry/tries';

describe('countTry', () => {
  test('counts, then refuses with how long to wait, and tells of it once', async () => {
    const onFirst = vi.fn(async () => undefined);
    for (let n = 1; n <= TRIES.account; n += 1) expect(await countTry('account', 'a', onFirst)).toBe(n);
    expect(onFirst).not.toHaveBeenCalled();
    const refusal = {
      code: 'TOO_MANY_TRIES',
      message: 'Too many wrong tries. Wait 15 minutes, then try again',
    };
    await expect(countTry('account', 'a', onFirst)).rejects.toMatchObject(refusal);
    await expect(countTry('account', 'a', onFirst)).rejects.toMatchObject(refusal);
    expect(onFirst).toHaveBeenCalledTimes(1);
    expect(await countTry('account', 'b')).toBe(1);
  });

  test('counts tries sent side by side', async () => {
    const all = Array.from({ length: TRIES.account + 5 }, () => countTry('account', 'side by side'));
    const outcomes = await Promise.allSettled(all);
    expect(outcomes.filter(({ status }) => status === 'rejected')).toHaveLength(5);
  });

  test('forgets after a right one, or takes back that one only', async () => {
    await countTry('account', 'c');
    await countTry('account', 'c');
    await takeBackTry('account', 'c');
    expect(await countTry('account', 'c')).toBe(2);
    await forgetTries('account', 'c');
    expect(await countTry('account', 'c')).toBe(1);
  });
});

test('each wrong try after the third waits longer, up to four seconds', () => {
  expect([1, 2, 3, 4, 5, 6, 7, 8, 10].map(pauseAfterMs)).toEqual([
    0, 0, 0, 500, 1000, 2000, 4000, 4000, 4000,
  ]);
});
