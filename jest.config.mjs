const swc = (parser, sourceMaps = 'inline') => [
  '@swc/jest',
  {
    swcrc: false,
    jsc: {
      target: 'es2022',
      parser,
      keepClassNames: true,
      transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
    },
    module: { type: 'commonjs' },
    sourceMaps,
  },
];

const base = {
  testEnvironment: 'node',
  testEnvironmentOptions: { customExportConditions: ['@wetside/source', 'node', 'node-addons'] },
  moduleNameMapper: { '^(\\.{1,2}/.*)\\.js$': '$1' },
  // These ship ESM only and Jest on Node 20 cannot require(esm): compiled to CommonJS like our own code.
  transformIgnorePatterns: ['/node_modules/(?!(@nestjs|uuid)/)'],
  transform: {
    '^.+\\.ts$': swc({ syntax: 'typescript', decorators: true }),
    '^.+/node_modules/(@nestjs|uuid)/.+\\.js$': swc({ syntax: 'ecmascript' }, false),
  },
  testPathIgnorePatterns: ['/node_modules/', '/dist/', '/apps/web/', '/apps/e2e/'],
  modulePathIgnorePatterns: ['/dist/', '/.local/'],
};

/** `pure` touches nothing; `pg` has a real PostgreSQL (the DATABASE_* addresses of a cluster, see DEVELOPERS.md). */
export default {
  projects: [
    // The packages compile in isolation under ts-jest, as they are published; the rest through SWC for Nest's decorators.
    {
      ...base,
      displayName: 'pure',
      roots: ['<rootDir>/packages', '<rootDir>/apps', '<rootDir>/db', '<rootDir>/scripts'],
      testMatch: ['**/*.spec.ts'],
      testPathIgnorePatterns: [...base.testPathIgnorePatterns, '\\.pg\\.spec\\.ts$'],
      transform: {
        ...base.transform,
        '^.+/packages/.+\\.ts$': ['ts-jest', { tsconfig: '<rootDir>/tsconfig.jest.json' }],
      },
    },
    {
      ...base,
      displayName: 'pg',
      roots: ['<rootDir>/apps', '<rootDir>/db'],
      testMatch: ['**/*.pg.spec.ts'],
    },
  ],
  testTimeout: 30_000,
};
