import { expect, type Page, test } from '@playwright/test';
import { cell, openDemo, verdict } from './support.ts';

/** What the plot library has drawn, of all panels under the ground. */
const drawn = (page: Page) => page.locator('.plot .main-svg');

test('an empty sheet takes the curves of the other building away, axes and all', async ({ page }) => {
  await openDemo(page);
  await expect(page.getByRole('img', { name: /^Force and drift, storey/ }).locator('.main-svg')).not.toHaveCount(0);
  await expect(page.getByRole('img', { name: /^Energy/ }).locator('.main-svg')).not.toHaveCount(0);
  await page.getByRole('button', { name: 'New project' }).click();
  await page.getByRole('textbox', { name: /^Number of storeys/ }).fill('3');
  await page.keyboard.press('Enter');
  await expect(cell(page, 3, 'weight')).toBeVisible();
  await expect(drawn(page)).toHaveCount(0);
  await expect(page.locator('.loop-cursor')).toHaveCount(0);
});

test('what is out of date is grey, and drawn where it was', async ({ page }) => {
  await openDemo(page);
  const first = page
    .getByRole('img', { name: /^Drift ratio, %/ })
    .locator('.main-svg')
    .first();
  await expect(first).toBeVisible();
  const places = () =>
    page
      .locator('.time-plot .main-svg')
      .evaluateAll((all) => all.map((one) => `${getComputedStyle(one).position} ${one.getBoundingClientRect().y}`));
  await expect(page.locator('.time-plot .main-svg')).toHaveCount(9);
  const before = await places();
  await cell(page, 2, 'stiffness').click();
  await page.keyboard.type('abc');
  await expect(verdict(page)).toHaveText(/^Out of date/);
  expect(await places()).toEqual(before);
});
