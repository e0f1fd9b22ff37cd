/** Lint: Expo's rules, TypeScript without ways around it, and no comment that switches a rule off. */
const { defineConfig } = require('eslint/config');
const expo = require('eslint-config-expo/flat');

module.exports = defineConfig([
  { ignores: ['dist/**', 'dist-server/**', '.expo/**', '.pickglass/**', 'drizzle/**', 'public/**', 'coverage/**'] },
  expo,
  {
    linterOptions: { noInlineConfig: true },
    rules: {
      'no-empty': ['error', { allowEmptyCatch: false }],
      'no-console': ['error', { allow: ['error', 'warn'] }],
      eqeqeq: 'error',
    },
  },
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/ban-ts-comment': ['error', { 'ts-expect-error': true, 'ts-ignore': true, 'ts-nocheck': true }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    // Names that do not exist are TypeScript's to find, in these files too (checkJs).
    files: ['**/*.mjs'],
    rules: { 'no-undef': 'off' },
  },
  {
    // What people read on a terminal is written there.
    files: [
      'server/start.mjs',
      'server/dev.mjs',
      'server/set-up/**',
      'tests/run.mjs',
      'tests/bench/**',
      'tests/hostile/**',
      'tests/e2e/**',
    ],
    rules: { 'no-console': 'off' },
  },
]);
