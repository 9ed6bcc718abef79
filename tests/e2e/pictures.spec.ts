import sharp from 'sharp';
import { expect, test } from '../support/e2e';
import { expectAccessible, pageOf } from '../support/pages';

const png = (colour: string) =>
  sharp({ create: { width: 90, height: 60, channels: 3, background: colour } })
    .png()
    .toBuffer();

test('a defect is reported with its picture, which the unit and the mechanic’s task then show', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const page = await pageOf(browser, fresh, 'dock');
  await page.goto('/units');
  await page
    .getByRole('link', { name: /^[A-Z]+-\d+/ })
    .first()
    .click();
  await page.getByRole('button', { name: 'Report a defect' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('What is wrong').fill('Intake grate bent');
  const grate = { name: 'grate.png', mimeType: 'image/png', buffer: await png('#345678') };
  await dialog.getByLabel('Pictures').setInputFiles(grate);
  await dialog.getByRole('button', { name: 'Report it' }).click();
  const files = page.getByRole('region', { name: 'Pictures and documents' });
  await expect(files.getByRole('button', { name: 'Open grate.png' })).toBeVisible();
  await expect(files.getByText('Intake grate bent')).toBeVisible();
  await expectAccessible(page);

  const mechanic = await pageOf(browser, fresh, 'mechanic', 1280);
  await expect(async () => {
    await mechanic.goto('/tasks');
    await expect(mechanic.getByRole('link', { name: /Intake grate bent/ }).first()).toBeVisible({
      timeout: 1000,
    });
  }).toPass();
  await mechanic
    .getByRole('link', { name: /Intake grate bent/ })
    .first()
    .click();
  await mechanic.getByRole('button', { name: 'Open grate.png' }).click();
  await expect(mechanic.getByRole('dialog').getByRole('img')).toHaveJSProperty('naturalWidth', 90);
});

test('a document is kept, what is no picture is refused with the reason, and a removal can be undone', async ({
  browser,
  fresh,
}) => {
  test.setTimeout(120_000);
  const page = await pageOf(browser, fresh, 'mechanic', 1280);
  await page.goto('/units');
  await page
    .getByRole('link', { name: /^[A-Z]+-\d+/ })
    .first()
    .click();
  const files = page.getByRole('region', { name: 'Pictures and documents' });
  const choose = files.getByLabel('Choose pictures or PDFs');
  await choose.setInputFiles([
    { name: 'manual.pdf', mimeType: 'application/pdf', buffer: Buffer.from('%PDF-1.4\n%%EOF') },
    { name: 'hull.png', mimeType: 'image/png', buffer: await png('#10523a') },
    { name: 'fake.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('<html>no picture</html>') },
  ]);
  await expect(files.getByRole('link', { name: 'manual.pdf' })).toBeVisible();
  await expect(files.getByText('This file is no picture (JPEG, PNG, WebP, HEIC) and no PDF.')).toBeVisible();
  await files.getByRole('button', { name: 'Forget it' }).click();
  await expect(files.getByText('Not taken')).toHaveCount(0);
  await files.getByRole('button', { name: 'Open hull.png' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Remove' }).click();
  await expect(files.getByRole('button', { name: 'Open hull.png' })).toHaveCount(0);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(files.getByRole('button', { name: 'Open hull.png' })).toBeVisible();
});
