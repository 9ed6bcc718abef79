import { createDock } from '@/lib/actions/create-dock';
import { createPerson } from '@/lib/actions/create-person';
import { createRule } from '@/lib/actions/create-rule';
import { setUp } from '@/lib/actions/set-up';
import { SYSTEM } from '@/lib/domain/access';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { expect, test } from '../support/e2e';
import { expectAccessible, sendSignIn } from '../support/pages';

const PASSWORD = 'otters-under-the-jetty';

test('a manager adds the first unit, mends its hull number, and sees it held until it is assessed', async ({
  page,
  empty: { app, database },
}) => {
  test.setTimeout(120_000);
  await app.worker.stop();
  const ctx = { db: database.db, actor: SYSTEM, now: new Date() };
  const manager = { name: 'Ines Marlow', email: 'ines@wakewright.example', password: PASSWORD };
  await setUp(ctx, {
    operatorName: 'Tidewater Hire',
    dock: { name: 'Cedar Point', timeZone: 'America/New_York' },
    manager,
  });
  await createRule(
    ctx,
    createRuleInput.parse({
      name: 'Carburettor rebuild',
      kind: 'rebuild',
      appliesTo: { carbCount: { min: 2 } },
      triggers: [{ on: 'engine_hours', every: 50 }],
    }),
  );
  await page.goto(`${app.baseUrl}/sign-in`);
  await sendSignIn(page, manager.email, PASSWORD);
  await page.waitForURL((url) => url.pathname !== '/sign-in');

  await test.step('an empty fleet leads to the first unit, and that to its model', async () => {
    await page.goto(`${app.baseUrl}/units`);
    await expectAccessible(page);
    await page.getByRole('link', { name: 'Add the first unit' }).click();
    await page.getByRole('link', { name: 'Add a model' }).click();
    await page.getByLabel('Name').fill('Twin 800');
    await page.getByRole('radio', { name: 'Two-stroke' }).check();
    await page.getByLabel('Cylinders').fill('2');
    await page.getByLabel('Carburettors').fill('2');
    await page.getByRole('button', { name: 'Add a spec' }).click();
    await page.getByLabel('Measurement').fill('Compression');
    await page.getByLabel('Least').fill('150');
    await page.getByLabel('Most').fill('180');
    await page.getByLabel('In', { exact: true }).fill('psi');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Add the model' }).click();
    await expect(page.getByRole('link', { name: 'Twin 800', exact: true })).toBeVisible();
  });

  await test.step('a hull number that cannot be right is explained where it is written', async () => {
    await page.goto(`${app.baseUrl}/units/new`);
    await page.getByLabel('Fleet number').fill('JS-07');
    // 33 CFR 181.25: no letter O in the serial number, characters 4 to 8.
    await page.getByLabel('Hull number (HIN)').fill('ABC1O345D404');
    await page.getByLabel('Registration').fill('nh1234bd');
    await page.getByLabel('Meter now').fill('12.4');
    await page.getByRole('button', { name: 'Add the unit' }).click();
    await expect(page.getByRole('heading', { name: 'The unit is not saved' })).toBeVisible();
    await expect(page.getByLabel('Hull number (HIN)')).toHaveAccessibleDescription(
      /characters 4 to 8, has no letters I, O or Q/,
    );
    await expect(page.getByLabel('Registration')).toHaveValue('nh1234bd');
    await expectAccessible(page);
  });

  await test.step('mended, the unit is there, and held until the worker has assessed it', async () => {
    await page.getByLabel('Hull number (HIN)').fill('ABC12345D404');
    await page.getByRole('button', { name: 'Add the unit' }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'JS-07' })).toBeVisible();
    await expect(page.getByRole('region', { name: 'State' })).toContainText('Held');
    await expect(page.getByRole('region', { name: 'State' })).toContainText('Not yet assessed');
    await expect(page.getByText('NH 1234 BD')).toBeVisible();
    await expectAccessible(page);
    app.worker.start();
    await expect(async () => {
      await page.reload();
      await expect(page.getByRole('region', { name: 'State' })).toContainText('Ready', { timeout: 500 });
    }).toPass({ timeout: 30_000 });
    // 50 h after 0, of which 12.4 h are run.
    await expect(page.getByRole('table', { name: 'What comes due on this unit' })).toContainText(
      '37.6 h left',
    );
  });

  await test.step('a defect that holds it, a lay-up and a voided reading stand in its history', async () => {
    await page.getByRole('button', { name: 'Report a defect' }).click();
    await page.getByLabel('What is wrong').fill('Cracked hatch');
    await page.getByRole('button', { name: 'Report it' }).click();
    await expect(page.getByRole('region', { name: 'State' })).toContainText(
      'Defect reported: Cracked hatch.',
    );
    await page.getByRole('button', { name: 'Lay up' }).click();
    await page.getByRole('button', { name: 'Lay it up' }).click();
    await expect(page.getByLabel('Reason')).toHaveAccessibleDescription(/is empty/);
    await page.getByLabel('Reason').fill('Waits for a new hatch');
    await page.getByRole('button', { name: 'Lay it up' }).click();
    await expect(page.getByRole('button', { name: 'End the lay-up' })).toBeVisible();
    await page.getByRole('button', { name: 'Void this reading' }).click();
    await page.getByLabel('Reason').fill('A 9 was read as a 4');
    await page.getByLabel('What the meter showed instead').fill('12,9');
    await page.getByRole('button', { name: 'Void it' }).click();
    await expect(page.getByText(/A 9 was read as a 4/)).toBeVisible();
    await expect(page.getByRole('region', { name: 'Meter' })).toContainText('12.9 h');
    await page.getByRole('link', { name: 'Readings' }).click();
    await expect(page.getByText('Corrected reading: 12.9 h')).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('the fleet’s list shows it on the water line, and narrows to a state', async () => {
    await page.goto(`${app.baseUrl}/units`);
    await expect(page.getByRole('table', { name: 'Units' })).toContainText('Waits for a new hatch');
    await expectAccessible(page);
    await page.getByLabel('State').selectOption('Ready');
    await page.getByRole('button', { name: 'Show', exact: true }).click();
    await expect(page.getByText('No unit fits what you chose')).toBeVisible();
  });

  await test.step('retired after asking, it leaves the list and keeps its history', async () => {
    await page.goto(`${app.baseUrl}/units?state=held`);
    await page.getByRole('table').getByRole('link', { name: 'JS-07' }).click();
    await page.getByRole('link', { name: 'Change', exact: true }).click();
    await page.getByRole('button', { name: 'Retire the unit' }).click();
    await page.getByRole('button', { name: 'Retire it' }).click();
    await expect(page.getByText('A retired unit is not changed any more.')).toBeVisible();
    await page.goto(`${app.baseUrl}/units?state=retired`);
    await page.getByRole('link', { name: 'JS-07' }).click();
    await expect(page.getByText('Defect: Cracked hatch')).toBeVisible();
    await expect(page.getByRole('button', { name: 'Report a defect' })).toHaveCount(0);
  });
});

