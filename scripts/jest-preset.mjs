// Nest 12 ships ES modules only and jest's own ESM mode fails on Node 20,
// so everything, packages too, is compiled to CommonJS.
const typescript = {
  module: { type: 'commonjs' },
  jsc: {
    target: 'es2022',
    parser: { syntax: 'typescript', decorators: true, tsx: false },
    transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
    keepClassNames: true,
  },
};
const javascript = {
  module: { type: 'commonjs' },
  jsc: { target: 'es2022', parser: { syntax: 'ecmascript', jsx: false } },
};

/** The jest settings that all workspaces share; `overrides` wins. */
export function jestPreset(overrides = {}) {
  return {
    testEnvironment: 'node',
    transform: {
      '^.+\\.ts$': ['@swc/jest', typescript],
      '^.+\\.tsx$': [
        '@swc/jest',
        {
          ...typescript,
          jsc: {
            ...typescript.jsc,
            parser: { syntax: 'typescript', decorators: true, tsx: true },
            transform: { ...typescript.jsc.transform, react: { runtime: 'automatic' } },
          },
        },
      ],
      '^.+\\.m?js$': ['@swc/jest', javascript],
    },
    transformIgnorePatterns: [],
    extensionsToTreatAsEsm: [],
    moduleFileExtensions: ['ts', 'tsx', 'mjs', 'js', 'json', 'node'],
    moduleNameMapper: { '^(\\.{1,2}/.*)\\.js$': '$1' },
    testPathIgnorePatterns: ['/node_modules/', '/dist/'],
    ...overrides,
  };
}
