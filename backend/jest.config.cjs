/** swc turns the ESM sources into CommonJS, which is what jest runs without flags. */
module.exports = {
  rootDir: __dirname,
  testEnvironment: 'node',
  roots: ['<rootDir>/src', '<rootDir>/test'],
  // the machine may be busy: a wait of this length means that something hangs, not that it is slow
  testTimeout: 120_000,
  testRegex: '\\.spec\\.ts$',
  transform: {
    '^.+\\.(t|j|mj)s$': [
      '@swc/jest',
      {
        sourceMaps: 'inline',
        jsc: {
          target: 'es2022',
          parser: { syntax: 'typescript', decorators: true },
          transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
        },
        module: { type: 'commonjs' },
      },
    ],
  },
  moduleNameMapper: {
    '^@mantlet/common$': '<rootDir>/../common/src/index.ts',
    '^(\\.{1,2}/.*)\\.js$': '$1',
  },
  // these packages ship ESM only
  transformIgnorePatterns: [
    '/node_modules/(?!(@nestjs|file-type|@tokenizer|@borewit|strtok3|token-types|uint8array-extras|csv-parse)/)',
  ],
};
