import { expect, test } from '../support/e2e';

test('a page that does not exist says so in our own words', async ({ page }) => {
  const answer = await page.goto('/no-such-page');
  expect(answer?.status()).toBe(404);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
});
