/** @type {import('jest').Config} */
export default {
  testEnvironment: 'node',
  roots: ['<rootDir>'],
  modulePathIgnorePatterns: ['<rootDir>/dist'],
  testMatch: ['**/*.spec.ts'],
  transform: {
    '^.+\\.[tj]s$': [
      '@swc/jest',
      {
        jsc: {
          target: 'es2022',
          parser: { syntax: 'typescript', decorators: true },
          transform: { legacyDecorator: true, decoratorMetadata: false, useDefineForClassFields: false },
        },
        module: { type: 'commonjs' },
      },
    ],
  },
  // Modules that Node loads and Jest's CommonJS does not: they are turned into it.
  transformIgnorePatterns: [
    '/node_modules/(?!(?:file-type|strtok3|token-types|uint8array-extras|@tokenizer/[^/]+|@borewit/text-codec)/)',
  ],
  moduleNameMapper: {
    '^@bookmatch/api/(.*)$': '<rootDir>/../packages/api/src/$1',
    '^@bookmatch/common/(.*)$': '<rootDir>/../packages/common/src/$1',
    '^(\\.{1,2}/.*)\\.js$': '$1',
  },
  testTimeout: 30000,
};
