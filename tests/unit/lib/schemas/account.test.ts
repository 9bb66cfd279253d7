import { describe, expect, test } from 'vitest';
import type { ZodType } from 'zod';
import { newToken, setUpForm, signInForm } from '@/lib/schemas/account';
import { passwordByLink, passwordChange } from '@/lib/schemas/password';
import { personAccess, personDetails } from '@/lib/schemas/people';

function sentences(schema: ZodType, input: unknown): Record<string, string> {
  const result = schema.safeParse(input);
  if (result.success) return {};
  return Object.fromEntries(result.error.issues.map((issue) => [issue.path.join('.'), issue.message]));
}

const person = { name: 'Aud Finn', email: 'aud@example.org', role: 'analyst' };
const password = 'a long enough one';
const setUp = {
  ...{ code: 'abcd', laboratory: 'Fen', timeZone: 'UTC', name: 'Aud Finn', email: 'aud@example.org' },
  ...{ password, passwordAgain: password },
};

describe('sign-in', () => {
  test('an address is taken without the blanks and capitals around it', () => {
    expect(signInForm.parse({ email: '  Aud@Example.ORG ', password: ' x ' })).toEqual({
      email: 'aud@example.org',
      password: ' x ',
    });
  });

  test('nonsense gets its sentence at its field', () => {
    expect(sentences(signInForm, { email: 'nobody', password: '' })).toEqual({
      email: 'Enter an e-mail address, such as name@example.org',
      password: 'Enter your password',
    });
  });
});

describe('people', () => {
  test('takes a person', () => {
    expect(sentences(personDetails, person)).toEqual({});
  });

  test.each([
    ['name', '   ', 'Enter a name'],
    ['name', 'n'.repeat(121), 'A name may have 120 characters at most'],
    ['email', 'aud at example', 'Enter an e-mail address, such as name@example.org'],
    ['email', `${'a'.repeat(260)}@example.org`, 'An e-mail address has 254 characters at most'],
    ['role', 'owner', 'Choose a role'],
  ])('refuses %s %j', (field, text, sentence) => {
    expect(sentences(personDetails, { ...person, [field]: text })).toEqual({ [field]: sentence });
  });

  test('access is yes or no', () => {
    expect(personAccess.parse({ personId: 'p', active: 'no', why: ' left ' })).toEqual({
      personId: 'p',
      active: false,
      why: 'left',
    });
    expect(Object.keys(sentences(personAccess, { personId: 'p', active: 'maybe', why: '' }))).toEqual([
      'active',
    ]);
  });
});

describe('new passwords', () => {
  test('the second typing must be the same', () => {
    const form = { token: 't', password, passwordAgain: password + ' ' };
    expect(sentences(passwordByLink, form)).toEqual({
      passwordAgain: 'This differs from the password above; type both again',
    });
    expect(sentences(passwordByLink, { ...form, passwordAgain: password })).toEqual({});
  });

  test('a short one is refused with its length', () => {
    const form = { currentPassword: 'old', password: 'short', passwordAgain: 'short' };
    expect(sentences(passwordChange, form).password).toContain('This has 5 bytes');
  });
});

describe('set-up', () => {
  test('takes a filled form', () => {
    expect(sentences(setUpForm, setUp)).toEqual({});
  });

  test.each([
    ['code', ' ', 'Enter the code that the terminal printed'],
    ['laboratory', '', 'Give the laboratory a name'],
    ['timeZone', 'Middle/Earth', 'Choose a time zone from the list'],
  ])('refuses %s %j', (field, text, sentence) => {
    expect(sentences(setUpForm, { ...setUp, [field]: text })).toEqual({ [field]: sentence });
  });
});

describe('access tokens', () => {
  const token = { name: 'Balance export', scope: 'read', days: '90' };

  test.each(['1', '90', '366'])('takes %s days', (days) => {
    expect(newToken.parse({ ...token, days }).days).toBe(Number(days));
  });

  test.each(['0', '367', '', '-3', '1.5', 'a week', '1e2'])('refuses %j days', (days) => {
    expect(sentences(newToken, { ...token, days })).toEqual({ days: 'Enter whole days, from 1 to 366' });
  });

  test('asks what it may do and what it is for', () => {
    expect(sentences(newToken, { ...token, name: '', scope: 'all' })).toEqual({
      name: 'Say what the token is for',
      scope: 'Choose what the token may do',
    });
  });
});
