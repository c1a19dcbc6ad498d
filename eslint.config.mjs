// Lint for the whole repository. A rule is switched off for a place only here and with its reason, never in the code.
import angular from 'angular-eslint';
import ngrx from '@ngrx/eslint-plugin/v9';
import prettier from 'eslint-config-prettier';
import tseslint from 'typescript-eslint';

const CLIENT = 'projects/wakeledger/src';

/** What may be written nowhere. */
const EVERYWHERE = [
  {
    selector: 'ExportDefaultDeclaration',
    message: 'Export by name: a default export is renamed at every import and found by no search.',
  },
  { selector: 'TSEnumDeclaration', message: 'Use an `as const` list and a union type.' },
  {
    selector: 'ImportDeclaration[source.value="zod"] > ImportSpecifier',
    message: "Write `import * as z from 'zod'`: the named import brings every language along.",
  },
];

/** The core computes the same from the same: clock, identifiers and random numbers come in as arguments. */
const IN_THE_CORE = [
  ...EVERYWHERE,
  {
    selector: 'MemberExpression[object.name="Date"][property.name="now"]',
    message: 'The time comes in as an argument.',
  },
  { selector: 'NewExpression[callee.name="Date"]', message: 'The time comes in as an argument.' },
  {
    selector: 'MemberExpression[object.name="Math"][property.name="random"]',
    message: 'Random numbers come in as an argument.',
  },
];

export default tseslint.config(
  {
    ignores: [
      'dist/',
      'node_modules/',
      '.angular/',
      '.data/',
      'coverage/',
      'migrations/',
      'test-results/',
      '**/fixtures/**',
    ],
  },
  { linterOptions: { reportUnusedDisableDirectives: 'error', noInlineConfig: true } },
  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.strict],
    rules: {
      'no-restricted-syntax': ['error', ...EVERYWHERE],
      // `== null` asks for absent in either spelling, as JSON and databases give it.
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-invalid-void-type': ['error', { allowInGenericTypeArguments: true }],
      // A class with only a decorator or only static members is what frameworks ask for.
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      'max-lines': ['error', { max: 350, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['shared/core/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: { 'no-restricted-syntax': ['error', ...IN_THE_CORE], 'no-console': 'error' },
  },
  {
    files: [`${CLIENT}/**/*.ts`],
    extends: [
      ...angular.configs.tsRecommended,
      ...ngrx.configs.store,
      ...ngrx.configs.effects,
      ...ngrx.configs.operators,
    ],
    processor: angular.processInlineTemplates,
    rules: {
      // An effect is one expression; a block and a return around it say nothing more.
      '@ngrx/prefer-effect-callback-in-block-statement': 'off',
      'no-console': 'error',
      '@angular-eslint/component-selector': [
        'error',
        { type: 'element', prefix: ['wl', 'app'], style: 'kebab-case' },
      ],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'wl', style: 'camelCase' },
      ],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
      '@angular-eslint/component-class-suffix': 'off',
      '@angular-eslint/directive-class-suffix': 'off',
    },
  },
  {
    files: [`${CLIENT}/**/*.html`],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
    rules: { '@angular-eslint/template/button-has-type': 'error' },
  },
  {
    files: ['**/*.spec.ts', '**/*.test.ts', 'e2e/**/*.ts', '**/testing/**/*.ts'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off', 'max-lines': 'off' },
  },
  {
    // A component that a test draws around what it tests is scenery.
    files: [`${CLIENT}/**/*.spec.ts`],
    rules: { '@angular-eslint/prefer-on-push-component-change-detection': 'off' },
  },
  {
    // These tools read a default export.
    files: ['**/*.config.ts', 'server/testing/global-*.ts'],
    rules: { 'no-restricted-syntax': 'off' },
  },
  {
    files: [`${CLIENT}/app/**/*.ts`],
    ignores: [`${CLIENT}/app/data/**`, '**/*.spec.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          paths: [
            {
              name: '@ngrx/store',
              importNames: ['createFeature', 'createReducer'],
              message: 'Slices live in data/.',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/db/**', 'server/scripts/**', 'server/testing/**', '**/*.test.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        ...EVERYWHERE,
        {
          selector: 'CallExpression[callee.property.name="transaction"]',
          message: 'Open a transaction with inTenant: it sets the organisation.',
        },
      ],
    },
  },
  prettier,
);
