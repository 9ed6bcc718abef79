import { expect, test } from '../support/e2e';
import { expectAccessible, pageOf } from '../support/pages';

test('a rule is given a procedure, and its next task shows the steps as they stood when it was opened', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const manager = await pageOf(browser, fresh, 'manager', 1280);
  await manager.goto('/rules');
  await manager.getByRole('link', { name: 'Engine oil and filter' }).click();
  await manager.getByLabel('Procedure').selectOption('Compression test');
  await manager.getByRole('button', { name: 'Save the rule' }).click();
  await expect(manager).toHaveURL(/\/rules$/);
  await manager.goto('/procedures');
  await expect(manager.getByRole('row', { name: /Compression test/ })).toContainText('Engine oil and filter');

  const mechanic = await pageOf(browser, fresh, 'mechanic', 820);
  await mechanic.goto('/tasks/new');
  await mechanic.getByLabel('Unit', { exact: true }).selectOption({ index: 1 });
  await mechanic.getByRole('radio', { name: 'Inspection' }).check();
  await mechanic.getByLabel('What is to be done').fill('Find out why it is down on power');
  await mechanic.getByLabel('Procedure').selectOption('Compression test');
  await mechanic.getByRole('button', { name: 'Open task' }).click();
  await expect(mechanic.getByRole('heading', { name: 'The work' })).toBeVisible();
  await expect(mechanic.getByText('Compression test, version 1')).toBeVisible();
  const steps = mechanic.getByRole('region', { name: 'The work' }).getByRole('listitem');
  await expect(steps.first()).toContainText('The engine maker’s manual comes first');
  await expect(steps.filter({ hasText: 'Compression, cranked until the gauge stands still' })).toContainText(
    /cylinder 1As foundValue, psi.*cylinder 2As foundValue, psi/,
  );
  await expectAccessible(mechanic);
});

test('a rebuild says that needle and seat are touched only where the pop-off test failed or the needle did not hold', async ({
  browser,
  shared,
}) => {
  const hand = await pageOf(browser, shared, 'dock');
  await hand.goto('/procedures');
  await hand.getByRole('link', { name: 'Carburettor rebuild' }).click();
  const steps = hand.getByRole('region', { name: 'Steps' }).getByRole('listitem');
  await expect(steps.first()).toBeVisible();
  const numberOf = async (text: string) =>
    (await steps.allTextContents()).findIndex((step) => step.includes(text)) + 1;
  const popOff = await numberOf('Pop-off test, wet, before anything is opened');
  const holds = await numberOf('The needle holds pressure');
  await expect(steps.filter({ hasText: 'Inlet needle, seat and spring renewed' })).toContainText(
    `Only where step ${popOff} failed or step ${holds} failed.`,
  );
});

test('a mechanic writes a procedure with the keyboard at hand, is told what is wrong, and writes its next version', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const page = await pageOf(browser, fresh, 'mechanic', 820);
  await page.goto('/procedures');
  await page.getByRole('link', { name: 'Write a procedure' }).click();
  await page.getByLabel('Name').fill('Leak test');
  await page.getByRole('button', { name: 'Save the procedure' }).click();
  const wrong = page.getByRole('alert').filter({ hasText: 'The procedure is not saved' });
  await expect(wrong).toContainText('Steps: has no step');

  await page.getByRole('button', { name: 'Add a step' }).click();
  const first = page.getByRole('group', { name: /^1/ });
  await first.getByLabel('What is done').fill('Holds 5 psi for a minute');
  await first.getByLabel('How often').selectOption('For each carburettor');
  await page.getByRole('button', { name: 'Add a step' }).click();
  const second = page.getByRole('group', { name: /^2/ });
  await second.getByRole('button', { name: /only where an earlier step/ }).click();
  await page.getByRole('button', { name: 'Save the procedure' }).click();
  await expect(wrong).toContainText('Step 2: is empty');
  await second.getByLabel('What is done').fill('Renew the gasket');
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Save the procedure' }).click();
  await expect(page.getByRole('heading', { name: 'Leak test', level: 1 })).toBeVisible();
  await expect(page.getByText('Only where step 1 failed.')).toBeVisible();

  await page.getByRole('link', { name: 'Change' }).click();
  await page.getByLabel('What is new in this version').fill('Say so first');
  await page.getByRole('button', { name: 'Move Renew the gasket up' }).click();
  await page.getByRole('button', { name: 'Save the procedure' }).click();
  await expect(wrong).toContainText('depends on a step that does not come before it');
  await page.getByRole('button', { name: 'Move Renew the gasket down' }).click();
  await page.getByRole('button', { name: 'Save the procedure' }).click();
  await expect(page.getByText('Version 2', { exact: true })).toBeVisible();
  await expect(page.getByText('Say so first')).toBeVisible();
});
