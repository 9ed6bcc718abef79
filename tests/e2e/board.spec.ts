import { minutesAgo, openDock } from '../support/crew';
import { expect, test } from '../support/e2e';
import { expectAccessible, pageOf, typeHours } from '../support/pages';

test('two taps and a number: hours logged at the dock hold the unit in the manager’s open page', async ({
  browser,
  empty,
}) => {
  await openDock(empty.database.db, { holdsAt: 102, now: minutesAgo(300) });
  const manager = await pageOf(browser, empty, 'manager', 1280);
  await manager.goto('/availability');
  await expect(manager.getByRole('heading', { name: 'Held 0' })).toBeVisible();
  await expectAccessible(manager);

  const hand = await pageOf(browser, empty, 'dock');
  await hand.goto('/board');
  await expectAccessible(hand);
  await hand.getByRole('link', { name: /N-1/ }).first().click();
  await expect(hand.getByRole('heading', { name: 'Check out N-1' })).toBeVisible();
  await expectAccessible(hand);
  await hand.getByRole('button', { name: 'Check out N-1' }).click();
  await expect(hand.getByText('N-1 is out', { exact: true })).toBeVisible();
  await hand.getByRole('link', { name: 'Back to the board' }).click();
  await hand.getByRole('radio', { name: 'Out 1' }).check();
  await hand.getByRole('link', { name: /N-1.*Check in/ }).click();

  await expect(hand.getByText('100.0 h', { exact: true })).toBeVisible();
  await typeHours(hand, '102.3');
  await expect(hand.getByText('2.3 h since the last reading.')).toBeVisible();
  await expectAccessible(hand);
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await hand.getByLabel('Why so many hours?').fill('Ran on the hose first');
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await expect(hand.getByText('N-1 is back')).toBeVisible();
  await expect(manager.getByRole('heading', { name: 'Held 1' })).toBeVisible({ timeout: 2_000 });
  await expect(manager.getByText(/was due at 102\.0 h/)).toBeVisible();
  await expect(hand.getByText(/was due at 102\.0 h/)).toBeVisible();
  await expectAccessible(hand);

  await manager.goto('/review');
  await expect(manager.getByText('Ran on the hose first')).toBeVisible();
  await expectAccessible(manager);
  await manager.getByRole('button', { name: 'Accept' }).click();
  await manager.getByLabel('Note').fill('Seen it run');
  await manager.getByRole('button', { name: 'Accept the reading' }).click();
  await expect(manager.getByText('No reading waits for you')).toBeVisible();
});

test('without a connection what was typed is kept, and sent once when it is back', async ({
  browser,
  empty,
}) => {
  const { unit } = await openDock(empty.database.db, { now: minutesAgo(300) });
  const hand = await pageOf(browser, empty, 'dock');
  await hand.goto(`/board/check-in/${unit.id}`);
  await typeHours(hand, '100.9');
  await hand.getByRole('button', { name: 'Report a defect' }).click();
  await hand.getByLabel('What is wrong').fill('Seat torn');
  await hand.context().setOffline(true);
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await expect(hand.getByText('Not sent yet')).toBeVisible();
  await expect(hand.getByLabel(/The meter shows/)).toHaveValue('100.9');
  await hand.context().setOffline(false);

  // The reply is lost, not the request: the second tap finds the first one's result.
  await hand.route(
    '**/api/v1/check-ins',
    async (route) => {
      await route.fetch();
      await route.abort();
    },
    { times: 1 },
  );
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await expect(hand.getByText('Not sent yet')).toBeVisible();
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await expect(hand.getByText('N-1 is back')).toBeVisible();
  const kept = await empty.database.db.selectFrom('reading').select('source').orderBy('source').execute();
  expect(kept).toEqual([{ source: 'check_in' }, { source: 'entry' }]);
  expect(await empty.database.db.selectFrom('defect').select('title').execute()).toEqual([
    { title: 'Seat torn' },
  ]);
});

test('a number lower than the last is refused with its value and date', async ({ browser, empty }) => {
  const { unit } = await openDock(empty.database.db, { now: minutesAgo(300) });
  const hand = await pageOf(browser, empty, 'dock');
  await hand.goto(`/board/check-in/${unit.id}`);
  await typeHours(hand, '99.9');
  await expect(hand.getByText('0.1 h less than the last reading. Read the meter again.')).toBeVisible();
  await hand.getByRole('button', { name: 'Check in N-1' }).click();
  await expect(hand.getByText(/The meter showed 100\.0 h on \w{3} \d+ \w{3} \d{4}/)).toBeVisible();
});
