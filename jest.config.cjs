/** Three projects: server-side specs, Angular specs, browser journeys. */
const alias = {
  '^@shared/(.*)$': '<rootDir>/shared/$1',
  '^@server/(.*)$': '<rootDir>/server/$1',
  '^@db/(.*)$': '<rootDir>/db/$1',
  '^@jobs/(.*)$': '<rootDir>/jobs/$1',
  '^@test/(.*)$': '<rootDir>/test/$1',
};
const esbuild = { '\\.m?[jt]s$': '<rootDir>/test/support/esbuild-transform.cjs' };
// These packages ship ES modules only, which jest's CommonJS runtime cannot load untouched.
const node = {
  testEnvironment: 'node',
  transform: esbuild,
  transformIgnorePatterns: ['/node_modules/(?!(ical\\.js|fast-check|pure-rand)/)'],
  moduleNameMapper: alias,
  setupFilesAfterEnv: ['<rootDir>/test/support/patience.cjs'],
};
module.exports = {
  projects: [
    {
      ...node,
      displayName: 'server',
      rootDir: __dirname,
      roots: [
        '<rootDir>/server',
        '<rootDir>/shared',
        '<rootDir>/jobs',
        '<rootDir>/db',
        '<rootDir>/test',
        '<rootDir>/deploy',
      ],
      testMatch: ['**/*.spec.ts'],
      testPathIgnorePatterns: ['/node_modules/', '<rootDir>/test/journeys/'],
      globalSetup: '<rootDir>/test/support/global-setup.cjs',
      globalTeardown: '<rootDir>/test/support/global-teardown.cjs',
    },
    {
      displayName: 'client',
      rootDir: __dirname,
      roots: ['<rootDir>/client/src'],
      preset: 'jest-preset-angular',
      testEnvironment: 'jest-preset-angular/environments/jest-jsdom-env',
      setupFilesAfterEnv: ['<rootDir>/client/jest-setup.ts'],
      transform: {
        '^.+\\.(ts|js|mjs|html|svg)$': [
          'jest-preset-angular',
          {
            tsconfig: '<rootDir>/client/tsconfig.spec.json',
            stringifyContentPathRegex: '\\.(html|svg)$',
          },
        ],
      },
      moduleNameMapper: { '^@shared/(.*)$': '<rootDir>/shared/$1' },
      testMatch: ['**/*.spec.ts'],
    },
    {
      ...node,
      displayName: 'journeys',
      rootDir: __dirname,
      roots: ['<rootDir>/test/journeys'],
      testMatch: ['**/*.spec.ts'],
      globalSetup: '<rootDir>/test/support/journey-setup.cjs',
      globalTeardown: '<rootDir>/test/support/journey-teardown.cjs',
    },
  ],
};
