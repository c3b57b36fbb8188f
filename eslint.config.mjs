import reactHooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import tseslint from 'typescript-eslint';

export default tseslint.config(
  { ignores: ['**/dist/**', '**/.openapi/**', '**/node_modules/**', '**/.data/**', '**/coverage/**', '**/.cache/**', '**/screenshots/**', '**/*.gen.ts'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.recommended,
  {
    rules: {
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrorsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-debugger': 'error',
      'prefer-const': 'error',
    },
  },
  {
    // Nest's own signatures for handlers, classes and metadata are typed with Function.
    files: ['conference-api/**/*.ts'],
    rules: { '@typescript-eslint/no-unsafe-function-type': 'off' },
  },
  {
    files: ['conference-web/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat.recommended],
  },
  {
    files: ['**/*.mjs'],
    languageOptions: { globals: { ...globals.node } },
    rules: { 'no-undef': 'error' },
  },
  {
    files: ['**/*.spec.mjs'],
    languageOptions: { globals: { ...globals.jest } },
  },
);
