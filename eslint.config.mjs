import eslint from '@eslint/js';
import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import tseslint from 'typescript-eslint';

const FOCUSED = ['describe.only', 'it.only', 'test.only'].map((call) => ({
  selector: `CallExpression[callee.object.name='${call.split('.')[0]}'][callee.property.name='only']`,
  message: 'A focused test silently skips all others.',
}));

/** import * as z keeps 365 kB out of the browser bundle. */
const ZOD = {
  selector:
    "ImportDeclaration[source.value='zod'] :matches(ImportSpecifier, ImportDefaultSpecifier)",
  message: "Write import * as z from 'zod'.",
};

/** The database has one door: everything else goes through Database.transaction or Database.read. */
const DOOR = [
  {
    selector:
      "CallExpression[callee.property.name='transaction'][callee.object.name=/[dD]ataSource$/]",
    message: 'Use Database.transaction: the driver shares one connection (see DEVELOPERS.md).',
  },
];

export default tseslint.config(
  { ignores: ['dist/**', 'data/**', '.angular/**', 'coverage/**', 'test-results/**'] },
  {
    files: ['**/*.ts'],
    extends: [
      eslint.configs.recommended,
      ...tseslint.configs.strictTypeChecked,
      ...tseslint.configs.stylisticTypeChecked,
    ],
    languageOptions: {
      parserOptions: {
        project: [
          './tsconfig.app.json',
          './tsconfig.spec.json',
          './tsconfig.shared.json',
          './tsconfig.server.json',
          './tsconfig.node-spec.json',
        ],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
      complexity: ['error', 15],
      'no-console': 'error',
      'no-restricted-syntax': ['error', ...FOCUSED, ZOD],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/consistent-type-definitions': ['error', 'interface'],
      '@typescript-eslint/no-redeclare': 'off',
      '@typescript-eslint/unbound-method': ['error', { ignoreStatic: true }],
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-globals': [
        'error',
        { name: 'Date', message: 'Time comes in as an argument.' },
        { name: 'console', message: 'shared/ is pure.' },
        { name: 'fetch', message: 'shared/ is pure.' },
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Seeds come in as an argument.' },
      ],
    },
  },
  {
    files: ['shared/stage/**', 'shared/statistics/**', 'shared/checks/**'],
    rules: { 'max-lines-per-function': 'off' },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/persistence/database.ts'],
    rules: { 'no-restricted-syntax': ['error', ...FOCUSED, ZOD, ...DOOR] },
  },
  {
    files: ['src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'app', style: 'camelCase' },
      ],
      '@angular-eslint/component-selector': [
        'error',
        { type: 'element', prefix: 'app', style: 'kebab-case' },
      ],
    },
  },
  {
    files: ['src/**/*.html'],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: 'TextAttribute[name="style"]',
          message: 'The content security policy drops style attributes: use a class or [style.x].',
        },
      ],
    },
  },
  {
    files: ['spec/**/*.ts', 'e2e/**/*.ts', 'src/**/*.spec.ts'],
    rules: {
      'max-lines': 'off',
      'max-lines-per-function': 'off',
      complexity: 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  prettier,
);
