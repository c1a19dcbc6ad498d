import presets from 'jest-preset-angular/presets/index.js';

const { createCjsPreset } = presets;

/** swc compiles everything outside the client: fast, and it understands import.meta in CommonJS mode. */
const swc = {
  '^.+\\.(t|m?j)s$': [
    '@swc/jest',
    {
      jsc: { parser: { syntax: 'typescript', decorators: true }, target: 'es2022' },
      module: { type: 'commonjs' },
      sourceMaps: 'inline',
    },
  ],
};

// Two cores are shared by all workers, and a machine may be busy with more: waiting is no failure of the code.
const testTimeout = 30_000;

const shared = {
  displayName: 'shared',
  rootDir: '.',
  testMatch: ['<rootDir>/shared/**/*.spec.ts', '<rootDir>/seeds/**/*.spec.ts'],
  testEnvironment: 'node',
  transform: swc,
};

const server = {
  displayName: 'server',
  rootDir: '.',
  testMatch: ['<rootDir>/server/**/*.{spec,test}.ts'],
  testEnvironment: 'node',
  globalSetup: '<rootDir>/server/testing/global-setup.ts',
  globalTeardown: '<rootDir>/server/testing/global-teardown.ts',
  transform: swc,
};

const client = {
  ...createCjsPreset({ tsconfig: '<rootDir>/projects/wakeledger/tsconfig.spec.json' }),
  displayName: 'client',
  rootDir: '.',
  testMatch: ['<rootDir>/projects/wakeledger/src/**/*.spec.ts'],
  setupFilesAfterEnv: ['<rootDir>/projects/wakeledger/src/testing/setup-jest.ts'],
  transformIgnorePatterns: [
    'node_modules/(?!(.*\\.mjs$|@angular/common/locales/.*\\.js$|(echarts|zrender)/))',
  ],
};

// Read here only: a project's own timeout is passed over.
export default { testTimeout, projects: [shared, server, client] };
