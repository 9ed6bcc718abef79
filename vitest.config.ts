import path from 'node:path';
import { defineConfig } from 'vitest/config';

const shared = {
  resolve: { alias: { '@': path.resolve(import.meta.dirname) } },
  oxc: { jsx: { runtime: 'automatic' as const } },
};

const project = (name: string, extra: object = {}) => ({
  ...shared,
  test: {
    name,
    include: [`tests/${name}/**/*.test.{ts,tsx}`],
    environment: 'node',
    restoreMocks: true,
    ...extra,
  },
});

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      project('unit'),
      project('standards', { testTimeout: 60_000 }),
      project('integration', {
        globalSetup: 'tests/support/integration-setup.ts',
        testTimeout: 30_000,
        hookTimeout: 240_000,
      }),
      project('faults', {
        globalSetup: 'tests/support/integration-setup.ts',
        testTimeout: 120_000,
        hookTimeout: 240_000,
      }),
    ],
  },
});
