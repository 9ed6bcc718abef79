import type { Page } from '@playwright/test';
import { setUp } from '@/lib/actions/set-up';
import type { Mailbox } from '../fakes/mailbox';
import { asSystem } from '../support/crew';
import { expect, SETUP_TOKEN, test } from '../support/e2e';
import { expectAccessible, openPage, sendSignIn } from '../support/pages';

const PASSWORD = 'otters-under-the-jetty';
const NEW_PASSWORD = 'a-heron-on-the-mooring';
const manager = { name: 'Ines Marlow', email: 'ines@wakewright.example', password: PASSWORD };

test.beforeEach(({}, testInfo) => testInfo.setTimeout(120_000));

/** The newest letter to somebody, looked up on the mailbox's own page, and the link in it followed. */
async function followLetter(page: Page, mailbox: Mailbox, subject: string, to: string): Promise<void> {
  await expect
    .poll(() => mailbox.messages().find((mail) => mail.subject === subject && mail.to.includes(to)), {
      timeout: 30_000,
    })
    .toBeDefined();
  await page.goto(mailbox.webUrl);
  await page.getByRole('link', { name: subject }).first().click();
  const link = page.frameLocator('iframe').getByRole('link');
  const href = await link.getAttribute('href');
  await page.goto(href ?? '');
}

test('the first visitor sets the product up with the token, and is led to the first model, unit and rule', async ({
  browser,
  empty,
}) => {
  const page = await openPage(browser, empty, 1280);
  await page.goto('/');
  await expect(page.getByRole('heading', { name: 'Set up Wakewright' })).toBeVisible();
  await expectAccessible(page);

  await test.step('a wrong token is refused at its field, and nothing typed is lost', async () => {
    await page.getByLabel('Set-up token').fill('not the one that was printed');
    await page.getByLabel('Name of the operator').fill('Tidewater Hire');
    await page.getByLabel('Name of the dock').fill('Cedar Point');
    await page.getByLabel('Time zone').selectOption('America/New_York');
    await page.getByLabel('Your name').fill(manager.name);
    await page.getByLabel('E-mail address').fill(manager.email);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await page.getByRole('button', { name: 'Set up and sign in' }).click();
    await expect(page.getByLabel('Set-up token')).toHaveAccessibleDescription(
      /not the token printed at start/,
    );
    await expect(page.getByLabel('Name of the dock')).toHaveValue('Cedar Point');
    await expectAccessible(page);
    expect(await empty.database.db.selectFrom('dock').select('id').execute()).toEqual([]);
  });

  await test.step('the right one signs the manager in to a product that says what comes first', async () => {
    await page.getByLabel('Set-up token').fill(SETUP_TOKEN);
    await page.getByRole('button', { name: 'Set up and sign in' }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'Availability' })).toBeVisible();
    await expect(page.getByText('No unit yet')).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('availability leads to the first unit, and that to its model', async () => {
    await page.getByRole('link', { name: 'Add a unit' }).click();
    await page.getByRole('link', { name: 'Add a model' }).click();
    await page.getByLabel('Name').fill('Twin 800');
    await page.getByRole('radio', { name: 'Two-stroke' }).check();
    await page.getByLabel('Cylinders').fill('2');
    await page.getByLabel('Carburettors').fill('2');
    await page.getByRole('button', { name: 'Add the model' }).click();
    await expect(page.getByRole('link', { name: 'Twin 800', exact: true })).toBeVisible();
    await page.getByRole('link', { name: 'Board', exact: true }).click();
    await expect(page.getByText('No unit at Cedar Point yet')).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('link', { name: 'Add a unit' }).click();
    await page.getByLabel('Fleet number').fill('JS-07');
    await page.getByLabel('Meter now').fill('12.4');
    await page.getByRole('button', { name: 'Add the unit' }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'JS-07' })).toBeVisible();
  });

  await test.step('a unit without a rule leads to the first rule', async () => {
    await expect(page.getByText('No rule is for this unit')).toBeVisible();
    await page.getByRole('link', { name: 'See the rules' }).click();
    await page.getByRole('link', { name: 'Write a rule' }).first().click();
    await page.getByLabel('Name').fill('Carburettor rebuild');
    await page.getByLabel('Every (h)').fill('50');
    await page.getByRole('button', { name: 'Save the rule' }).click();
    await expect(page.getByText('“Carburettor rebuild” is saved for 1 unit.')).toBeVisible();
    await page.getByRole('link', { name: 'Availability', exact: true }).click();
    // 50 h after 0, of which 12.4 h are run.
    await expect(page.getByText(/37\.6 h/).first()).toBeVisible();
    await expect(page.getByRole('heading', { name: 'Ready 1' })).toBeVisible();
  });

  await test.step('there is no second set-up', async () => {
    const other = await openPage(browser, empty, 360);
    await other.goto('/setup');
    await expect(other.getByRole('heading', { name: 'Sign in to Tidewater Hire' })).toBeVisible();
    await expectAccessible(other);
  });
});

