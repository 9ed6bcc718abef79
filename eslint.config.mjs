import coreWebVitals from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const config = [
  {
    ignores: ['.next*/**', '.wakewright/**', 'node_modules/**', 'coverage/**', 'public/**', 'next-env.d.ts'],
  },
  { linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' } },
  ...coreWebVitals,
  ...typescript,
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { ignoreRestSiblings: true, argsIgnorePattern: '^_' }],
    },
  },
  {
    // Playwright's fixtures are handed a function called `use`, which the rule takes for React's.
    files: ['tests/e2e/**', 'tests/support/**'],
    rules: { 'react-hooks/rules-of-hooks': 'off' },
  },
  {
    // Served to those who may see the unit: an optimiser in between would keep copies of its own.
    files: ['components/files/**'],
    rules: { '@next/next/no-img-element': 'off' },
  },
];

export default config;
