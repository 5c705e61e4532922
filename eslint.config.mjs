/**
 * The laws of the house that a linter can hold, beside the usual ones. Import directions and cycles are in
 * .dependency-cruiser.mjs, style sheets in infra/run/check-styles.mjs.
 */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import js from '@eslint/js';
import ngrx from '@ngrx/eslint-plugin/v9';
import angular from 'angular-eslint';
import { defineConfig, globalIgnores } from 'eslint/config';
import globals from 'globals';
import tseslint from 'typescript-eslint';

const here = import.meta.dirname;
/** What never ships: tests, harnesses and the builders both use. */
const specs = [
  '**/*.spec.ts',
  '**/*.harness.ts',
  '**/*-harness.ts',
  '**/testing/**',
  'packages/api/test/**',
  'packages/web/e2e/**',
];
const projects = [
  'packages/common/tsconfig.spec.json',
  'packages/api/tsconfig.spec.json',
  'packages/web/tsconfig.app.json',
  'packages/web/tsconfig.spec.json',
  'packages/web/e2e/tsconfig.json',
  'infra/tsconfig.spec.json',
].filter((project) => existsSync(join(here, project)));

/** What a feature may take from typeorm: the means to describe a row. Reading and writing go through platform. */
const entityDecorators = [
  'Check',
  'Column',
  'CreateDateColumn',
  'Entity',
  'ForeignKey',
  'Generated',
  'Index',
  'PrimaryColumn',
  'Unique',
  'UpdateDateColumn',
  'VersionColumn',
];

const law = (selector, message) => ({ selector, message });

const bareErrors = law(
  "ThrowStatement > NewExpression[callee.name='Error']",
  'Throw a problem with a code (law 7): a bare Error answers 500 to what is expected.',
);
const zodTree = [
  law(
    "ImportDeclaration[source.value='zod'] > ImportSpecifier[imported.name='z']",
    "Write import * as z from 'zod': the other form puts all of zod into the browser's chunk.",
  ),
  law(
    "ImportDeclaration[source.value='zod'] > ImportDefaultSpecifier",
    "Write import * as z from 'zod': the other form puts all of zod into the browser's chunk.",
  ),
];
const rawDatabase = [
  law(
    "CallExpression[callee.property.name='getRepository']",
    'A raw repository forgets the shop (law 3): use the one bound to the request.',
  ),
  law(
    'CallExpression[callee.property.name=/^(query|createQueryBuilder|createQueryRunner)$/][callee.object.name=/(manager|source|runner|connection)$/i]',
    'A raw manager forgets the shop (law 3): use what platform/database gives.',
  ),
  law(
    'CallExpression[callee.property.name=/^(query|createQueryBuilder|createQueryRunner)$/][callee.object.property.name=/(manager|source|runner|connection)$/i]',
    'A raw manager forgets the shop (law 3): use what platform/database gives.',
  ),
];
const impure = [
  law(
    "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    'Rules have no clock: take the instant as an argument.',
  ),
  law(
    "NewExpression[callee.name='Date'][arguments.length=0]",
    'Rules have no clock: take the instant as an argument.',
  ),
  law(
    "CallExpression[callee.object.name='DateTime'][callee.property.name='now']",
    'Rules have no clock: take the instant as an argument.',
  ),
  law(
    "CallExpression[callee.object.name='DateTime'][callee.property.name=/^(utc|local)$/][arguments.length=0]",
    'Rules have no clock: take the instant as an argument.',
  ),
  law(
    "MemberExpression[object.name='Math'][property.name='random']",
    'Rules have no chance: take the number as an argument.',
  ),
  law(
    "MemberExpression[object.name='crypto'][property.name=/^(randomUUID|getRandomValues)$/]",
    'Rules have no chance: take the value as an argument.',
  ),
];

export default defineConfig(
  globalIgnores(['**/dist/', '**/node_modules/', '**/coverage/', '.bookmatch/', '.nx/', '**/.angular/']),
  { linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  {
    files: ['**/*.mjs', '**/*.js'],
    languageOptions: { globals: globals.node },
  },
  {
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      // Prettier decides where lines break, and it does not break a statement in two.
      'no-unexpected-multiline': 'off',
      'no-var': 'error',
      'prefer-const': 'error',
      'no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
    },
  },
  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { project: projects, tsconfigRootDir: here } },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      // These three mistake what libraries declare on purpose: ids that are a text or an object, methods without `this`,
      // casts that choose between overloads.
      '@typescript-eslint/no-base-to-string': 'off',
      '@typescript-eslint/no-unnecessary-type-assertion': 'off',
      '@typescript-eslint/unbound-method': 'off',
      // A function may promise only because its caller waits for others of its kind.
      '@typescript-eslint/require-await': 'off',
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
    },
  },
  {
    files: ['packages/common/src/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: { 'no-console': 'error', 'no-restricted-syntax': ['error', ...zodTree, ...impure] },
  },
  {
    // Programs run by hand print; what runs in the server logs.
    files: ['packages/api/src/*/**/*.ts'],
    ignores: specs,
    rules: { 'no-console': 'error' },
  },
  {
    files: ['packages/api/src/features/**/*.ts'],
    ignores: specs,
    rules: {
      'no-restricted-syntax': ['error', bareErrors, ...rawDatabase],
      '@typescript-eslint/no-restricted-imports': [
        'error',
        {
          paths: [
            {
              name: 'typeorm',
              allowImportNames: entityDecorators,
              message:
                'Features describe rows only; reading and writing go through platform/database (law 3).',
            },
            { name: 'mysql2', message: 'Features reach the database through platform/database (law 3).' },
            {
              name: 'mysql2/promise',
              message: 'Features reach the database through platform/database (law 3).',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['packages/web/src/**/*.ts'],
    extends: [
      angular.configs.tsRecommended,
      ngrx.configs.store,
      ngrx.configs.effectsTypeChecked,
      ngrx.configs.operators,
    ],
    processor: angular.processInlineTemplates,
    rules: {
      'no-console': 'error',
      'no-restricted-syntax': ['error', ...zodTree],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/use-lifecycle-interface': 'error',
      '@ngrx/on-function-explicit-return-type': 'off',
      '@ngrx/prefer-effect-callback-in-block-statement': 'off',
    },
  },
  {
    files: ['packages/web/src/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
  },
  {
    files: specs,
    rules: {
      // Matchers and answers of the wire are of any type: what a test asserts about them is the check.
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
);
