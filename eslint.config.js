import js from '@eslint/js';
import angular from 'angular-eslint';
import { defineConfig, globalIgnores } from 'eslint/config';
import typescript from 'typescript-eslint';
import { importDirections } from './eslint.import-directions.js';

const nodeGlobals = Object.fromEntries(
  [
    'AbortController',
    'AbortSignal',
    'Buffer',
    'clearTimeout',
    'console',
    'fetch',
    'process',
    'setTimeout',
    'URL',
  ].map((name) => [name, 'readonly']),
);
const typed = (...project) => ({ parserOptions: { project, tsconfigRootDir: import.meta.dirname } });

export default defineConfig(
  globalIgnores(['dist/', 'data/', 'coverage/', '.angular/', 'node_modules/', 'src/assets/']),
  {
    files: ['**/*.{js,mjs}'],
    extends: [js.configs.recommended],
    languageOptions: { globals: nodeGlobals },
  },
  {
    files: ['**/*.{ts,mts}'],
    extends: [js.configs.recommended, ...typescript.configs.recommended],
    rules: {
      // The compiler knows names better.
      'no-undef': 'off',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/no-empty-object-type': ['error', { allowInterfaces: 'with-single-extends' }],
      // Text is checked for control characters in many places.
      'no-control-regex': 'off',
      eqeqeq: 'error',
    },
  },
  {
    files: ['{server,shared,seeds,migrations,test,search-fixtures}/**/*.ts'],
    ignores: ['**/*.d.ts'],
    languageOptions: typed('tsconfig.test.json'),
    rules: {
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: false }],
      '@typescript-eslint/await-thenable': 'error',
    },
  },
  {
    files: ['src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    languageOptions: typed('tsconfig.spec.json'),
    rules: {
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'sl', style: 'kebab-case' }],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'sl', style: 'camelCase' },
      ],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@typescript-eslint/no-floating-promises': ['error', { ignoreVoid: true }],
    },
  },
  {
    files: ['src/**/*.html'],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
  },
  {
    files: ['**/*.{ts,mts,js,mjs}'],
    plugins: { shimlore: { rules: { 'import-directions': importDirections } } },
    rules: { 'shimlore/import-directions': 'error' },
  },
);
