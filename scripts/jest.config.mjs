import { jestPreset } from './jest-preset.mjs';

export default jestPreset({ testMatch: ['<rootDir>/**/*.spec.mjs'] });
