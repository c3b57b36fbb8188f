import { jestPreset } from '../scripts/jest-preset.mjs';

export default jestPreset({ testMatch: ['<rootDir>/{src,test}/**/*.spec.ts'] });
