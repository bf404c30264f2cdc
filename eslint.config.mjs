import nextVitals from 'eslint-config-next/core-web-vitals';
import query from '@tanstack/eslint-plugin-query';
import checkFile from 'eslint-plugin-check-file';
import jsdoc from 'eslint-plugin-jsdoc';
import tseslint from 'typescript-eslint';

const size = {
  'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
  'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
  complexity: ['error', 10],
  'max-depth': ['error', 3],
  'max-params': ['error', 4],
};

const purity = [
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'Pass the time in.',
  },
  {
    selector: "MemberExpression[object.name='Date'][property.name='now']",
    message: 'Pass the time in.',
  },
  {
    selector: "MemberExpression[object.name='Math'][property.name='random']",
    message: 'Pass a generator in.',
  },
  { selector: 'AwaitExpression', message: 'lib/domain is synchronous.' },
];

export default tseslint.config(
  {
    ignores: [
      '.next*/**',
      '.data/**',
      'node_modules/**',
      'next-env.d.ts',
      'migrations/**',
      'coverage/**',
    ],
  },
  ...nextVitals,
  ...tseslint.configs.strictTypeChecked.map((c) => ({
    ...c,
    files: ['**/*.ts', '**/*.tsx', '**/*.mts'],
  })),
  {
    files: ['**/*.ts', '**/*.tsx', '**/*.mts'],
    languageOptions: {
      parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname },
    },
    plugins: { 'check-file': checkFile },
    rules: {
      ...size,
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/no-confusing-void-expression': 'off',
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { attributes: false } },
      ],
      'check-file/filename-naming-convention': [
        'error',
        { '**/*.{ts,tsx,mts}': 'KEBAB_CASE' },
        { ignoreMiddleExtensions: true },
      ],
    },
  },
  ...query.configs['flat/recommended'],
  {
    files: ['lib/domain/**/*.ts'],
    plugins: { jsdoc },
    rules: {
      'no-restricted-syntax': ['error', ...purity],
      'no-restricted-globals': ['error', 'fetch', 'process', 'console', 'window', 'document'],
      'jsdoc/require-jsdoc': [
        'error',
        { publicOnly: true, require: { FunctionDeclaration: true } },
      ],
      '@typescript-eslint/no-non-null-assertion': 'error',
    },
  },
  {
    files: ['entities/**/*.ts'],
    rules: { 'max-lines-per-function': 'off' },
  },
  {
    files: ['tests/**/*.ts', 'tests/**/*.tsx'],
    rules: {
      'max-lines-per-function': 'off',
      'max-params': 'off',
      complexity: 'off',
      '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
    },
  },
  {
    files: ['**/*.mjs', '**/*.js', '**/*.cjs'],
    rules: { ...size, 'max-lines-per-function': 'off' },
  },
);
