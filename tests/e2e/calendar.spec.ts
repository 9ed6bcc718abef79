import type { Locator, Page } from '@playwright/test';
import { createRule } from '@/lib/actions/create-rule';
import { refreshDue } from '@/lib/actions/refresh-due';
import { changeTask } from '@/lib/actions/change-task';
import { openTask } from '@/lib/actions/open-task';
import { addDays, localDay } from '@/lib/domain/calendar-day';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { openTask as openTaskInput } from '@/lib/schemas/task';
import { asSystem, minutesAgo, openDock } from '../support/crew';
import { expect, test, type Running } from '../support/e2e';
import { expectAccessible, pageOf, tabTo } from '../support/pages';

const today = localDay(new Date(), 'Europe/Lisbon');
/** The month view shows six weeks, so this day is there whatever today is. */
const later = addDays(today, 2);
const tomorrow = addDays(today, 1);

const cell = (page: Page, day: string): Locator => page.locator(`td[data-date="${day}"]`);
const task = (within: Page | Locator): Locator => within.getByText('Rub rail loose', { exact: true });

const eventOf = (within: Locator): Locator => task(within).locator('xpath=ancestor::a');

/** Presses the mouse on one place, moves it over and lets go, as a hand does. */
async function drag(page: Page, from: Locator, to: Locator): Promise<void> {
  await from.scrollIntoViewIfNeeded();
  await to.scrollIntoViewIfNeeded();
  const start = await from.boundingBox();
  const end = await to.boundingBox();
  if (!start || !end) throw new Error('not on the screen');
  await page.mouse.move(start.x + start.width / 2, start.y + start.height / 2);
  await page.mouse.down();
  await page.mouse.move(end.x + end.width / 2, end.y + end.height / 2, { steps: 12 });
  await page.mouse.up();
}

test.beforeEach(({}, testInfo) => testInfo.setTimeout(120_000));

test('a task is planned on another day by dragging, by keyboard alone, and put back by undo', async ({
  browser,
  empty,
}) => {
  const { unit } = await openDock(empty.database.db, { now: minutesAgo(300) });
  const ctx = asSystem(empty.database.db, new Date());
  const opened = await openTask(
    ctx,
    openTaskInput.parse({ unitId: unit.id, kind: 'repair', title: 'Rub rail loose', plannedOn: today }),
  );
  const plannedOn = async () =>
    (
      await empty.database.db
        .selectFrom('task')
        .select('planned_on')
        .where('id', '=', opened.id)
        .executeTakeFirstOrThrow()
    ).planned_on;
  const mechanic = await pageOf(browser, empty, 'mechanic', 1280);
  await mechanic.goto('/calendar');
  await expect(task(cell(mechanic, today))).toBeVisible();
  await expectAccessible(mechanic);

  await test.step('dragged to a later day', async () => {
    await drag(mechanic, task(cell(mechanic, today)), cell(mechanic, later));
    await expect(mechanic.getByText(/is planned for/)).toBeVisible();
    await expect(task(cell(mechanic, later))).toBeVisible();
    expect(await plannedOn()).toBe(later);
  });

  await test.step('undo puts it back', async () => {
    await mechanic.getByRole('button', { name: 'Undo' }).click();
    await expect(task(cell(mechanic, today))).toBeVisible();
    expect(await plannedOn()).toBe(today);
  });

  await test.step('the same by the keyboard alone', async () => {
    await mechanic.getByRole('radio', { name: 'Month' }).focus();
    await tabTo(mechanic, eventOf(cell(mechanic, today)));
    await mechanic.keyboard.press('Enter');
    const dialog = mechanic.getByRole('dialog');
    await expectAccessible(mechanic);
    await tabTo(mechanic, dialog.getByRole('button', { name: 'Tomorrow' }));
    await mechanic.keyboard.press('Enter');
    await expect(task(cell(mechanic, tomorrow))).toBeVisible();
    expect(await plannedOn()).toBe(tomorrow);
    await tabTo(mechanic, mechanic.getByRole('button', { name: 'Undo' }));
    await mechanic.keyboard.press('Enter');
    await expect(task(cell(mechanic, today))).toBeVisible();
    expect(await plannedOn()).toBe(today);
  });

  await test.step('what somebody else plans shows within two seconds', async () => {
    await changeTask(ctx, opened.id, { plannedOn: later });
    await expect(task(cell(mechanic, later))).toBeVisible({ timeout: 2_000 });
  });

  await changeTask(ctx, opened.id, { plannedOn: today });
  for (const view of ['Week', 'List']) {
    const choice = mechanic.getByRole('radio', { name: view });
    await choice.click();
    await expect(choice).toBeChecked();
    await expect(task(mechanic)).toBeVisible();
    await expectAccessible(mechanic);
  }
});

