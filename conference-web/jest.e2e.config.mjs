import { jestPreset } from '../scripts/jest-preset.mjs';

// Browser tests: they start or are given the whole application, so each may take long.
export default jestPreset({
  displayName: 'browser',
  testEnvironment: 'node',
  testMatch: ['<rootDir>/e2e/**/*.browser-spec.ts'],
  testTimeout: 120_000,
  maxWorkers: 1,
});
