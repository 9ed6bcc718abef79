import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import sharp from 'sharp';
import { extractText, getDocumentProxy } from 'unpdf';
import { addStarterProcedures } from '@/lib/actions/add-starter-procedures';
import { changeModel } from '@/lib/actions/change-model';
import { createPart } from '@/lib/actions/create-part';
import { createRule } from '@/lib/actions/create-rule';
import { listProcedures } from '@/lib/actions/list-procedures';
import { recordStockMove } from '@/lib/actions/record-stock-move';
import { refreshDue } from '@/lib/actions/refresh-due';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { asSystem, minutesAgo, openDock } from '../support/crew';
import { expect, test, type Running } from '../support/e2e';
import { expectAccessible, pageOf } from '../support/pages';

const RULE = 'Carburettor rebuild, every 99 h';
const FOUND = 'Pop-off test, wet, before anything is opened';
const CLOSED = 'Pop-off test, wet, of the closed carburettor';
const NEEDLE = 'Inlet needle, seat and spring renewed, lever set';
const HOLDS = 'The needle holds pressure';

/**
 * A twin at 100.0 h whose rebuild was due at 99.0 h and holds it: it wants a test ride and a second person. Limits are
 * those of common practice, without a published source.
 */
async function openWorkshop({ database }: Running) {
  const ctx = asSystem(database.db, minutesAgo(300));
  const opened = await openDock(database.db, { now: minutesAgo(300) });
  await addStarterProcedures(ctx);
  await changeModel(ctx, opened.model.id, {
    specs: {
      'Pop-off pressure': { min: 21, max: 37, unit: 'psi', repeats: 2, maxSpread: { amount: 1, of: 'unit' } },
      'Low-speed screw': { min: 1, max: 1.5, target: 1.25, unit: 'turns' },
      'High-speed screw': { min: 0, max: 0.25, target: 0, unit: 'turns' },
    },
  });
  const procedure = (await listProcedures(ctx)).find(({ name }) => name === 'Carburettor rebuild')!;
  const kitId = randomUUID();
  await createPart(ctx, { id: kitId, number: 'CK-2', name: 'Carburettor kit' });
  await recordStockMove(ctx, {
    ...{ id: randomUUID(), kind: 'receive', partId: kitId, dockId: opened.dock.id, quantity: 5 },
  });
  await createRule(
    ctx,
    createRuleInput.parse({
      name: RULE,
      kind: 'rebuild',
      appliesTo: {},
      triggers: [{ on: 'engine_hours', every: 99 }],
      procedureId: procedure.id,
      parts: [{ partId: kitId, quantity: 1, per: 'carb' }],
      wantsSecondPerson: true,
      wantsTestRide: true,
    }),
  );
  await refreshDue(ctx, { unitIds: [opened.unit.id] });
  return opened;
}

async function openTask(page: Page): Promise<void> {
  await page.goto('/tasks');
  await page
    .getByRole('link', { name: new RegExp(RULE) })
    .first()
    .click();
  await expect(page.getByRole('heading', { name: 'The work' })).toBeVisible();
}

const check = (page: Page, title: string, place?: number) =>
  page.getByRole('group', { name: place ? `${title}, carburettor ${place}` : title, exact: true });
const choose = (page: Page, title: string, outcome: 'Pass' | 'Fail', place?: number) =>
  check(page, title, place).getByRole('button', { name: outcome }).click();
const run = (page: Page, title: string, place: number, stage: string, number: number) =>
  page.getByLabel(`${title}, carburettor ${place}, ${stage}, run ${number}`, { exact: true });

async function measure(
  page: Page,
  title: string,
  place: number,
  stage: string,
  ...runs: string[]
): Promise<void> {
  for (const [index, typed] of runs.entries()) {
    const field = run(page, title, place, stage, index + 1);
    await field.fill(typed);
    await field.press('Enter');
  }
}

/** Fills in every measurement that is asked for and empty, and passes every check that is open. */
async function passTheRest(page: Page): Promise<void> {
  for (const [spec, typed] of [
    ['Low-speed screw', '1 1/4'],
    ['High-speed screw', '0'],
  ] as const) {
    const fields = page.getByLabel(new RegExp(`^${spec}.*As (found|left)$`));
    for (const field of await fields.all()) {
      if ((await field.inputValue()) !== '') continue;
      await field.fill(typed);
      await field.press('Enter');
    }
  }
  const open = page.locator('[role=group]:has(> [aria-pressed]):not(:has([aria-pressed=true]))');
  while ((await open.count()) > 0) {
    const name = (await open.first().getAttribute('aria-label'))!;
    const button = page.getByRole('group', { name, exact: true }).getByRole('button', { name: 'Pass' });
    await button.click();
    await expect(button).toHaveAttribute('aria-pressed', 'true');
  }
}

const allSaved = (page: Page) => expect(page.getByText('All saved')).toBeVisible();

