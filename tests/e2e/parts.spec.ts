import type { Page } from '@playwright/test';
import type { Part, PartLine } from '@/lib/schemas/part';
import type { Task } from '@/lib/schemas/task';
import { expect, test } from '../support/e2e';
import { expectAccessible, pageOf } from '../support/pages';

async function get<T>({ request }: Page, path: string): Promise<T> {
  return (await (await request.get(`/api/v1${path}`)).json()) as T;
}

/** What the page of a part says is on hand at a dock. */
const onHand = (page: Page, dock: string) =>
  page
    .getByRole('table', { name: 'What lies at each dock' })
    .getByRole('row', { name: new RegExp(dock) })
    .getByRole('cell')
    .nth(1);

async function openPart(page: Page, name: string): Promise<void> {
  await page.goto('/parts');
  await page.getByRole('link', { name, exact: true }).click();
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();
}

/** Does something to the stock of the part that is open, at the first dock. */
async function move(page: Page, act: string, quantity: string, button: string, reason = ''): Promise<void> {
  await page.getByRole('radio', { name: act, exact: true }).check();
  await page.getByLabel('Dock', { exact: true }).selectOption('Gullwick Slip');
  await page.getByLabel(/^How many/).fill(quantity);
  await page.getByLabel('Why').fill(reason);
  await page.getByRole('button', { name: button }).click();
}

test('a mechanic finds what is low, receives it and counts it, and the ledger says who and why', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const page = await pageOf(browser, fresh, 'mechanic', 1280);
  await page.goto('/tasks');
  await page.getByRole('link', { name: 'Parts', exact: true }).click();
  const rows = page.getByRole('table', { name: /Parts/ }).getByRole('row');
  await expect(rows.nth(1)).toContainText('Low');
  await page.getByRole('navigation', { name: 'Which parts' }).getByRole('link', { name: /^Low/ }).click();
  const needle = page.getByRole('row', { name: /Inlet needle and seat/ });
  await expect(needle).toContainText(/Low.*2/);
  await expectAccessible(page);
  await needle.getByRole('link').click();
  await expect(onHand(page, 'Gullwick Slip')).toHaveText(/^\D*2$/);

  await move(page, 'Receive', '6', 'Receive', 'Order 12');
  await expect(onHand(page, 'Gullwick Slip')).toHaveText(/^\D*8$/);
  await move(page, 'Count', '7', 'Write the count');
  await expect(onHand(page, 'Gullwick Slip')).toHaveText(/^\D*7$/);
  const ledger = page.getByRole('table', { name: 'Moves, the latest first' }).getByRole('row');
  await expect(ledger.nth(1)).toContainText(/Counted.*Gullwick Slip.*−1.*7.*A mechanic/);
  await expect(ledger.nth(2)).toContainText(/Received.*\+6.*8.*A mechanic.*Order 12/);
  await expectAccessible(page);
  await page.goto('/parts?show=low');
  await expect(page.getByRole('row', { name: /Inlet needle and seat/ })).toHaveCount(0);
});

