import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);
const { createCjsPreset } = require('jest-preset-angular/presets');

/** @type {import('jest').Config} */
export default {
  ...createCjsPreset({ tsconfig: '<rootDir>/tsconfig.spec.json' }),
  roots: ['<rootDir>/src'],
  setupFilesAfterEnv: ['<rootDir>/jest.setup.ts'],
  testMatch: ['**/*.spec.ts'],
  // A screen is drawn whole with Material: slow where two workers share two busy cores.
  testTimeout: 30_000,
  moduleNameMapper: {
    '^@bookmatch/common/(.*)$': '<rootDir>/../common/src/$1',
    '^(\\.{1,2}/.*)\\.js$': '$1',
  },
};
