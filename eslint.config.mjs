import coreWebVitals from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const config = [
  {
    ignores: ['.next*/**', '.wakewright/**', 'node_modules/**', 'coverage/**', 'public/**', 'next-env.d.ts'],
  },
  { linterOptions: { noInlineConfig: true } },
  ...coreWebVitals,
  ...typescript,
];
export default config;
