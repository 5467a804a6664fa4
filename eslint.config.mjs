import js from '@eslint/js';
import boundaries from 'eslint-plugin-boundaries';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

const CLOCKS = ['apps/api/src/platform/clock/**', 'apps/web/src/shared/clock/**'];

/** The present is read from a clock that can be moved, never from the machine. `new Date(x)` only reads x. */
const noLooseClock = [
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'Take the time from the clock.',
  },
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: 'Take the time from the clock.',
  },
  { selector: "CallExpression[callee.name='Date']", message: 'Take the time from the clock.' },
];
/** Business time is a parameter: SQL's own now() would ignore the clock. */
const noSqlNow = [
  {
    selector:
      'TemplateElement[value.raw=/\\b(now\\(\\)|current_timestamp|current_date|clock_timestamp\\(\\))/i]',
    message: 'Pass the time from the clock as a parameter.',
  },
];
/** SQL is parameterised; drizzle's sql`` template does that, raw strings do not. */
const noRawSql = [
  { selector: "CallExpression[callee.property.name='unsafe']", message: 'Use a parameterised query.' },
];

/** Arrows point one way: packages ← db ← api → HTTP → web. Inside an app: shared or platform ← features ← app. */
const elements = [
  { type: 'package', pattern: 'packages/*', capture: ['name'] },
  { type: 'db', pattern: 'db' },
  { type: 'api-platform', pattern: 'apps/api/src/platform' },
  { type: 'api-config', pattern: 'apps/api/src/config' },
  { type: 'api-feature', pattern: 'apps/api/src/features/*', capture: ['name'] },
  { type: 'api-root', pattern: 'apps/api/src' },
  { type: 'web-shared', pattern: 'apps/web/src/shared' },
  { type: 'web-theme', pattern: 'apps/web/src/theme' },
  { type: 'web-feature', pattern: 'apps/web/src/features/*', capture: ['name'] },
  { type: 'web-app', pattern: 'apps/web/src' },
  { type: 'mail-catcher', pattern: 'apps/mail-catcher' },
  { type: 'e2e', pattern: 'apps/e2e' },
];
const arrow = (from, to) => ({
  from: { element: { type: from } },
  allow: to.map((type) => ({ to: { element: { type } } })),
});
const arrows = [
  arrow('package', ['package']),
  arrow('db', ['db', 'package']),
  arrow('api-config', ['api-config']),
  arrow('api-platform', ['api-platform', 'api-config', 'db', 'package', 'mail-catcher']),
  arrow('api-feature', ['api-feature', 'api-platform', 'api-config', 'db', 'package', 'mail-catcher']),
  arrow('api-root', [
    'api-root',
    'api-feature',
    'api-platform',
    'api-config',
    'db',
    'package',
    'mail-catcher',
  ]),
  arrow('web-theme', ['web-theme']),
  arrow('web-shared', ['web-shared', 'web-theme', 'package']),
  arrow('web-feature', ['web-feature', 'web-shared', 'web-theme', 'package']),
  arrow('web-app', ['web-app', 'web-feature', 'web-shared', 'web-theme', 'package']),
  arrow('mail-catcher', ['mail-catcher']),
  arrow('e2e', ['e2e', 'db', 'package', 'mail-catcher']),
];

export default tseslint.config(
  {
    ignores: [
      '**/dist/',
      '**/dist-types/',
      '.local/',
      'db/migrations/',
      'packages/api-client/src/schema.ts',
      '**/test-results/',
      '**/playwright-report/',
    ],
  },
  js.configs.recommended,
  {
    files: ['**/*.ts', '**/*.tsx'],
    extends: [...tseslint.configs.recommendedTypeChecked],
    languageOptions: {
      parserOptions: { project: './tsconfig.lint.json', tsconfigRootDir: import.meta.dirname },
    },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      'no-restricted-syntax': ['error', ...noLooseClock, ...noSqlNow, ...noRawSql],
      'max-lines': ['error', { max: 300, skipBlankLines: false, skipComments: false }],
    },
  },
  {
    // Nest reads the types of constructors and DTO fields at run time: these imports must stay imports of values.
    files: ['apps/api/**/*.ts'],
    rules: { '@typescript-eslint/consistent-type-imports': 'off' },
  },
  {
    files: ['apps/**/*.ts', 'apps/**/*.tsx', 'packages/**/*.ts', 'db/**/*.ts'],
    plugins: { boundaries },
    settings: {
      'boundaries/elements': elements,
      'import/resolver': { typescript: { project: './tsconfig.lint.json' } },
    },
    rules: { 'boundaries/dependencies': ['error', { default: 'disallow', policies: arrows }] },
  },
  {
    // The one place where the platform names features: the union of problem codes is closed there.
    // Specs may reach for the whole program and its test set-up.
    files: [
      'apps/api/src/platform/errors/problem-table.ts',
      'apps/api/**/*.spec.ts',
      'apps/api/**/*.fixture.ts',
    ],
    rules: { 'boundaries/dependencies': 'off' },
  },
  {
    // The bodies of supertest's answers are any by its types, and specs ask the database things that no code may.
    files: ['apps/api/**/*.spec.ts'],
    rules: {
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      'no-restricted-syntax': ['error', ...noLooseClock, ...noSqlNow],
    },
  },
  { files: CLOCKS, rules: { 'no-restricted-syntax': ['error', ...noSqlNow, ...noRawSql] } },
  {
    // Migrations and clones run whole files of SQL that stand in the repository.
    files: ['db/migrate/**/*.ts', 'db/testing/**/*.ts'],
    rules: { 'no-restricted-syntax': ['error', ...noLooseClock, ...noSqlNow] },
  },
  { files: ['apps/web/**/*.{ts,tsx}'], ...reactHooks.configs.flat['recommended-latest'] },
  {
    files: ['**/*.mjs', '**/*.cjs', '**/*.js'],
    languageOptions: {
      globals: {
        performance: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        fetch: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        AbortSignal: 'readonly',
      },
    },
  },
);
