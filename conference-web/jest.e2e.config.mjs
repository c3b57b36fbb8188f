import { jestPreset } from '../scripts/jest-preset.mjs';

// Browser tests: they start or are given the whole application, so each may take long.
export default jestPreset({
  displayName: 'browser',
  testEnvironment: 'node',
  testMatch: ['<rootDir>/e2e/**/*.browser-spec.ts'],
  // what they need of packages is CommonJS already
  transformIgnorePatterns: ['/node_modules/'],
  testTimeout: 240_000,
  maxWorkers: 1,
});
