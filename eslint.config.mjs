import { defineConfig, globalIgnores } from 'eslint/config';
import nextVitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import drizzle from 'eslint-plugin-drizzle';
import tseslint from 'typescript-eslint';

const typed = ['**/*.ts', '**/*.tsx', '**/*.mts'];
const pureLayers = ['units', 'sky', 'array', 'clock', 'schedule', 'outlook', 'exchange', 'access'].map(
  (layer) => `src/${layer}/**`,
);

// NODE_ENV and NEXT_RUNTIME are no settings: the framework writes them in as constants when it builds.
const environment = [
  'MemberExpression:not([property.name=/^(NODE_ENV|NEXT_RUNTIME)$/])',
  ':not(MemberExpression)',
].map((user) => ({
  selector: `${user} > MemberExpression[object.name='process'][property.name='env']`,
  message: 'src/env.ts is the only reader of the environment.',
}));
// the React compiler's own reading of every file is the dearest rule: only where there are components and hooks
const reactOff = Object.fromEntries(
  [...nextVitals, ...nextTypescript]
    .flatMap(({ rules = {} }) => Object.keys(rules))
    .filter((rule) => /^(react|react-hooks|jsx-a11y)\//.test(rule))
    .map((rule) => [rule, 'off']),
);
const drizzleRule = ['error', { drizzleObjectName: ['db', 'tx'] }];

export default defineConfig([
  globalIgnores([
    '.next/**',
    '.data/**',
    'next-env.d.ts',
    'test-results/**',
    'playwright-report/**',
    'pictures/**',
  ]),
  ...nextVitals,
  ...nextTypescript,
  {
    files: typed,
    plugins: { '@typescript-eslint': tseslint.plugin, drizzle },
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/only-throw-error': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'drizzle/enforce-delete-with-where': drizzleRule,
      'drizzle/enforce-update-with-where': drizzleRule,
    },
  },
  {
    files: [...typed, '**/*.mjs', '**/*.cjs'],
    ignores: ['db/seed-data/**', 'tests/reference/**'],
    rules: { 'max-lines': ['error', { max: 400 }] },
  },
  {
    files: ['src/**', 'app/**', 'db/**', 'proxy.ts', 'instrumentation.ts'],
    rules: { 'no-console': 'error', 'no-restricted-syntax': ['error', ...environment] },
  },
  { files: ['src/env.ts'], rules: { 'no-restricted-syntax': 'off' } },
  {
    files: pureLayers,
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'Now is an argument of the pure layers.' },
        { object: 'Math', property: 'random', message: 'Randomness is an argument of the pure layers.' },
        {
          object: 'crypto',
          property: 'getRandomValues',
          message: 'New ids are arguments of the pure layers.',
        },
        { object: 'performance', property: 'now', message: 'Now is an argument of the pure layers.' },
      ],
      'no-restricted-syntax': [
        'error',
        ...environment,
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: 'Now is an argument here.',
        },
        { selector: "CallExpression[callee.name='Date']", message: 'Now is an argument here.' },
      ],
      'no-restricted-globals': ['error', 'process', 'window', 'document', 'localStorage', 'fetch'],
    },
  },
  { files: ['{src,db,tests,e2e,scripts}/**/*.{ts,mts,mjs}'], rules: reactOff },
  { files: ['*.config.mjs'], rules: { 'import/no-anonymous-default-export': 'off' } },
  { files: ['**/*.cjs'], rules: { '@typescript-eslint/no-require-imports': 'off' } },
]);
