import js from '@eslint/js';
import { defineConfig, globalIgnores } from 'eslint/config';
import hooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** Packages that stand behind `api/platform`, so that a change of service touches one folder. */
const PLATFORM_ONLY = ['pg', 'pg-*', '@aws-sdk/*', 'nodemailer', 'graphile-worker', 'stripe', 'pino'];

const sizes = (max) => ({ 'max-lines': ['error', { max, skipBlankLines: true, skipComments: true }] });

export default defineConfig(
  globalIgnores(['dist', '.data', '.test', 'node_modules']),
  js.configs.recommended,
  {
    files: ['**/*.mjs', '**/*.js'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        Buffer: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
        fetch: 'readonly',
        AbortSignal: 'readonly',
        performance: 'readonly',
      },
    },
  },
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.strictTypeChecked, tseslint.configs.stylisticTypeChecked],
    languageOptions: {
      parserOptions: { project: ['./tsconfig.json', './api/crochet/tsconfig.json', './web/tsconfig.json'] },
    },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-non-null-assertion': 'off',
      eqeqeq: 'error',
      ...sizes(250),
    },
  },
  { files: ['web/**/*.{ts,tsx}'], ...hooks.configs.flat.recommended },
  {
    files: ['api/features/**/*.ts', 'api/http/**/*.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ group: PLATFORM_ONLY, message: 'Go through api/platform.', allowTypeImports: true }] },
      ],
      'no-restricted-syntax': [
        'error',
        {
          selector: 'ThrowStatement > NewExpression[callee.name="Error"]',
          message: 'Throw an AppError of a named kind (api/http/problem.ts).',
        },
      ],
    },
  },
  {
    files: ['**/*.ts', '**/*.tsx'],
    ignores: ['api/env.ts', 'tests/**', 'vite.config.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'api/env.ts is the only reader of the environment.' },
      ],
    },
  },
  {
    files: ['tests/**/*.{ts,tsx}', 'migrations/**/*.ts', 'seeds/**/*.ts'],
    rules: {
      ...sizes(500),
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
    },
  },
);
