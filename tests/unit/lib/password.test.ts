import { describe, expect, test } from 'vitest';
import { normalPassword, passwordBytes, passwordProblem } from '@/lib/password';

describe('passwordBytes', () => {
  // Reference: RFC 3629, section 3: U+0000..7F one byte, ..7FF two, ..FFFF three, beyond four.
  test.each([
    ['twelve plain', 12],
    ['é', 2],
    ['€', 3],
    ['🧪', 4],
    ['', 0],
  ])('counts %s as %i', (text, bytes) => {
    expect(passwordBytes(text)).toBe(bytes);
  });

  test('is the same however an accent was typed', () => {
    expect(passwordBytes('e\u0301')).toBe(2);
    expect(normalPassword('e\u0301')).toBe('\u00e9');
  });
});

describe('passwordProblem', () => {
  test.each([
    ['a'.repeat(11), 'This has 11 bytes; a password needs at least 12'],
    ['é'.repeat(37), 'This has 74 bytes; a password may have 72 at most'],
    ['', 'Enter a password'],
    ['twelve bytes\0', 'zero byte'],
  ])('refuses %j', (text, sentence) => {
    expect(passwordProblem(text)).toContain(sentence);
  });

  test.each(['a'.repeat(12), 'a'.repeat(72), 'é'.repeat(6), 'é'.repeat(36), '            '])(
    'takes %j',
    (text) => {
      expect(passwordProblem(text)).toBeNull();
    },
  );
});
