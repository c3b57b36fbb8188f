import { jestPreset } from '../scripts/jest-preset.mjs';

export default {
  testTimeout: 60_000,
  projects: [
    jestPreset({ displayName: 'unit', testMatch: ['<rootDir>/src/**/*.spec.ts'] }),
    jestPreset({ displayName: 'e2e', testMatch: ['<rootDir>/test/**/*.e2e-spec.ts'] }),
  ],
};
