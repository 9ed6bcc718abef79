import type { Browser, Page } from '@playwright/test';
import { sql } from 'kysely';
import { createRule } from '@/lib/actions/create-rule';
import { refreshDue } from '@/lib/actions/refresh-due';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { asSystem, minutesAgo, openDock } from '../support/crew';
import { expect, test, type Running } from '../support/e2e';
import { expectAccessible, pageOf, typeHours } from '../support/pages';

const RULE = 'Carburettor rebuild';
/** The promise is two seconds from the moment the check-in is answered. */
const SOON = { timeout: 2_000 };

/** N-1 stands at 100.0 h; its rebuild is due at 101.0 h, may be 1.0 h late, and then holds it: from 102.0 h on. */
async function openFleet({ database }: Running) {
  const opened = await openDock(database.db, { now: minutesAgo(300) });
  const ctx = asSystem(database.db, minutesAgo(300));
  await createRule(
    ctx,
    createRuleInput.parse({
      name: RULE,
      kind: 'rebuild',
      appliesTo: {},
      triggers: [{ on: 'engine_hours', every: 101 }],
      window: { lateHours: 1 },
    }),
  );
  await refreshDue(ctx, { unitIds: [opened.unit.id] });
  return opened;
}

/** The manager's two open pages: what may be launched, and the calendar. */
async function openManager(browser: Browser, running: Running): Promise<{ list: Page; calendar: Page }> {
  const list = await pageOf(browser, running, 'manager', 1280);
  await list.goto('/availability');
  await expect(list.getByRole('heading', { name: 'Ready 1' })).toBeVisible();
  await expect(list.getByRole('heading', { name: 'Held 0' })).toBeVisible();
  const calendar = await list.context().newPage();
  await calendar.goto('/calendar');
  await expect(calendar.getByRole('region', { name: 'Without a day' })).toContainText(RULE);
  await expect(calendar.getByRole('region', { name: 'Calendar' }).getByText('Overdue')).toHaveCount(0);
  return { list, calendar };
}

/** A dock hand logs 102.3 h on the phone; answers when the server has answered. */
async function logHours(browser: Browser, running: Running, unitId: string): Promise<Page> {
  const hand = await pageOf(browser, running, 'dock');
  await hand.goto(`/board/check-in/${unitId}`);
  await typeHours(hand, '102.3');
  const answered = hand.waitForResponse((response) => response.url().endsWith('/api/v1/check-ins'));
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  expect((await answered).status()).toBe(201);
  return hand;
}

/** Both pages are given their two seconds from the same moment. */
async function expectHeldSoon(list: Page, calendar: Page): Promise<void> {
  const days = calendar.getByRole('region', { name: 'Calendar' });
  await Promise.all([
    expect(list.getByRole('heading', { name: 'Held 1' })).toBeVisible(SOON),
    expect(list.getByRole('heading', { name: 'Ready 0' })).toBeVisible(SOON),
    expect(days.getByText('Overdue').first()).toBeVisible(SOON),
  ]);
}

test('hours past the window take the unit off the list and put it on the calendar; a closed task brings it back', async ({
  browser,
  empty,
}) => {
  test.setTimeout(120_000);
  const { unit } = await openFleet(empty);
  const { list, calendar } = await openManager(browser, empty);
  await logHours(browser, empty, unit.id);
  await expectHeldSoon(list, calendar);
  await expect(list.getByText(/was due at 101\.0 h/)).toBeVisible();

  const mechanic = await pageOf(browser, empty, 'mechanic', 1024);
  await mechanic.goto('/tasks');
  await mechanic
    .getByRole('link', { name: new RegExp(RULE) })
    .first()
    .click();
  await mechanic.getByRole('button', { name: `Start ${RULE} on N-1` }).click();
  await mechanic.getByLabel('What was found and done').fill('Kit fitted, pop-off 25 psi three times.');
  await mechanic.getByRole('button', { name: 'Close task' }).click();
  await expect(mechanic.getByText(/is closed at 102\.3 h/)).toBeVisible();
  await expect(list.getByRole('heading', { name: 'Ready 1' })).toBeVisible(SOON);
  await expect(list.getByRole('heading', { name: 'Held 0' })).toBeVisible(SOON);
});

test('with the worker stopped the unit is held at once, and cannot be checked out', async ({
  browser,
  empty,
}) => {
  test.setTimeout(120_000);
  const { unit } = await openFleet(empty);
  const { list, calendar } = await openManager(browser, empty);
  const early = await pageOf(browser, empty, 'dock');
  await early.goto(`/board/check-out/${unit.id}`);
  await expect(early.getByRole('button', { name: 'Check out N-1' })).toBeVisible();
  await empty.app.worker.stop();
  await logHours(browser, empty, unit.id);
  await expectHeldSoon(list, calendar);

  await test.step('a check-out that was open on a phone before is refused with the reason', async () => {
    await early.getByRole('button', { name: 'Check out N-1' }).click();
    await expect(early.getByRole('alert').filter({ hasText: 'Not checked out' })).toContainText(
      /was due at 101\.0 h/,
    );
    await early.goto(`/board/check-out/${unit.id}`);
    await expect(early.getByText(/was due at 101\.0 h/)).toBeVisible();
    await expect(early.getByRole('button', { name: 'Check out N-1' })).toHaveCount(0);
    expect(
      await empty.database.db.selectFrom('outing').where('ended_at', 'is', null).select('id').execute(),
    ).toEqual([]);
  });

  await test.step('pages that stand open say how far the worker is behind, until it is not', async () => {
    await sql`update graphile_worker._private_jobs set run_at = run_at - interval '10 minutes'`.execute(
      empty.database.db,
    );
    await expect(list.getByText('Background work is 10 minutes behind.')).toBeVisible();
    await expect(calendar.getByText('Background work is 10 minutes behind.')).toBeVisible();
    await expectAccessible(list);
    empty.app.worker.start();
    await expect(list.getByText('Background work')).toHaveCount(0, { timeout: 30_000 });
    await expect(list.getByRole('heading', { name: 'Held 1' })).toBeVisible();
  });
});
