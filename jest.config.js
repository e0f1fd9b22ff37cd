/**
 * Five projects: recon, server, components, architecture, browser. `npm test` runs them all; `npx jest tests/server/sessions.test.ts`
 * runs one file, `npx jest --selectProjects recon` one project.
 *
 * Tests of the server project find in `process.env.TEST_DATABASE_URL` the superuser's address of a throw-away PostgreSQL cluster: make a
 * database of your own in it, and drop it afterwards. `npm test` starts that cluster; a run by hand that finds the variable unset
 * starts one in the system's temporary folder, and the last such run to end stops it.
 *
 * The browser project tests the production build at PICKGLASS_URL, whose demo accounts are in PICKGLASS_DATA; without them it starts
 * the product by itself. Run it with --runInBand: the machine's cores are the browser's.
 */
const compiled = {
  '\\.[cm]?[jt]sx?$': [
    'babel-jest',
    {
      configFile: false,
      babelrc: false,
      presets: [['babel-preset-expo', { reactCompiler: false }]],
      caller: { name: 'metro', platform: 'web', bundler: 'metro', isServer: true, engine: 'node' },
    },
  ],
};

/** Packages that are only published as ES modules, which Jest's require cannot load as they are. */
const modulesOnly = ['jose', 'fast-png', 'iobuffer', 'pure-rand'];

const onNode = {
  testEnvironment: 'node',
  transform: compiled,
  transformIgnorePatterns: [`/node_modules/(?!(${modulesOnly.join('|')})/)`],
  moduleNameMapper: { '^@/(.*)$': '<rootDir>/$1' },
};

/** @type {import('jest').Config} */
module.exports = {
  // Generous, because two busy cores are slow and a limit proves nothing; what must be fast has its own check.
  testTimeout: 60_000,
  projects: [
    { ...onNode, displayName: 'recon', testMatch: ['<rootDir>/tests/{recon,laws}/**/*.test.ts'] },
    {
      ...onNode,
      displayName: 'server',
      testMatch: ['<rootDir>/tests/{server,db,workers}/**/*.test.ts'],
      globalSetup: '<rootDir>/tests/database/start.mjs',
      globalTeardown: '<rootDir>/tests/database/stop.mjs',
    },
    {
      preset: 'jest-expo/web',
      displayName: 'components',
      testMatch: ['<rootDir>/tests/components/**/*.test.{ts,tsx}'],
      setupFilesAfterEnv: ['<rootDir>/tests/components/patience.ts'],
      moduleNameMapper: { '^@/(.*)$': '<rootDir>/$1' },
    },
    { ...onNode, displayName: 'architecture', testMatch: ['<rootDir>/tests/architecture.test.ts'] },
    {
      ...onNode,
      displayName: 'browser',
      testMatch: ['<rootDir>/tests/e2e/**/*.test.ts'],
      setupFilesAfterEnv: ['<rootDir>/tests/e2e/patience.ts'],
      globalSetup: '<rootDir>/tests/e2e/start-product.mjs',
      globalTeardown: '<rootDir>/tests/e2e/stop-product.mjs',
    },
  ],
};
