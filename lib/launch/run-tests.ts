import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { startThrowawayServer } from '@/tests/support/throwaway-server';
import { createCleanup } from './cleanup';
import { ensureBuild } from './ensure-build';
import { startChild } from './processes';
import { root, step } from './requirements.mjs';
import { addTotals, countReport, type Totals, totalsLine } from './test-totals';
import { reportFile, type Stage, STAGES } from './test-stages';

type Cleanup = ReturnType<typeof createCleanup>;

const reportOf = (stage: Stage) => path.join(root, reportFile(stage.name));

/** Runs the programs of a stage with their output shown; answers whether all of them were content. */
async function runPrograms(stage: Stage, env: NodeJS.ProcessEnv, cleanup: Cleanup): Promise<boolean> {
  for (const [script, ...args] of stage.programs) {
    const child = startChild({
      name: stage.name,
      command: process.execPath,
      args: [path.join(root, 'node_modules', script), ...args],
      cwd: root,
      env,
      onLine: console.log,
    });
    cleanup.add(stage.name, () => child.stop());
    const { code } = await child.exited;
    if (code !== 0) return false;
  }
  return true;
}

function stageEnv(stage: Stage, serverUrl: string): NodeJS.ProcessEnv {
  return {
    ...process.env,
    TEST_SERVER_URL: serverUrl,
    NEXT_TELEMETRY_DISABLED: '1',
    PLAYWRIGHT_JSON_OUTPUT_FILE: reportOf(stage),
    // An ordinary run of the launcher may have settled these for another database.
    DATABASE_URL: undefined,
    SMTP_URL: undefined,
    S3_URL: undefined,
  };
}

/** What a stage adds to the totals; a stage without a report counts when it fails. */
function totalsOf(stage: Stage, succeeded: boolean): Totals {
  const file = reportOf(stage);
  if (!stage.report) return { passed: 0, failed: succeeded ? 0 : 1 };
  if (!existsSync(file)) return { passed: 0, failed: 1 };
  const totals = countReport(stage.report, readFileSync(file, 'utf8'));
  return succeeded || totals.failed > 0 ? totals : { ...totals, failed: 1 };
}

async function runStages(cleanup: Cleanup): Promise<Totals> {
  const server = await step('Starting PostgreSQL for the tests', () => startThrowawayServer());
  cleanup.add('PostgreSQL', () => server.stop());
  let totals: Totals = { passed: 0, failed: 0 };
  for (const stage of STAGES) {
    if (stage.needsBuild) await ensureBuild(root, (build) => cleanup.add('build', () => build.stop()));
    rmSync(reportOf(stage), { force: true });
    mkdirSync(path.dirname(reportOf(stage)), { recursive: true });
    const env = stageEnv(stage, server.url('postgres'));
    const succeeded = await step(`Checking: ${stage.name}`, () => runPrograms(stage, env, cleanup));
    totals = addTotals(totals, totalsOf(stage, succeeded));
    if (totals.failed > 0) {
      console.log(`\nFailed at: ${stage.name}`);
      return totals;
    }
  }
  return totals;
}

/** Runs every stage and exits: with 0 when nothing failed. The last line of output holds the totals. */
export async function runTests(): Promise<void> {
  const cleanup = createCleanup();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
    process.once(signal, () => void cleanup.run().then(() => process.exit(130)));
  }
  let totals: Totals = { passed: 0, failed: 1 };
  try {
    totals = await runStages(cleanup);
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
  }
  await cleanup.run();
  console.log(`\n${totalsLine(totals)}`);
  process.exit(totals.failed > 0 ? 1 : 0);
}
