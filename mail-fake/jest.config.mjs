import { jestPreset } from '../scripts/jest-preset.mjs';

// A browser and compiled programs are started here, which takes a while on a busy machine.
export default jestPreset({ testMatch: ['<rootDir>/{src,test}/**/*.spec.ts'], testTimeout: 30_000 });
