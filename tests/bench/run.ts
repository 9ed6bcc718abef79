import { cpus } from 'node:os';
import { measureCheckIn } from './check-in';
import { measureDuePoint } from './due-point';
import { toTable, type Figure } from './figures';
import { measureForecast } from './forecast';
import { measureReads } from './reads';
import { measureRecompute } from './recompute';
import { measureRecurrence } from './recurrence';
import { openSetting, peakMemory, type Setting } from './setting';

const MEMORY_MB = 400;
const MEASUREMENTS: Record<string, (setting: Setting) => Promise<Figure[]>> = {
  recurrence: measureRecurrence,
  forecast: measureForecast,
  recompute: measureRecompute,
  reads: measureReads,
  'check-in': measureCheckIn,
  'due-point': measureDuePoint,
};

const began = performance.now();
const say = (what: string) => console.log(`• ${Math.round((performance.now() - began) / 1000)} s  ${what} …`);

function memory({ app }: Setting, what: string, pid: number | undefined): Figure {
  if (!pid) throw new Error(`the ${what} does not run:\n${app.output()}`);
  const mb = peakMemory(pid);
  return {
    what: `memory of the ${what}, at its most`,
    measured: `${Math.round(mb)} MB`,
    target: `< ${MEMORY_MB} MB`,
    reached: mb < MEMORY_MB,
  };
}

/** `npm run bench [-- NAME…]`: all measurements, or those named. */
async function bench(names: string[]): Promise<void> {
  const setting = await openSetting(say);
  const figures: Figure[] = [];
  try {
    for (const [name, measure] of Object.entries(MEASUREMENTS)) {
      if (names.length > 0 && !names.includes(name)) continue;
      say(`Measuring: ${name}`);
      const measured = await measure(setting);
      figures.push(...measured);
      console.log(measured.map((f) => `  ${f.what}: ${f.measured}, ${f.target}`).join('\n'));
    }
    const { webPid, worker } = setting.app;
    figures.push(memory(setting, 'web server', webPid), memory(setting, 'worker', worker.pid()));
  } finally {
    await setting.stop();
  }
  console.log(`\n${cpus().length} cores, Node ${process.versions.node}\n\n${toTable(figures)}`);
}

await bench(process.argv.slice(2));
