import { readdirSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, test } from '../support/e2e';
import { openPage, pageOf } from '../support/pages';

const DESK = { width: 1280, height: 800 };
const PHONE = { width: 360, height: 740 };
/** WCAG 2.2 A and AA, and of AAA the contrast of 7:1 that the product promises. */
const AXE = {
  runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'],
  rules: { 'color-contrast-enhanced': { enabled: true }, 'target-size': { enabled: true } },
};
/** Opened by their own walk: the form of an empty database, and the way from `/` to one's own first screen. */
const WALKED_ELSEWHERE = ['/setup', '/'];
const FOR_ANYBODY = ['/sign-in', '/forgot', '/reset/nonsense', '/invitation/nonsense'];

type Rows = Awaited<ReturnType<typeof listRows>>;
const manager = (rows: Rows) => [
  ...['/board', '/availability', '/units', '/calendar', '/calendar?view=list', '/tasks', '/account'],
  ...['/review', '/digest', '/docks', '/models', '/people', '/rules', '/procedures', '/procedures/new'],
  ...['/parts', '/parts?show=low', '/parts/new', `/parts/${rows.part}`, `/parts/${rows.part}/edit`],
  ...['/units/new', '/docks/new', '/models/new', '/rules/new', '/tasks/new'],
  ...[
    `/units/${rows.ready}`,
    `/units/${rows.held}`,
    `/units/${rows.ready}/edit`,
    `/units/${rows.ready}/baselines`,
  ],
  ...[`/board/check-out/${rows.ready}`, `/board/check-out/${rows.held}`, `/board/check-in/${rows.ready}`],
  ...[
    `/tasks/${rows.task}`,
    `/rules/${rows.rule}`,
    `/docks/${rows.dock}`,
    `/models/${rows.model}`,
    `/procedures/${rows.procedure}`,
    `/procedures/${rows.procedure}/edit`,
  ],
];
const mechanic = (rows: Rows) => [
  '/tasks',
  `/tasks/${rows.task}`,
  `/units/${rows.held}`,
  '/calendar',
  '/rules',
];
const dock = (rows: Rows) => [
  '/board',
  `/board/check-in/${rows.ready}`,
  '/availability',
  `/units/${rows.ready}`,
];

/** Addresses of rows of the demo, by what they show. */
async function listRows({ request }: Page) {
  const get = async <T>(path: string) => (await (await request.get(`/api/v1${path}`)).json()) as T;
  const first = async (noun: string) => (await get<{ items: { id: string }[] }>(`/${noun}`)).items[0]!.id;
  type Unit = { unitId: string };
  const { ready, held } = await get<{ ready: Unit[]; held: Unit[] }>('/availability');
  return {
    ready: ready[0]!.unitId,
    held: held[0]!.unitId,
    task: await first('tasks'),
    rule: await first('rules'),
    dock: await first('docks'),
    model: await first('models'),
    procedure: await first('procedures'),
    part: await first('parts'),
  };
}

// A trace draws every step of a walk this long once more.
test.use({ trace: 'off' });

type Look = { size: typeof DESK; colorScheme: 'light' | 'dark' };

/** What is wrong with these screens: sideways scrolling at either size, and what axe finds at each look. */
async function listFaults(page: Page, paths: readonly string[], looks: readonly Look[]): Promise<string[]> {
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(`${page.url()} threw: ${error.message}`));
  for (const path of paths) {
    const answer = await page.goto(path);
    if (answer?.status() !== 200) faults.push(`${path} answered ${answer?.status()}`);
    await expect(page, path).toHaveTitle(/\S · Wakewright$/);
    await expect(page.getByRole('heading', { level: 1 }), path).toHaveCount(1);
    if (path.startsWith('/calendar')) await page.locator('.cal-line').first().waitFor();
    for (const size of [DESK, PHONE]) {
      await page.setViewportSize(size);
      const wide = await page.evaluate(() => document.documentElement.scrollWidth);
      if (wide > size.width) faults.push(`${path} at ${size.width}: ${wide} px wide`);
    }
    for (const { size, colorScheme } of looks) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      const { violations } = await new AxeBuilder({ page }).options(AXE).setLegacyMode().analyze();
      for (const { id, nodes } of violations)
        faults.push(
          `${path} at ${size.width}, ${colorScheme}: ${id}: ${nodes.map(({ html }) => html).join(' ')}`,
        );
    }
  }
  return faults;
}

/** The addresses that the folder of pages answers, as patterns: '/units/[id]' is /^\/units\/[^/]+$/. */
function listRoutes(): { route: string; pattern: RegExp }[] {
  const pages = readdirSync('app', { recursive: true, encoding: 'utf8' }).filter((file) =>
    /(^|\/)page\.tsx$/.test(file),
  );
  return pages.map((file) => {
    const route = `/${file
      .split('/')
      .slice(0, -1)
      .filter((part) => !part.startsWith('('))
      .join('/')}`;
    return { route, pattern: new RegExp(`^${route.replaceAll(/\[[^\]]+\]/g, '[^/]+')}$`) };
  });
}

test('every page there is is looked at', () => {
  const id = 'x';
  const looked = [
    ...FOR_ANYBODY,
    ...manager({ ready: id, held: id, task: id, rule: id, dock: id, model: id, procedure: id, part: id }),
  ];
  const routes = listRoutes();
  // '/units/new' is a page of its own, not one of '/units/[id]'.
  const routeOf = (path: string) =>
    (routes.find(({ route }) => route === path) ?? routes.find(({ pattern }) => pattern.test(path)))?.route;
  const visited = new Set(looked.map((path) => routeOf(path.split('?')[0]!)));
  const missed = routes.map(({ route }) => route).filter((route) => !visited.has(route));
  expect(missed.filter((route) => !WALKED_ELSEWHERE.includes(route))).toEqual([]);
});

for (const [role, paths, looks] of [
  [
    'manager',
    manager,
    [
      { size: DESK, colorScheme: 'light' },
      { size: PHONE, colorScheme: 'dark' },
    ],
  ],
  ['mechanic', mechanic, [{ size: PHONE, colorScheme: 'light' }]],
  ['dock', dock, [{ size: PHONE, colorScheme: 'light' }]],
] as const) {
  test(`every screen of a ${role} can be read and touched, on a desk and on a phone`, async ({
    browser,
    shared,
  }) => {
    test.setTimeout(300_000);
    const page = await pageOf(browser, shared, role, DESK.width);
    expect(await listFaults(page, paths(await listRows(page)), looks)).toEqual([]);
  });
}

test('who has not signed in can read and touch every page there is for them', async ({ browser, shared }) => {
  test.setTimeout(120_000);
  const page = await openPage(browser, shared, DESK.width);
  const looks: Look[] = [
    { size: DESK, colorScheme: 'dark' },
    { size: PHONE, colorScheme: 'light' },
  ];
  expect(await listFaults(page, FOR_ANYBODY, looks)).toEqual([]);
});

test('a page that a role may not open is not found, and shows nothing of it', async ({ browser, shared }) => {
  const mine = await pageOf(browser, shared, 'manager');
  const rows = await listRows(mine);
  const page = await pageOf(browser, shared, 'dock');
  for (const path of [
    '/people',
    '/digest',
    '/review',
    '/rules/new',
    '/docks/new',
    `/units/${rows.ready}/edit`,
  ]) {
    const answer = await page.goto(path);
    expect(answer?.status(), path).toBe(404);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Nothing is moored here');
  }
});