test('a dock hand reads units and docks, and is offered nothing to change', async ({
  page,
  empty: { app, database },
}) => {
  const ctx = { db: database.db, actor: SYSTEM, now: new Date() };
  await setUp(ctx, {
    operatorName: 'Tidewater Hire',
    dock: { name: 'Cedar Point', timeZone: 'America/New_York' },
    manager: { name: 'Ines Marlow', email: 'ines@wakewright.example', password: PASSWORD },
  });
  await createDock(ctx, { name: 'Heron Quay', timeZone: 'America/Chicago' });
  const hand = {
    name: 'Ada Reef',
    email: 'ada@wakewright.example',
    role: 'dock',
    password: PASSWORD,
  } as const;
  await createPerson(ctx, hand);
  await page.goto(`${app.baseUrl}/sign-in`);
  await sendSignIn(page, hand.email, PASSWORD);
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  await page.goto(`${app.baseUrl}/units`);
  await expect(page.getByText('A manager adds the first one.')).toBeVisible();
  expect((await page.goto(`${app.baseUrl}/units/new`))?.status()).toBe(404);
  await page.goto(`${app.baseUrl}/docks`);
  await expect(page.getByRole('link', { name: 'Heron Quay', exact: true })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('link', { name: 'Heron Quay', exact: true }).click();
  await expect(page.getByLabel('Time zone')).toHaveValue('America/Chicago');
  await expect(page.getByLabel('Time zone')).toBeDisabled();
  await expect(page.getByRole('button', { name: 'Save' })).toHaveCount(0);
  await expectAccessible(page);
});
