import { jestPreset } from '../scripts/jest-preset.mjs';

export default jestPreset({
  displayName: 'web',
  testEnvironment: '<rootDir>/src/testing/browser-environment.mjs',
  testMatch: ['<rootDir>/src/**/*.spec.{ts,tsx}'],
  setupFilesAfterEnv: ['<rootDir>/src/testing/setup.ts'],
  moduleNameMapper: {
    '\\.css$': '<rootDir>/src/testing/empty-styles.ts',
    '^@kerfside/calc/(.+?)(\\.js)?$': '<rootDir>/../conference-api/src/calc/$1',
    '^@/(.+)$': '<rootDir>/src/$1',
    '^(\\.{1,2}/.*)\\.js$': '$1',
  },
});
