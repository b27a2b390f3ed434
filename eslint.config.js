import importX from 'eslint-plugin-import-x';
import jsxA11y from 'eslint-plugin-jsx-a11y';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** Import arrows of DEVELOPERS.md; tests/architecture.test.ts checks them again. */
const arrows = [
  { target: './shared', from: ['./src', './server', './tests', './migrations'] },
  { target: './shared/kernel', from: ['./shared/law', './shared/rules', './shared/engine', './shared/artwork', './shared/contracts', './shared/policies', './shared/dictionary', './shared/product', './data'] },
  { target: './shared/law', from: ['./shared/rules', './shared/engine', './shared/artwork', './shared/contracts', './shared/product'] },
  { target: './src', from: ['./server', './data', './tests', './migrations'] },
  { target: './server', from: ['./src', './tests'] },
  { target: './src/ui', from: ['./src/features', './src/routes', './src/app'] },
  { target: './src/lib', from: ['./src/features', './src/routes', './src/app', './src/ui'] },
  { target: './src/features', from: ['./src/routes'] },
];

export default tseslint.config(
  { ignores: ['node_modules', 'build', '.local', 'data', 'migrations/.snapshot*'] },
  ...tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx,js,mjs}'],
    plugins: { 'import-x': importX },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'import-x/no-default-export': 'error',
      'import-x/no-restricted-paths': ['error', { zones: arrows }],
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['shared/**/*.ts'],
    ignores: ['shared/artwork/**'],
    rules: {
      'no-restricted-globals': ['error', 'Date', 'parseFloat', 'Math', 'Number'],
    },
  },
  {
    files: ['src/**/*.tsx'],
    plugins: { 'react-hooks': reactHooks, ...jsxA11y.flatConfigs.recommended.plugins },
    rules: { ...reactHooks.configs.recommended.rules, ...jsxA11y.flatConfigs.recommended.rules },
  },
  { files: ['tests/**'], rules: { 'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }] } },
  { files: ['vite.config.ts', 'tailwind.config.ts', 'eslint.config.js', 'migrations/**'], rules: { 'import-x/no-default-export': 'off' } },
);
