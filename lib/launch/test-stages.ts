/** One stage of `npm test`: programs that run one after the other, each in a Node of its own. */
export interface Stage {
  name: string;
  /** Script below node_modules, and its arguments. */
  programs: [script: string, ...args: string[]][];
  /** The kind of JSON report its last program writes, for the totals. */
  report?: 'vitest' | 'playwright';
  /** Its tests need the production build. */
  needsBuild?: boolean;
}

/** Where a stage writes its report, from the root. */
export const reportFile = (name: string) => `.wakewright/test-reports/${name.replaceAll(' ', '-')}.json`;

const vitest = (name: string, ...args: string[]): Stage => ({
  name,
  programs: [
    [
      'vitest/vitest.mjs',
      'run',
      ...args,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${reportFile(name)}`,
    ],
  ],
  report: 'vitest',
});

const ARCHITECTURE = 'tests/unit/architecture.test.ts';

/** In this order; the first that fails ends the run. */
export const STAGES: readonly Stage[] = [
  {
    name: 'types',
    programs: [
      ['next/dist/bin/next', 'typegen'],
      ['typescript/bin/tsc', '--noEmit'],
    ],
  },
  { name: 'lint', programs: [['eslint/bin/eslint.js', '.', '--max-warnings=0']] },
  { name: 'formatting', programs: [['prettier/bin/prettier.cjs', '--check', '--log-level=warn', '.']] },
  { name: 'unused code', programs: [['knip/bin/knip.js']] },
  vitest('architecture', ARCHITECTURE),
  vitest('unit', '--project=unit', `--exclude=${ARCHITECTURE}`),
  vitest('standards', '--project=standards'),
  { ...vitest('integration', '--project=integration'), needsBuild: true },
  { ...vitest('faults', '--project=faults'), needsBuild: true },
  {
    name: 'end to end',
    programs: [['@playwright/test/cli.js', 'test', '--reporter=list,json']],
    report: 'playwright',
    needsBuild: true,
  },
];
