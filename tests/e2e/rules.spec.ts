import type { Page } from '@playwright/test';
import { createPerson } from '@/lib/actions/create-person';
import { asSystem, openDock } from '../support/crew';
import { expect, test, type Running } from '../support/e2e';
import { expectAccessible } from '../support/pages';
import { signIn } from '../support/sign-in';

const manager = { name: 'Ines Marlow', email: 'ines@wakewright.example', password: 'three-docks-afloat' };

/** A fleet of one unit, N-1 at 100.0 h in Lisbon, and its manager signed in on the page. */
async function openFleet({ app, database }: Running, page: Page) {
  const { unit } = await openDock(database.db);
  await createPerson(asSystem(database.db, new Date()), { ...manager, role: 'manager' });
  const header = await signIn(app.baseUrl, manager.email, manager.password);
  const cookies = header.split('; ').map((pair) => {
    const at = pair.indexOf('=');
    return { name: pair.slice(0, at), value: pair.slice(at + 1), url: app.baseUrl };
  });
  await page.context().addCookies(cookies);
  return { unit, at: (path: string) => new URL(path, app.baseUrl).href };
}

test('a rule says what it means and when it would be due while it is typed, and is saved', async ({
  empty,
  page,
}) => {
  const { at } = await openFleet(empty, page);
  await page.goto(at('/rules/new'));
  const meaning = page.getByRole('region', { name: 'What this rule means' });
  await page.getByLabel('Name').fill('Carburettor rebuild');
  await page.getByLabel('Every (h)').fill('75');
  await expect(meaning).toContainText('Every 75 engine hours, counted from the hour it was due.');
  // By hand: a unit without a record is due at 75.0 h first, and at 100.0 h it is past it.
  await expect(meaning).toContainText('75.0 h');
  await expect(meaning).toContainText('Overdue');
  await expect(meaning).toContainText('150.0 h');

  await page.getByLabel('May be late by (h)').fill('30');
  await expect(meaning).toContainText('It may be done up to 30 h late.');
  await expect(meaning.getByText('Due', { exact: true })).toBeVisible();

  await page.getByRole('button', { name: 'Add another trigger' }).click();
  const second = page.getByRole('group', { name: 'Or every' });
  await second.getByLabel('On the calendar').selectOption({ label: 'Write it yourself' });
  await second.getByLabel('Recurrence rule').fill('FREQ=HOURLY');
  await expect(second.getByLabel('Recurrence rule')).toHaveAccessibleDescription(
    /FREQ must be DAILY, WEEKLY, MONTHLY or YEARLY/,
  );
  await second.getByLabel('Recurrence rule').fill('FREQ=MONTHLY;BYDAY=1MO');
  await second.getByLabel('From', { exact: true }).fill('2030-01-01');
  // 7 January 2030 is a Monday (computed with GNU date).
  await expect(meaning).toContainText('Mon 7 Jan 2030');
  await expect(second.getByLabel('Recurrence rule')).not.toHaveAttribute('aria-invalid');

  await page.getByLabel('And for each carburettor (min)').fill('45');
  await page.getByLabel('For each unit (min)').fill('60');
  await expect(page.getByText('a twin 2 h 30 min')).toBeVisible();
  await page.getByLabel('Carburettors, at least').fill('3');
  await expect(page.getByText('0 of 1 units')).toBeVisible();
  await page.getByLabel('Carburettors, at least').fill('2');
  await expect(page.getByText('1 of 1 units')).toBeVisible();
  await expectAccessible(page);

  await page.getByRole('button', { name: 'Save the rule' }).click();
  await expect(page.getByText('“Carburettor rebuild” is saved for 1 unit.')).toBeVisible();
  await expect(page.getByRole('row', { name: /Carburettor rebuild/ })).toContainText('Every 75 engine hours');
});

test('a rule with a fault is not saved: what is wrong is listed and stands at its field', async ({
  empty,
  page,
}) => {
  const { at } = await openFleet(empty, page);
  await page.goto(at('/rules/new'));
  await page.getByRole('button', { name: 'Save the rule' }).click();
  await expect(page.getByRole('alert').filter({ hasText: 'The rule is not saved' })).toBeFocused();
  await expect(page.getByLabel('Name')).toHaveAttribute('aria-invalid', 'true');
  await expect(page.getByLabel('Every (h)')).toHaveAttribute('aria-invalid', 'true');

  await page.getByLabel('Name').fill('Oil');
  page.once('dialog', (dialog) => void dialog.dismiss());
  await page.getByRole('link', { name: 'Rules' }).first().click();
  await expect(page.getByLabel('Name')).toHaveValue('Oil');
  expect(await empty.database.db.selectFrom('rule').select('id').execute()).toEqual([]);
});

test('what was done before a unit came is recorded, and frees it', async ({ empty, page }) => {
  const { at, unit } = await openFleet(empty, page);
  await page.goto(at('/rules/new'));
  await page.getByLabel('Name').fill('Oil and filter');
  await page.getByLabel('Every (h)').fill('50');
  await page.getByRole('button', { name: 'Save the rule' }).click();
  await expect(page.getByText('“Oil and filter” is saved')).toBeVisible();

  await page.goto(at(`/units/${unit.id}/baselines`));
  await page.getByLabel('Who says so').fill('The log of the owner before us');
  await page.getByLabel('Last done on').fill('2026-04-20');
  await page.getByLabel('At (h)').fill('100.1');
  await page.getByRole('button', { name: 'Save Oil and filter' }).click();
  await expect(page.getByLabel('At (h)')).toHaveAccessibleDescription(/is more than the unit's 100 h/);
  await page.getByLabel('At (h)').fill('90');
  await page.getByRole('button', { name: 'Save all that are filled in' }).click();
  await expect(page.getByText('1 baseline recorded for N-1.')).toBeVisible();
  await expect(page.getByRole('row', { name: /Oil and filter/ })).toContainText('Mon 20 Apr 2026');
  await expectAccessible(page);
});