test('a kit is written, made up of its parts, moved to another dock, and never further than there is', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const page = await pageOf(browser, fresh, 'manager', 360);
  await page.goto('/parts/new');
  await page.getByLabel('Name').fill('Cable kit');
  await page.getByLabel('Number').fill('XK-1');
  await page.getByLabel('It is a kit of other parts').check();
  await page.getByRole('button', { name: 'Add a part to the kit' }).click();
  await page.getByRole('button', { name: 'Add the kit' }).click();
  await expect(page.getByRole('alert').first()).toContainText('The part is not saved');
  await page.getByLabel('Part', { exact: true }).selectOption('Throttle cable, TC-61');
  await page.getByRole('button', { name: 'Add the kit' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Cable kit' })).toBeVisible();
  await move(page, 'Make up', '2', 'Make up the kits');
  await expect(onHand(page, 'Gullwick Slip')).toContainText('2');
  await move(page, 'Make up', '9', 'Make up the kits');
  await expect(page.getByRole('alert').first()).toContainText('Throttle cable: only 1 on hand');
  await page.getByRole('radio', { name: 'Move', exact: true }).check();
  await page.getByLabel('From').selectOption('Gullwick Slip');
  await page.getByLabel('To', { exact: true }).selectOption('Quillan Reach');
  await page.getByLabel(/^How many/).fill('1');
  await page.getByRole('button', { name: 'Move', exact: true }).click();
  await expect(onHand(page, 'Quillan Reach')).toContainText('1');
  await expectAccessible(page);
});

test('a task shows what it needs and sets it aside, closing takes it out, and reversing puts it back', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const mechanic = await pageOf(browser, fresh, 'mechanic', 360);
  const { items: units } = await get<{ items: { id: string; dockName: string; modelName: string }[] }>(
    mechanic,
    '/units?limit=500',
  );
  const unit = units.find(
    ({ dockName, modelName }) => dockName === 'Gullwick Slip' && modelName === 'Twinfin',
  )!;
  const part = async (name: string) => {
    const { items } = await get<{ items: PartLine[] }>(mechanic, '/parts?limit=500');
    return get<Part>(mechanic, `/parts/${items.find((one) => one.name === name)!.id}`);
  };
  const stands = async (name: string) =>
    (await part(name)).levels.find(({ dockName }) => dockName === 'Gullwick Slip')!;
  const plug = await stands('Spark plug');
  const opened = await mechanic.request.post('/api/v1/tasks', {
    data: { unitId: unit.id, kind: 'repair', title: 'Foul plugs' },
  });
  const { id } = (await opened.json()) as Task;
  await mechanic.goto(`/tasks/${id}`);
  const parts = mechanic.getByRole('region', { name: 'Parts', exact: true });
  await parts.getByLabel('It also needs').selectOption('Spark plug, SP-30');
  await parts.getByRole('button', { name: 'Add to the task' }).click();
  await parts.getByRole('button', { name: 'One more Spark plug needed' }).click();
  await expect(parts.getByText('2 ×')).toBeVisible();
  await parts.getByRole('button', { name: 'Set aside what is here' }).click();
  await expect(parts).toContainText('Set aside 2 of 2');
  expect(await stands('Spark plug')).toMatchObject({ reserved: plug.reserved + 2, onHand: plug.onHand });
  await expectAccessible(mechanic);

  const close = mechanic.getByRole('region', { name: 'Close', exact: true });
  await expect(close.getByText('the task needs 2')).toBeVisible();
  await close.getByRole('button', { name: 'One more Spark plug', exact: true }).click();
  await close.getByRole('button', { name: 'Close task' }).click();
  await expect(mechanic.getByText('Parts: 3 × Spark plug.')).toBeVisible();
  expect(await stands('Spark plug')).toMatchObject({ reserved: plug.reserved, onHand: plug.onHand - 3 });

  const manager = await pageOf(browser, fresh, 'manager', 1280);
  await manager.goto(`/tasks/${id}`);
  await manager.getByRole('button', { name: 'Reverse this closing' }).click();
  await manager.getByRole('dialog').getByLabel('Reason').fill('It was another unit');
  await manager.getByRole('dialog').getByRole('button', { name: 'Reverse this closing' }).click();
  await expect(manager.getByText('Reversed by A manager: It was another unit')).toBeVisible();
  expect((await stands('Spark plug')).onHand).toBe(plug.onHand);
  await openPart(manager, 'Spark plug');
  const ledger = manager.getByRole('table', { name: 'Moves, the latest first' }).getByRole('row');
  await expect(ledger.nth(1)).toContainText(/Put back.*\+3.*A manager.*Foul plugs.*It was another unit/);
});

test('closing with more than is there asks why, and keeps the answer', async ({ browser, fresh }) => {
  const mechanic = await pageOf(browser, fresh, 'mechanic', 360);
  const { items } = await get<{ items: { id: string; dockName: string }[] }>(mechanic, '/units?limit=500');
  const unit = items.find(({ dockName }) => dockName === 'Quillan Reach')!;
  const opened = await mechanic.request.post('/api/v1/tasks', {
    data: { unitId: unit.id, kind: 'repair', title: 'Stiff throttle' },
  });
  await mechanic.goto(`/tasks/${((await opened.json()) as Task).id}`);
  const close = mechanic.getByRole('region', { name: 'Close', exact: true });
  await close.getByLabel('Another part').selectOption('Throttle cable, TC-61');
  await close.getByRole('button', { name: 'Add', exact: true }).click();
  await expect(close.getByText('None on hand: say why it was taken all the same.')).toBeVisible();
  await close.getByRole('button', { name: 'Close task' }).click();
  await expect(close.getByRole('alert').first()).toContainText('Throttle cable: none on hand');
  await close.getByLabel('Why more than is there, Throttle cable').fill('Bought on the way');
  await close.getByRole('button', { name: 'Close task' }).click();
  await expect(mechanic.getByText('Parts: 1 × Throttle cable.')).toBeVisible();
});

test('a rule names the parts that its work takes', async ({ browser, fresh }) => {
  const page = await pageOf(browser, fresh, 'manager', 1280);
  await page.goto('/rules');
  await page.getByRole('link', { name: 'Battery and charging check' }).click();
  await page.getByRole('button', { name: 'Add a part' }).click();
  await page.getByRole('button', { name: 'Save the rule' }).click();
  await expect(page.getByRole('alert').first()).toContainText('The rule is not saved');
  await page.getByLabel('Part', { exact: true }).selectOption('Cut-off lanyard, LY-70');
  await page.getByLabel('How many').fill('2');
  await page.getByLabel('Per', { exact: true }).selectOption('for each engine');
  await page.getByRole('button', { name: 'Save the rule' }).click();
  await expect(page).toHaveURL(/\/rules$/);
  await openPart(page, 'Cut-off lanyard');
  await expect(page.getByText('for each engine')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Battery and charging check' })).toBeVisible();
});
