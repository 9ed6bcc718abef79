import { chromium, type Page } from '@playwright/test';
import { sendSignIn, typeHours } from './pages';

/**
 * `npx tsx tests/support/pictures.ts http://127.0.0.1:3000`: takes the pictures of the README anew from a demo that
 * runs there. Run by hand when a screen has changed.
 */
const [base] = process.argv.slice(2);
if (!base)
  throw new Error('say where the demo runs: npx tsx tests/support/pictures.ts http://127.0.0.1:3000');
const PHONE = { width: 360, height: 740 };
const DESK = { width: 1200, height: 900 };

type Listed = { ready: { unitId: string }[]; held: { unitId: string }[] };

const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
await picture('board', 'dock', PHONE, (page) => page.goto('/board'));
await picture('check-in', 'dock', PHONE, async (page) => {
  const { ready } = await ask<Listed>(page, '/api/v1/availability');
  const [, unit] = ready;
  await page.goto(`/board/check-in/${unit!.unitId}`);
  const { engineHours } = await ask<{ engineHours: number }>(page, `/api/v1/units/${unit!.unitId}`);
  await typeHours(page, (engineHours + 1.4).toFixed(1));
});
await picture('availability', 'manager', DESK, (page) => page.goto('/availability'));
await picture('calendar', 'manager', DESK, async (page) => {
  await page.goto('/calendar');
  await page.locator('.cal-line').first().waitFor();
});
await picture('tasks', 'mechanic', DESK, (page) => page.goto('/tasks'));
await picture('unit', 'manager', DESK, async (page) => {
  const { ready } = await ask<Listed>(page, '/api/v1/availability');
  await page.goto(`/units/${ready[0]!.unitId}`);
});
await picture('rule', 'manager', DESK, async (page) => {
  await page.goto('/rules');
  await page.getByRole('link', { name: 'Carburettor rebuild' }).click();
  await page.getByRole('heading', { name: 'Next due' }).waitFor();
});
await picture('digest', 'manager', DESK, (page) => page.goto('/digest'));
await browser.close();

async function picture(
  name: string,
  role: 'manager' | 'mechanic' | 'dock',
  viewport: { width: number; height: number },
  open: (page: Page) => Promise<unknown>,
): Promise<void> {
  const context = await browser.newContext({ baseURL: base, viewport });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await sendSignIn(page, `${role}@wakewright.example`, 'three-docks-afloat');
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  await open(page);
  await page.waitForLoadState('networkidle');
  await page.screenshot({ path: `.pictures/${name}.png` });
  await context.close();
}

async function ask<T>(page: Page, path: string): Promise<T> {
  return (await (await page.request.get(path)).json()) as T;
}
