import AxeBuilder from '@axe-core/playwright';
import { expect, type Browser, type Locator, type Page } from '@playwright/test';
import type { Role } from '@/lib/domain/access';
import { addSignIn, PASSWORD } from './crew';
import type { Running } from './e2e';
import { signIn } from './sign-in';

/** A page of a browser of its own that nobody is signed in with. */
export async function openPage(browser: Browser, { app }: Running, width: number): Promise<Page> {
  const context = await browser.newContext({ baseURL: app.baseUrl, viewport: { width, height: 800 } });
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  return page;
}

/** A page of somebody new of that role, signed in. */
export async function pageOf(browser: Browser, running: Running, role: Role, width = 360): Promise<Page> {
  const { app, database } = running;
  const email = await addSignIn(database.db, role);
  const cookie = await signIn(app.baseUrl, email, PASSWORD);
  const page = await openPage(browser, running, width);
  await page.context().addCookies(
    cookie.split('; ').map((pair) => {
      const at = pair.indexOf('=');
      return { name: pair.slice(0, at), value: pair.slice(at + 1), url: app.baseUrl };
    }),
  );
  return page;
}

/** Fills in the form of the sign-in page that is open, and sends it. */
export async function sendSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

/** Types a number on the dock's keypad. */
export async function typeHours(page: Page, number: string): Promise<void> {
  for (const key of number) {
    const name = key === '.' ? 'Decimal point' : key;
    await page.getByRole('button', { name, exact: true }).click();
  }
}

/** Presses Tab until what is wanted has the focus, as a hand without a mouse does. */
export async function tabTo(page: Page, wanted: Locator, atMost = 40): Promise<void> {
  for (let presses = 0; presses < atMost; presses += 1) {
    await page.keyboard.press('Tab');
    if (await wanted.evaluate((element) => element === document.activeElement)) return;
  }
  throw new Error(`${wanted.toString()} is not reached by ${atMost} presses of Tab`);
}

/** axe finds nothing on the page as it stands. */
export async function expectAccessible(page: Page): Promise<void> {
  // A new address draws its title a moment after its content.
  await expect(page).toHaveTitle(/\S/);
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' ')}`)).toEqual([]);
}