async function readRecord(page: Page): Promise<string> {
  const link = page.getByRole('link', { name: 'Service record (PDF)' }).first();
  const response = await page.request.get((await link.getAttribute('href'))!);
  expect(response.headers()['content-type']).toBe('application/pdf');
  const pdf = await getDocumentProxy(new Uint8Array(await response.body()));
  return (await extractText(pdf, { mergePages: true })).text.replaceAll(/\s+/g, ' ');
}

test('a twin is rebuilt, one carburettor fails and is followed up alone, two people sign, and the unit is ready again', async ({
  browser,
  empty,
}) => {
  test.setTimeout(240_000);
  await openWorkshop(empty);
  const list = await pageOf(browser, empty, 'manager', 1280);
  await list.goto('/availability');
  await expect(list.getByRole('heading', { name: 'Held 1' })).toBeVisible();
  const page = await pageOf(browser, empty, 'mechanic', 820);
  await openTask(page);

  await test.step('the needle is left alone where the pop-off test passes, and touched where it fails', async () => {
    await measure(page, FOUND, 1, 'As found', '25', '25 psi');
    await measure(page, FOUND, 2, 'As found', '15', '15');
    await expect(page.getByText('15 psi is below 21 psi.')).toBeVisible();
    await choose(page, HOLDS, 'Pass', 1);
    await choose(page, HOLDS, 'Fail', 2);
    await expect(check(page, NEEDLE, 2)).toBeVisible();
    await expect(check(page, NEEDLE, 1)).toHaveCount(0);
    await passTheRest(page);
    await measure(page, CLOSED, 1, 'As left', '26', '26');
    await measure(page, CLOSED, 2, 'As left', '17', '17');
    await passTheRest(page);
    await allSaved(page);
    await expectAccessible(page);
  });

  await test.step('it is not closed over the failure; a follow-up is opened for that carburettor alone', async () => {
    await page.getByRole('button', { name: 'Close task' }).click();
    await expect(page.getByRole('alert').filter({ hasText: 'not closed yet' })).toContainText(
      `${CLOSED}, carburettor 2: failed.`,
    );
    const failed = page
      .getByRole('group', { name: 'carburettor 2', exact: true })
      .filter({ has: run(page, CLOSED, 2, 'As left', 1) });
    await failed.getByRole('button', { name: 'Open the follow-up' }).click();
    await expect(failed.getByRole('link', { name: 'Carburettor rebuild, carburettor 2' })).toBeVisible();
  });

  await test.step('a test ride and a second person are signed for', async () => {
    await page.getByRole('button', { name: 'I rode it, sign' }).click();
    await expect(page.getByText('✓ Signed')).toHaveCount(1);
    await page.getByRole('button', { name: 'I looked at all of it, sign' }).click();
    await expect(page.getByText('You did part of this work')).toBeVisible();
    const second = await pageOf(browser, empty, 'mechanic', 820);
    await openTask(second);
    await second.getByRole('button', { name: 'I looked at all of it, sign' }).click();
    await expect(page.getByText('✓ Signed')).toHaveCount(2);
    await page.getByRole('button', { name: 'Close task' }).click();
    await expect(page.getByText(/is closed at 100\.0 h/)).toBeVisible();
  });

  await test.step('the unit stays held by the follow-up, which has that carburettor only', async () => {
    await expect(list.getByRole('heading', { name: 'Held 1' })).toBeVisible();
    await page.getByRole('link', { name: 'Carburettor rebuild, carburettor 2' }).first().click();
    await expect(
      page.getByRole('heading', { name: 'Carburettor rebuild, carburettor 2', level: 1 }),
    ).toBeVisible();
    await expect(run(page, FOUND, 2, 'As found', 1)).toBeVisible();
    await expect(run(page, FOUND, 1, 'As found', 1)).toHaveCount(0);
    await measure(page, FOUND, 2, 'As found', '17', '17');
    await choose(page, HOLDS, 'Pass', 2);
    await passTheRest(page);
    await measure(page, CLOSED, 2, 'As left', '25', '25');
    await page.getByRole('button', { name: 'I rode it, sign' }).click();
    await allSaved(page);
    const { pathname } = new URL(page.url());
    await list.goto(pathname);
    await list.getByRole('button', { name: 'I looked at all of it, sign' }).click();
    await expect(page.getByText('✓ Signed')).toHaveCount(2);
    await page.getByLabel('Time worked').fill('70');
    await page.getByRole('button', { name: 'Close task' }).click();
    await expect(page.getByText(/is closed at 100\.0 h/)).toBeVisible();
  });

  const record = await readRecord(page);
  expect(record).toContain('carburettor 2, as found: 17 psi, 17 psi – OUT OF LIMITS (21 psi to 37 psi');
  expect(record).toContain('carburettor 2, as left: 25 psi, 25 psi – within limits');
  expect(record).toContain('70 min');
  expect(record).toContain('1 × Carburettor kit (CK-2), from Cais Norte');
  expect(record).toMatch(
    /Second person: A manager, .* Test ride: A mechanic|Test ride: A mechanic, .* Second person: A manager/,
  );
  await expectOnHand(empty, 2);
  await list.goto('/availability');
  await expect(list.getByRole('heading', { name: 'Ready 1' })).toBeVisible();
});

