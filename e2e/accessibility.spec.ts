import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { cell, openDemo, pasteBlock, verdict } from './support.ts';

/** A frame so weak that motions do not finish. */
async function stopRun(page: Page): Promise<void> {
  await cell(page, 8, 'strength').click();
  await pasteBlock(
    page,
    [1000, 1600, 2000, 2400, 2700, 3000, 3200, 3300].map((strength) => [strength, 0]),
  );
  await expect(verdict(page)).toHaveText(/did not finish/);
}

/** Each screen and dialog, and how a person gets there from the sheet. */
const PLACES: readonly (readonly [string, (page: Page) => Promise<void>])[] = [
  ['sheet', async () => {}],
  ['motions', (page) => page.keyboard.press('Control+Shift+Digit2')],
  ['empty sheet', (page) => page.getByRole('button', { name: 'New project' }).click()],
  ['import dialog', (page) => page.getByRole('button', { name: 'Add records' }).first().click()],
  ['tables dialog', (page) => page.getByRole('button', { name: 'Tables' }).click()],
  ['keys dialog', (page) => page.getByRole('button', { name: 'Keys' }).click()],
  ['law panel', (page) => cell(page, 1, 'law').click()],
  ['stopped run', stopRun],
  ['evidence dialog', (page) => page.getByRole('button', { name: /^Evidence: / }).click()],
  [
    'schemes side by side',
    async (page) => {
      await page.getByRole('button', { name: /^Evidence: / }).click();
      await page.getByRole('button', { name: 'Compare schemes' }).click();
      await expect(page.getByText(/^\d+ of \d+ runs done/)).toBeVisible();
    },
  ],
  ['analysis dialog', (page) => page.getByRole('button', { name: /^step / }).click()],
];

test.describe.configure({ mode: 'parallel' });

for (const colorScheme of ['light', 'dark'] as const) {
  for (const [place, go] of PLACES) {
    test(`no accessibility violation: ${place}, ${colorScheme}`, async ({ browser, baseURL }) => {
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
      const axe = new AxeBuilder({ page });
      // The dark theme changes colours and nothing else.
      if (colorScheme === 'dark') axe.withRules(['color-contrast', 'link-in-text-block']);
      const { violations } = await axe.analyze();
      expect(violations.map(({ id, nodes }) => `${id} at ${nodes[0]?.target.join(' ')}`)).toEqual([]);
      await context.close();
    });
  }
}

test('no accessibility violation at 1024 px', async ({ page }) => {
  await page.setViewportSize({ width: 1024, height: 1000 });
  await openDemo(page);
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id} at ${nodes[0]?.target.join(' ')}`)).toEqual([]);
});
