import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { openDemo } from './support.ts';

/** Each screen and dialog, and how a person gets there from the sheet. */
const PLACES: readonly (readonly [string, (page: Page) => Promise<void>])[] = [
  ['sheet', async () => {}],
  ['motions', (page) => page.keyboard.press('Control+Shift+Digit2')],
  ['empty sheet', (page) => page.getByRole('button', { name: 'New project' }).click()],
  ['import dialog', (page) => page.getByRole('button', { name: 'Add records' }).first().click()],
  ['tables dialog', (page) => page.getByRole('button', { name: 'Tables' }).click()],
  ['keys dialog', (page) => page.getByRole('button', { name: 'Keys' }).click()],
  ['analysis dialog', (page) => page.getByRole('button', { name: /^step / }).click()],
];

for (const colorScheme of ['light', 'dark'] as const) {
  test(`no accessibility violation on any screen, ${colorScheme}`, async ({ browser, baseURL }) => {
    for (const [place, go] of PLACES) {
      const context = await browser.newContext({
        colorScheme,
        viewport: { width: 1600, height: 1000 },
        reducedMotion: 'reduce',
        baseURL,
      });
      const page = await context.newPage();
      await openDemo(page);
      await go(page);
      await page.waitForTimeout(800);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${place}: ${id} at ${nodes[0]?.target.join(' ')}`)).toEqual([]);
      await context.close();
    }
  });
}

test('no accessibility violation at 1024 px', async ({ page }) => {
  await page.setViewportSize({ width: 1024, height: 1000 });
  await openDemo(page);
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id} at ${nodes[0]?.target.join(' ')}`)).toEqual([]);
});
