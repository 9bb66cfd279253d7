import { describe, expect, test } from 'vitest';
import { refusal } from '@/db/start-checks';
import { parseEnv } from '@/lib/env';

const SECRET = 'x'.repeat(32);
const laboratory = (demo: boolean) => ({ id: '1', name: 'L', timeZone: 'UTC', demo });
const check = (raw: Record<string, string>, existing: ReturnType<typeof laboratory> | null) =>
  refusal(parseEnv(raw), existing);

describe('a start is refused', () => {
  test.each([
    ['a demo database with DEMO=0', { DEMO: '0', SESSION_SECRET: SECRET }, laboratory(true), /DEMO=0/],
    ['a real database with DEMO=1', { DEMO: '1', SESSION_SECRET: SECRET }, laboratory(false), /DEMO=1/],
    ['a real database without a secret', {}, laboratory(false), /SESSION_SECRET/],
    ['an empty database meant to be real, without a secret', { DEMO: '0' }, null, /SESSION_SECRET/],
    ['a demo for other computers', { HOST: '0.0.0.0' }, null, /this computer only/],
    ['a demo database for other computers', { HOST: '192.0.2.1' }, laboratory(true), /this computer only/],
  ])('%s', (_case, raw, existing, sentence) => {
    expect(check(raw, existing)).toMatch(sentence);
  });
});

describe('a start is allowed', () => {
  test.each([
    ['an empty database becomes a demo', {}, null],
    ['a demo database, asked for as one', { DEMO: '1' }, laboratory(true)],
    [
      'a real one with a secret, for everybody',
      { SESSION_SECRET: SECRET, HOST: '0.0.0.0' },
      laboratory(false),
    ],
    ['an empty one meant to be real', { DEMO: '0', SESSION_SECRET: SECRET }, null],
    ['a demo by its name', { HOST: 'localhost' }, null],
  ])('%s', (_case, raw, existing) => {
    expect(check(raw, existing)).toBeNull();
  });
});