/** Of the five kits there were: two for the twin, one for the carburettor that was followed up. */
async function expectOnHand({ database }: Running, kits: number): Promise<void> {
  const moves = await database.db.selectFrom('stock_move').select('quantity').execute();
  expect(moves.reduce((sum, { quantity }) => sum + quantity, 0)).toBe(kits);
}

test('two mechanics at one task see each other and each other’s entries, and neither loses one', async ({
  browser,
  empty,
}) => {
  test.setTimeout(120_000);
  await openWorkshop(empty);
  const one = await pageOf(browser, empty, 'mechanic', 820);
  const other = await pageOf(browser, empty, 'mechanic', 820);
  await openTask(one);
  await openTask(other);
  await expect(one.getByText(/At this task too: A mechanic/)).toBeVisible();
  await choose(one, HOLDS, 'Pass', 1);
  await expect(check(other, HOLDS, 1).getByRole('button', { name: 'Pass' })).toHaveAttribute(
    'aria-pressed',
    'true',
  );

  await one.context().setOffline(true);
  await choose(one, HOLDS, 'Pass', 2);
  const taken = other.waitForResponse((response) => response.url().endsWith('/entries'));
  await choose(other, HOLDS, 'Fail', 2);
  expect((await taken).status()).toBe(201);
  await one.context().setOffline(false);
  await expect(one.getByText('A mechanic had entered fail in the meantime.')).toBeVisible();
  for (const page of [one, other]) {
    await expect(check(page, HOLDS, 2).getByRole('button', { name: 'Pass' })).toHaveAttribute(
      'aria-pressed',
      'true',
    );
    const trail = page
      .getByRole('group', { name: 'carburettor 2', exact: true })
      .filter({ has: check(page, HOLDS, 2) });
    await trail.getByText('Before that (1)').click();
    await expect(trail.getByRole('listitem')).toContainText('fail');
  }
});

test('a connection cut in the middle, a reload and a closed browser lose nothing of what was entered', async ({
  browser,
  empty,
}) => {
  test.setTimeout(120_000);
  await openWorkshop(empty);
  const page = await pageOf(browser, empty, 'mechanic', 820);
  await openTask(page);
  const half = run(page, FOUND, 1, 'As found', 1);

  await test.step('what is half typed is there again after a reload', async () => {
    await half.fill('2');
    await page.reload();
    await expect(half).toHaveValue('2');
  });

  await test.step('a picture taken without a connection is kept too, and in view', async () => {
    await page.context().setOffline(true);
    const step = page.getByRole('listitem').filter({ hasText: 'Picture of lines and linkage' });
    const name = 'linkage.png';
    const body = await sharp({ create: { width: 64, height: 48, channels: 3, background: '#7a3b10' } })
      .png()
      .toBuffer();
    await step.getByLabel('Choose pictures').setInputFiles({ name, mimeType: 'image/png', buffer: body });
    await expect(step.getByRole('img', { name })).toBeVisible();
    await expect(step.getByText('Kept on this device, not sent yet.')).toBeVisible();
  });

  await test.step('what is entered without a connection waits on the device, in view', async () => {
    await measure(page, FOUND, 1, 'As found', '25', '25');
    await choose(page, HOLDS, 'Pass', 1);
    await choose(page, HOLDS, 'Fail', 2);
    await expect(page.getByText(/[5-6] entries kept on this device/)).toBeVisible();
    await expect(page.getByText('Kept on this device, not sent yet.').first()).toBeVisible();
  });

  await test.step('the page closed and opened again, all of it is sent once, in its order', async () => {
    const { pathname } = new URL(page.url());
    const context = page.context();
    await page.close();
    await context.setOffline(false);
    const again = await context.newPage();
    await again.goto(pathname);
    await allSaved(again);
    await expect(run(again, FOUND, 1, 'As found', 2)).toHaveValue('25');
    await expect(check(again, HOLDS, 2).getByRole('button', { name: 'Fail' })).toHaveAttribute(
      'aria-pressed',
      'true',
    );
    const picture = again.getByRole('button', {
      name: 'Open Picture of lines and linkage before they come off, 1',
    });
    await picture.click();
    const large = again.getByRole('dialog').getByRole('img');
    await expect(large).toHaveJSProperty('naturalWidth', 64);
    await again.keyboard.press('Escape');
    const rows = await empty.database.db
      .selectFrom('step_entry')
      .select(['step_key', 'place', 'value'])
      .orderBy('seq')
      .execute();
    const kept = rows.map(({ step_key, place, value }) => [
      step_key,
      place,
      value.kind === 'measurement'
        ? value.runs.map(({ typed }) => typed).join()
        : 'outcome' in value && value.outcome,
    ]);
    expect(kept.filter(([key]) => key !== 'pop-off')).toEqual([
      ['as-mounted', 0, false],
      ['needle-holds', 1, 'pass'],
      ['needle-holds', 2, 'fail'],
    ]);
    expect(kept.filter(([key]) => key === 'pop-off').at(-1)).toEqual(['pop-off', 1, '25,25']);
  });
});
