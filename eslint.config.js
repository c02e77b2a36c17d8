import js from '@eslint/js';
import angular from 'angular-eslint';
import { defineConfig, globalIgnores } from 'eslint/config';
import ts from 'typescript-eslint';
import { importDirections } from './apps/launcher/import-directions.mjs';

const readonlyGlobals = (...names) => Object.fromEntries(names.map((name) => [name, 'readonly']));

export default defineConfig(
  globalIgnores(['dist', 'db/migrations', '.angular', '.data', 'out-tsc', 'test-results', 'playwright-report']),
  js.configs.recommended,
  {
    files: ['**/*.{ts,js,mjs}'],
    plugins: { lanewright: { rules: { 'import-directions': importDirections } } },
    rules: { 'lanewright/import-directions': 'error' },
  },
  {
    files: ['**/*.ts'],
    extends: [ts.configs.recommendedTypeChecked],
    languageOptions: {
      parserOptions: {
        project: ['tsconfig.json', 'apps/client/tsconfig.app.json', 'apps/client/tsconfig.spec.json'],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    },
  },
  {
    // Answers of HTTP test clients are untyped; what they hold is what these tests are about.
    files: ['test/**/*.ts', '**/*.spec.ts'],
    rules: {
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  {
    files: ['apps/client/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'lw', style: 'kebab-case' }],
      '@angular-eslint/directive-selector': ['error', { type: 'attribute', prefix: 'lw', style: 'camelCase' }],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
    },
  },
  {
    files: ['apps/client/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
  },
  {
    files: ['**/*.{js,mjs}'],
    languageOptions: {
      globals: readonlyGlobals(
        ...['AbortSignal', 'Buffer', 'URL', 'clearInterval', 'clearTimeout', 'console', 'fetch', 'process'],
        ...['performance', 'setInterval', 'setTimeout'],
      ),
    },
  },
);
