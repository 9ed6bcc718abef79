import type { Locator, Page } from '@playwright/test';
import { changeTask } from '@/lib/actions/change-task';
import { openTask } from '@/lib/actions/open-task';
import { addDays, localDay } from '@/lib/domain/calendar-day';
import { openTask as openTaskInput } from '@/lib/schemas/task';
import { asSystem, minutesAgo, openDock } from '../support/crew';
import { expect, test } from '../support/e2e';
import { expectAccessible, pageOf } from '../support/pages';

const today = localDay(new Date(), 'Europe/Lisbon');
/** The month view shows six weeks, so this day is there whatever today is. */
const later = addDays(today, 2);

const cell = (page: Page, day: string): Locator => page.locator(`td[data-date="${day}"]`);
const task = (within: Page | Locator): Locator => within.getByText('Rub rail loose', { exact: true });

/** Presses the mouse on one place, moves it over and lets go, as a hand does. */
async function drag(page: Page, from: Locator, to: Locator): Promise<void> {
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

  await test.step('the same without dragging', async () => {
    await task(cell(mechanic, today)).locator('xpath=ancestor::a').focus();
    await mechanic.keyboard.press('Enter');
    const dialog = mechanic.getByRole('dialog');
    await expectAccessible(mechanic);
    await dialog.getByLabel('Plan for').fill(later);
    await mechanic.keyboard.press('Enter');
    await expect(task(cell(mechanic, later))).toBeVisible();
    expect(await plannedOn()).toBe(later);
  });

  await test.step('what somebody else plans shows within two seconds', async () => {
    await changeTask(ctx, opened.id, { plannedOn: today });
    await expect(task(cell(mechanic, today))).toBeVisible({ timeout: 2_000 });
  });

  for (const view of ['Week', 'List']) {
    const choice = mechanic.getByRole('radio', { name: view });
    await choice.click();
    await expect(choice).toBeChecked();
    await expect(task(mechanic)).toBeVisible();
    await expectAccessible(mechanic);
  }
});
