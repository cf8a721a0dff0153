import js from '@eslint/js';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** Web imports run lib → ui → features → app, and features never import each other. */
const webLayers = [
  { files: ['services/web/src/lib/**'], forbid: ['**/ui/**', '**/features/**', '**/app/**'] },
  { files: ['services/web/src/ui/**'], forbid: ['**/features/**', '**/app/**'] },
  { files: ['services/web/src/features/**'], forbid: ['**/app/**', '../../features/**'] },
];

export default tseslint.config(
  { ignores: ['**/dist/**', '**/node_modules/**', '.cairnstep/**', 'test-results/**'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    languageOptions: { globals: { process: 'readonly', console: 'readonly', URL: 'readonly', setTimeout: 'readonly', clearTimeout: 'readonly', fetch: 'readonly', Buffer: 'readonly', AbortController: 'readonly' } },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'separate-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrorsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
    },
  },
  { files: ['infra/**', '**/*.bench.ts', 'packages/*/reference/**'], rules: { 'no-console': 'off' } },
  { files: ['services/web/**/*.{ts,tsx}'], ...reactHooks.configs.flat['recommended-latest'] },
  ...webLayers.map(({ files, forbid }) => ({
    files,
    rules: { 'no-restricted-imports': ['error', { patterns: [{ group: forbid, message: 'Imports run lib → ui → features → app; features do not import each other.' }] }] },
  })),
  {
    // Pure packages: no HTTP, no SQL, no clock of their own.
    files: ['packages/*/src/**/*.ts'],
    ignores: ['**/*.test.ts', '**/*.bench.ts'],
    rules: {
      'no-restricted-imports': ['error', { patterns: ['express', 'pg', 'typeorm', 'node:http', 'node:fs*', 'node:net'] }],
      'no-restricted-syntax': ['error', { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'Pass the time in.' }],
    },
  },
);
