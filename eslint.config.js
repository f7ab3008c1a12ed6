import js from '@eslint/js';
import jsxA11y from 'eslint-plugin-jsx-a11y';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** No clock, no chance, no surroundings in the rules of care. */
const impure = [
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'The core has no clock: take today as an argument.',
  },
  {
    selector: "MemberExpression[object.name='Date'][property.name='now']",
    message: 'The core has no clock: take today as an argument.',
  },
  { selector: "MemberExpression[object.name='Math'][property.name='random']", message: 'The core has no chance.' },
];

export default tseslint.config(
  { ignores: ['node_modules', 'dist', '.data', 'test-results', 'playwright-report', 'packages/sample-team/files'] },
  js.configs.recommended,
  ...tseslint.configs.strict,
  {
    languageOptions: { parserOptions: { ecmaFeatures: { jsx: true } } },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/consistent-type-imports': [
        'error',
        { fixStyle: 'separate-type-imports', disallowTypeAnnotations: false },
      ],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-invalid-void-type': 'off',
      'max-lines': ['error', { max: 300 }],
      'max-lines-per-function': ['error', { max: 120 }],
      complexity: ['error', 16],
      'max-params': ['error', 5],
      eqeqeq: 'error',
      'no-console': 'error',
      'prefer-const': 'error',
    },
  },
  {
    files: ['**/*.cjs', '**/*.mjs'],
    languageOptions: {
      globals: {
        module: 'writable',
        process: 'readonly',
        Buffer: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
      },
    },
  },
  {
    files: ['packages/*/src/**/*.ts'],
    ignores: ['**/*.test.ts'],
    rules: { 'no-restricted-syntax': ['error', ...impure] },
  },
  {
    files: ['apps/board/**/*.tsx'],
    plugins: { 'react-hooks': reactHooks, 'jsx-a11y': jsxA11y },
    rules: { ...reactHooks.configs.recommended.rules, ...jsxA11y.flatConfigs.recommended.rules },
  },
  {
    // Tables of data, migrations and tests may be long; scripts speak to the console of the person who runs them.
    files: [
      'packages/pathway/src/default-protocol/**',
      'packages/sample-team/**',
      'migrations/**',
      '**/*.test.ts',
      '**/*.test.tsx',
      'tests/**',
      'e2e/**',
      'apps/api/bench/**',
      'apps/api/scripts/**',
    ],
    rules: { 'max-lines': 'off', 'max-lines-per-function': 'off', complexity: 'off' },
  },
);