test('somebody invited chooses a password by the letter, and a new one when it is forgotten', async ({
  browser,
  empty,
}) => {
  const { database, mailbox } = empty;
  await setUp(asSystem(database.db, new Date()), {
    operatorName: 'Tidewater Hire',
    dock: { name: 'Cedar Point', timeZone: 'America/New_York' },
    manager,
  });
  const ada = 'ada@wakewright.example';
  const office = await openPage(browser, empty, 1280);
  const phone = await openPage(browser, empty, 360);

  await test.step('the manager invites a dock hand', async () => {
    await office.goto('/people');
    await sendSignIn(office, manager.email, PASSWORD);
    await office.getByRole('button', { name: 'Invite somebody' }).click();
    await office.getByLabel('Name').fill('Ada Reef');
    await office.getByLabel('E-mail address').fill(ada);
    await expectAccessible(office);
    await office.getByRole('button', { name: 'Send the invitation' }).click();
    await expect(office.getByText(`The invitation to ${ada} is on its way.`)).toBeVisible();
    await expect(office.getByRole('table', { name: 'Open invitations' })).toContainText('Ada Reef');
  });

  await test.step('the link of the letter leads to the board, once', async () => {
    await followLetter(phone, mailbox, 'Invitation to Tidewater Hire on Wakewright', ada);
    await expect(phone.getByRole('heading', { name: 'Welcome to Tidewater Hire' })).toBeVisible();
    await expectAccessible(phone);
    const link = phone.url();
    await phone.getByLabel('Password', { exact: true }).fill('short');
    await phone.getByRole('button', { name: 'Accept and sign in' }).click();
    await expect(phone.getByLabel('Password', { exact: true })).toHaveAttribute('aria-invalid', 'true');
    await phone.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await phone.getByRole('button', { name: 'Accept and sign in' }).click();
    await expect(phone.getByText('No unit at Cedar Point yet')).toBeVisible();
    await expect(phone.getByText('A manager adds the first one.')).toBeVisible();
    const again = await openPage(browser, empty, 360);
    await again.goto(link);
    await expect(again.getByText('This invitation works no more')).toBeVisible();
    await office.reload();
    await expect(office.getByText('Nobody is invited at present.')).toBeVisible();
    await expect(office.getByRole('table', { name: 'People' })).toContainText('Ada Reef');
  });

  await test.step('a forgotten password is replaced by a letter’s link, and every session ends', async () => {
    const home = await openPage(browser, empty, 360);
    await home.goto('/sign-in');
    await home.getByRole('link', { name: 'Forgot your password?' }).click();
    await expect(home.getByRole('heading', { name: 'Forgot your password?' })).toBeVisible();
    await home.getByLabel('E-mail address').fill(ada);
    await home.getByRole('button', { name: 'Send me a link' }).click();
    await expect(home.getByText('Look into your mail')).toBeVisible();
    await expectAccessible(home);
    await followLetter(home, mailbox, 'Choose a new password for Wakewright', ada);
    await expectAccessible(home);
    const link = home.url();
    await home.getByLabel('New password').fill(NEW_PASSWORD);
    await home.getByRole('button', { name: 'Change the password' }).click();
    await expect(home.getByText('Your password is changed. Sign in with the new one.')).toBeVisible();
    await sendSignIn(home, ada, PASSWORD);
    await expect(home.getByRole('alert').filter({ hasText: /password/i })).toBeVisible();
    await sendSignIn(home, ada, NEW_PASSWORD);
    await expect(home.getByText('No unit at Cedar Point yet')).toBeVisible();
    await phone.goto('/board');
    await expect(phone.getByRole('heading', { name: 'Sign in to Tidewater Hire' })).toBeVisible();
    await phone.goto(link);
    await expect(phone.getByText('This link works no more')).toBeVisible();
  });

  await test.step('an address that nobody has is answered alike, and sent nothing', async () => {
    mailbox.clear();
    const stranger = await openPage(browser, empty, 360);
    await stranger.goto('/forgot');
    await stranger.getByLabel('E-mail address').fill('nobody@wakewright.example');
    await stranger.getByRole('button', { name: 'Send me a link' }).click();
    await expect(stranger.getByText('Look into your mail')).toBeVisible();
    expect(
      await database.db
        .selectFrom('mail')
        .where('recipient', '=', 'nobody@wakewright.example')
        .select('id')
        .execute(),
    ).toEqual([]);
  });
});
