import { defineConfig, globalIgnores } from 'eslint/config';
import nextVitals from 'eslint-config-next/core-web-vitals';
import nextTs from 'eslint-config-next/typescript';

/*
 * Who may import whom: app -> components -> lib and app -> db -> lib; never back, never sideways between
 * components and db. `./` inside a folder, `@/` for the rest. In a flat config a later block replaces an
 * earlier one for the same file, so each narrower list repeats the wider.
 */
const NO_SERVER_OR_BROWSER = ['react', 'react-dom', 'next', 'next/**', 'sequelize', 'node:*', 'server-only'];
const FORBIDDEN = {
  'lib/**': ['@/app/**', '@/components/**', '@/db/**', ...NO_SERVER_OR_BROWSER],
  'lib/engine/**': ['@/**', '../../../**', 'zod', ...NO_SERVER_OR_BROWSER],
  // what the engine is checked against stands beside it, and knows it only from outside
  'lib/checks/**': [
    '@/app/**',
    '@/components/**',
    '@/db/**',
    '@/lib/*',
    '!@/lib/engine',
    '!@/lib/readers',
    '../../*',
    ...NO_SERVER_OR_BROWSER,
  ],
  // what is done to a spectrum before it is read: the engine's readings and lines, and no form or query
  'lib/corrections/**': [
    '@/app/**',
    '@/components/**',
    '@/db/**',
    '@/lib/*',
    '!@/lib/engine',
    '@/lib/engine/*',
    '!@/lib/engine/errors',
    '!@/lib/engine/spectrum',
    '!@/lib/corrections',
    '!@/lib/engine/regression',
    '!@/lib/format',
    '!@/lib/views',
    '../**',
    'zod',
    ...NO_SERVER_OR_BROWSER,
  ],
  'components/**': ['@/app/**', '@/db/**', '../**', 'sequelize', 'node:*'],
  'components/ui/**': [
    '@/app/**',
    '@/db/**',
    '@/lib/engine',
    '@/lib/engine/**',
    '@/components/*',
    '!@/components/ui',
    '../**',
    'sequelize',
    'node:*',
  ],
  'db/**': ['@/app/**', '@/components/**', 'react', 'react-dom', 'next', 'next/**'],
  'app/**': ['../**', 'sequelize', '@/db/*', '!@/db/queries', '!@/db/entry', '!@/db/actors'],
};

const arrows = Object.entries(FORBIDDEN).map(([folder, group]) => ({
  files: [`${folder}/*.{ts,tsx}`],
  rules: {
    'no-restricted-imports': [
      'error',
      {
        patterns: [{ group, message: `${folder} may not import this (DEVELOPERS.md, Who may import whom)` }],
      },
    ],
  },
}));

const MAKERS =
  'findByPk|findOne|findAll|findOrCreate|findAndCountAll|bulkCreate|destroy|upsert|increment|decrement';
const onlyInAccess = {
  selector: `CallExpression[callee.property.name=/^(${MAKERS})$/]`,
  message:
    'Rows come from db/access.ts only: loadFor, listFor, createFor, changeFor (DEVELOPERS.md, A table)',
};
const onlyInActors = {
  selector: 'TSAsExpression[typeAnnotation.typeName.name="Actor"]',
  message: 'Only db/actors.ts makes an Actor',
};
const noClock = ['Math.random', 'Date.now'].map((name) => {
  const [object, property] = name.split('.');
  return {
    selector: `MemberExpression[object.name="${object}"][property.name="${property}"]`,
    message: `The engine has no clock and no dice: pass them in instead of ${name}`,
  };
});
const noDate = { selector: 'NewExpression[callee.name="Date"]', message: 'The engine has no clock' };

export default defineConfig([
  ...nextVitals,
  ...nextTs,
  globalIgnores([
    '.next/**',
    '.next-*/**',
    'next-env.d.ts',
    'data/**',
    'test-results/**',
    'playwright-report/**',
    'coverage/**',
  ]),
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: 'error',
      'no-console': 'off',
    },
  },
  // Sequelize.useCLS is no React hook
  { files: ['db/**/*.ts'], rules: { 'react-hooks/rules-of-hooks': 'off' } },
  ...arrows,
  {
    // the round-off of report texts is the one thing the engine shares with the display
    files: ['lib/engine/**/*.ts'],
    rules: { 'no-restricted-syntax': ['error', onlyInActors, ...noClock, noDate] },
  },
  {
    files: [
      'app/**/*.{ts,tsx}',
      'components/**/*.{ts,tsx}',
      'db/queries/**/*.ts',
      'lib/policies/**/*.ts',
      'lib/schemas/**/*.ts',
      'lib/views/**/*.ts',
    ],
    rules: { 'no-restricted-syntax': ['error', onlyInAccess, onlyInActors] },
  },
  {
    files: ['db/queries/**/*.ts'],
    rules: {
      // a query that does not use its actor has forgotten to ask
      '@typescript-eslint/no-unused-vars': ['error', { args: 'all', argsIgnorePattern: '^_' }],
    },
  },
]);
