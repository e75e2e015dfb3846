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
  const colours = (selector: string, property: 'color' | 'stroke' | 'fill') =>
    page
      .locator(selector)
      .evaluateAll((all, name) => [...new Set(all.map((one) => getComputedStyle(one)[name]))], property);
  const grey = [
    await page.evaluate(() => getComputedStyle(document.querySelector('.verdict .headline') as Element).color),
  ];
  expect(await colours('.time-label .now, .time-label.old p', 'color')).toEqual(grey);
  expect(await colours('.loop-cursor > path', 'stroke')).toEqual(grey);
  expect(await colours('.loop-cursor > :is(circle, text)', 'fill')).toEqual(grey);
  expect(await colours('.foot .caution, .foot .facts b', 'color')).toEqual(grey);
  expect(await colours('.foot.cautions .facts svg path', 'stroke')).toEqual(grey);
  await expect(page.locator('.foot.cautions')).toContainText('as of the last finished run');
  await expect(page.locator('.foot.evidence .as-of')).toBeInViewport({ ratio: 1 });
});

test('the cursor goes over the loop of its own storey only', async ({ page }) => {
  await openDemo(page);
  await expect(page.locator('.loop-cursor')).toBeVisible();
  await page.evaluate(() => {
    const seen: number[] = [];
    Object.assign(window, { seen });
    const box = (selector: string) => document.querySelector(selector)?.getBoundingClientRect();
    const look = () => {
      const plot = document.querySelector('.square .plot');
      const [grey, ink] = [box('.square .scatterlayer path.js-line'), box('.loop-cursor > path')];
      const shown = plot !== null && getComputedStyle(plot).visibility === 'visible';
      if (grey && ink && shown) seen.push(Math.max(Math.abs(grey.top - ink.top), Math.abs(grey.left - ink.left)));
      else if (ink) seen.push(Number.POSITIVE_INFINITY);
      requestAnimationFrame(look);
    };
    look();
  });
  for (const storey of [6, 2, 8]) {
    await cell(page, storey, 'weight').click();
    await expect(page.getByRole('img', { name: new RegExp(`^Force and drift, storey ${storey} `) })).toBeVisible();
    await expect(page.locator('.loop-cursor')).toBeVisible();
  }
  const seen = await page.evaluate(() => (window as unknown as { seen: number[] }).seen);
  expect(seen.length).toBeGreaterThan(10);
  // The grey line and that of the cursor are thinned alike: they lie on each other.
  expect(Math.max(...seen)).toBeLessThan(2);
});
