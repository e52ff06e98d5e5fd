const alias = { '^@/(.*)$': '<rootDir>/$1' };
const swc = [
  '@swc/jest',
  { jsc: { parser: { syntax: 'typescript', tsx: true }, target: 'es2022' }, module: { type: 'commonjs' } },
];
const node = {
  testEnvironment: 'node',
  transform: { '^.+\\.[cm]?[tj]sx?$': swc },
  transformIgnorePatterns: ['/node_modules/(?!(bcryptjs|piscina|@noble|canonicalize)/)'],
  moduleNameMapper: alias,
};

module.exports = {
  projects: [
    {
      ...node,
      displayName: 'unit',
      testMatch: ['<rootDir>/tests/{shared,architecture,components/editor,components/canvas}/**/*.test.ts'],
    },
    {
      ...node,
      displayName: 'server',
      testMatch: ['<rootDir>/tests/server/**/*.test.ts'],
      globalSetup: '<rootDir>/tests/support/start-database.ts',
      globalTeardown: '<rootDir>/tests/support/stop-database.ts',
    },
    {
      displayName: 'web',
      preset: 'jest-expo/web',
      setupFiles: ['<rootDir>/tests/support/setup-web.js'],
      testMatch: ['<rootDir>/tests/components/**/*.test.tsx'],
      moduleNameMapper: alias,
    },
    {
      ...node,
      displayName: 'journeys',
      testMatch: ['<rootDir>/tests/journeys/**/*.test.ts'],
      globalSetup: '<rootDir>/tests/support/start-database.ts',
      globalTeardown: '<rootDir>/tests/support/stop-database.ts',
    },
  ],
};
