import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import checkFile from 'eslint-plugin-check-file';
import reactHooks from 'eslint-plugin-react-hooks';
import { defineConfig } from 'eslint/config';
import globals from 'globals';
import ts from 'typescript-eslint';

const IMPURE_GLOBALS = [
  'process',
  'console',
  'performance',
  'Date',
  'crypto',
  'fetch',
  'setTimeout',
  'setInterval',
];

/** @type {import('eslint').Linter.Config} */
const everywhere = {
  plugins: { 'check-file': checkFile },
  rules: {
    'check-file/filename-naming-convention': [
      'error',
      { '**/*.{ts,tsx,js,mjs}': 'KEBAB_CASE' },
      { ignoreMiddleExtensions: true },
    ],
    'max-lines': ['warn', { max: 350 }],
    'max-params': ['error', { max: 4 }],
    'no-restricted-syntax': [
      'error',
      { selector: 'TSEnumDeclaration', message: 'Use an `as const` array with a derived union.' },
      { selector: 'ExportAllDeclaration', message: 'No barrel files: import from the file that defines it.' },
    ],
    eqeqeq: ['error', 'always', { null: 'ignore' }],
    '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    '@typescript-eslint/no-non-null-assertion': 'off',
    '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
  },
};

/**
 * The engine and the sweep give the same answer for the same input: no clock, no chance, no surroundings.
 *
 * @type {import('eslint').Linter.Config}
 */
const pure = {
  files: ['shared/engine/**', 'shared/sweep/**', 'shared/verification/**'],
  rules: {
    'no-restricted-globals': ['error', ...IMPURE_GLOBALS],
    'no-restricted-properties': ['error', { object: 'Math', property: 'random' }],
    // An object of parameters would be one more allocation for each of millions of sections.
    'max-params': ['error', { max: 6 }],
  },
};

export default defineConfig(
  { ignores: ['dist', 'dist.unfinished', 'node_modules', '.data', 'drizzle'] },
  js.configs.recommended,
  ts.configs.recommended,
  everywhere,
  pure,
  {
    files: ['shared/**'],
    rules: {
      'no-restricted-imports': ['error', { patterns: ['node:*', '#server/*', '#client/*'] }],
    },
  },
  {
    files: ['client/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat['recommended-latest']],
  },
  {
    // Loaded by the page as it stands, before the first paint.
    files: ['client/public/**/*.js'],
    languageOptions: { globals: globals.browser },
  },
  {
    // Plain JavaScript with JSDoc, run before any package is installed.
    files: ['**/*.{js,mjs}'],
    ignores: ['client/**'],
    languageOptions: { globals: globals.node },
  },
  prettier,
);