/** N-1 at 100.0 h under two rules: a battery check due on a day, and a rebuild due at 150.0 h, on no day yet. */
async function openDuties({ database }: Running): Promise<void> {
  const { unit } = await openDock(database.db, { now: minutesAgo(300) });
  const ctx = asSystem(database.db, minutesAgo(300));
  const rules = [
    {
      name: 'Battery check',
      kind: 'inspection',
      triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY', start: later }],
    },
    { name: 'Carburettor rebuild', kind: 'rebuild', triggers: [{ on: 'engine_hours', every: 150 }] },
  ];
  for (const rule of rules) await createRule(ctx, createRuleInput.parse({ appliesTo: {}, ...rule }));
  await refreshDue(ctx, { unitIds: [unit.id] });
}

test('a due date stays where its rule puts it and says why; what has no day gets one', async ({
  browser,
  empty,
}) => {
  await openDuties(empty);
  const mechanic = await pageOf(browser, empty, 'mechanic', 1280);
  await mechanic.goto('/calendar');
  const check = (day: string) => cell(mechanic, day).getByText('Battery check', { exact: true });
  await expect(check(later)).toBeVisible();

  await test.step('a due date dropped on another day goes back, and the reason is told', async () => {
    await drag(mechanic, check(later), cell(mechanic, tomorrow));
    await expect(
      mechanic.getByText('A due date follows from its rule and cannot be moved. Open it to plan the work.'),
    ).toBeVisible();
    await expect(check(later)).toBeVisible();
    await expect(check(tomorrow)).toHaveCount(0);
    expect(await empty.database.db.selectFrom('task').select('id').execute()).toEqual([]);
  });

  await test.step('planning it opens its task, on the day chosen', async () => {
    await check(later).click();
    await mechanic.getByRole('dialog').getByRole('button', { name: 'Tomorrow' }).click();
    await expect(check(tomorrow)).toBeVisible();
    await expect(check(later)).toHaveCount(0);
  });

  await test.step('work without a day is planned and moves onto the grid', async () => {
    const undated = mechanic.getByRole('region', { name: 'Without a day' });
    await expect(undated).toContainText('50.0 h left');
    await undated.getByRole('button', { name: 'Plan Carburettor rebuild on N-1' }).click();
    await mechanic.getByRole('dialog').getByLabel('Plan for').fill(later);
    await mechanic.getByRole('dialog').getByRole('button', { name: 'Plan', exact: true }).click();
    const rebuild = cell(mechanic, later).getByText('Carburettor rebuild', { exact: true });
    await expect(rebuild).toBeVisible();
    await expect(undated).toContainText('Everything coming up has a day.');
    await mechanic.getByRole('button', { name: 'Undo' }).click();
    await expect(rebuild).toHaveCount(0);
    await expect(undated).toContainText('Carburettor rebuild');
  });
});

test('month, week, list and dialog are without a barrier on a phone and on a desk', async ({
  browser,
  empty,
}) => {
  await openDuties(empty);
  for (const width of [360, 1280]) {
    const page = await pageOf(browser, empty, 'mechanic', width);
    for (const view of ['month', 'week', 'list'] as const) {
      await page.goto(`/calendar?view=${view}&at=${later}`);
      const days = page.getByRole('region', { name: 'Calendar' });
      const check = days.getByText('Battery check', { exact: true });
      await expect(check).toBeVisible();
      await expectAccessible(page);
      await check.click();
      await expect(page.getByRole('dialog', { name: 'Battery check' })).toBeVisible();
      await expectAccessible(page);
      await page.keyboard.press('Escape');
      await expect(page.getByRole('dialog')).toHaveCount(0);
    }
    await page.context().close();
  }
});
