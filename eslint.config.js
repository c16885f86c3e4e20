import js from '@eslint/js'
import globals from 'globals'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

/** What a pure function cannot depend on: the clock, chance, the outside world, either platform. */
const impure = [
  ...['Date', 'performance', 'crypto', 'setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask'],
  ...['process', 'Buffer', 'require', '__dirname', 'global', 'globalThis'],
  ...['window', 'self', 'document', 'navigator', 'location', 'localStorage', 'sessionStorage', 'indexedDB'],
  ...['fetch', 'XMLHttpRequest', 'WebSocket', 'EventSource', 'Worker', 'console'],
]

export default tseslint.config(
  { ignores: ['dist', 'drizzle', '.underfoot', 'public', 'coverage'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    ...reactHooks.configs.flat.recommended,
    languageOptions: { globals: globals.browser },
  },
  {
    files: ['shared/{units,recordings,mechanics,statistics}/**/*.ts'],
    ignores: ['**/*.test.ts'],
    rules: {
      'no-restricted-globals': ['error', ...impure],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random' }],
    },
  },
  {
    files: ['server/**/*.ts', 'src/**/*.{ts,tsx}', 'shared/**/*.ts'],
    ignores: ['server/config/**'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: "MemberExpression[object.name='process'][property.name='env']",
          message: 'Only server/config reads the environment.',
        },
      ],
    },
  },
  {
    // What an operator types, the set-up scripts and the benchmarks speak to a terminal.
    files: ['server/setup/**', 'server/commands/**', 'tests/bench/**', 'tests/setup/**'],
    languageOptions: { globals: globals.node },
    rules: { 'no-console': 'off' },
  },
)
