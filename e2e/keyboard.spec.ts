import { expect, test } from '@playwright/test';
import { cautions, openDemo, verdict } from './support.ts';

test('the whole job by keyboard alone: new frame, typed rows, a record, a stiffer storey, tables', async ({ page }) => {
  await openDemo(page);
  const tabTo = async (name: RegExp) => {
    for (let i = 0; i < 80; i++) {
      await page.keyboard.press('Tab');
      const label = await page.evaluate(
        () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.textContent ?? '',
      );
      if (name.test(label)) return;
    }
    throw new Error(`no way to ${name} by Tab`);
  };
  // A new frame of three equal storeys.
  await tabTo(/^New project/);
  await page.keyboard.press('Enter');
  await tabTo(/^Number of storeys/);
  await page.keyboard.press('Control+A');
  await page.keyboard.type('3');
  await page.keyboard.press('Enter');
  // The sheet is one tab stop; it stands on the roof's weight now. Down each column.
  for (const weight of ['2000', '2200', '2400']) {
    await page.keyboard.type(weight);
    await page.keyboard.press('Enter');
  }
  await page.keyboard.press('Control+Home');
  for (let i = 0; i < 6 && !(await focused(page)).includes('stiffness'); i++) await page.keyboard.press('ArrowRight');
  expect(await focused(page)).toMatch(/^Storey 3, stiffness/);
  for (const stiffness of ['20', '25', '30']) {
    await page.keyboard.type(stiffness);
    await page.keyboard.press('Enter');
  }
  // A record, pasted as text.
  await tabTo(/^Add records/);
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Add records' });
  await expect(dialog).toBeVisible();
  await tabTo(/^Paste samples/);
  await page.keyboard.press('Enter');
  const text = dialog.getByRole('textbox').first();
  await expect(text).toBeFocused();
  const values = Array.from({ length: 300 }, (_, i) =>
    (0.3 * Math.sin(i / 6) * Math.exp(-(((i - 100) / 60) ** 2))).toFixed(4),
  );
  await page.keyboard.insertText(`interval 0.02 s, unit (g), 300 values\n${values.join('\n')}\n`);
  await page.keyboard.press('Control+Enter');
  await expect(dialog.getByRole('button', { name: /^Add 1 record/ })).toBeEnabled();
  await page.keyboard.press('Control+Enter');
  await expect(dialog).toBeHidden();
  expect(await focused(page)).toMatch(/^Storey \d/);
  await expect(verdict(page)).toHaveText(/^Storey \d governs/);
  // The cursor, play and pause, the motion's peak; then the tables.
  await tabTo(/^Time cursor|^Ground motion/);
  await page.keyboard.press('P');
  await page.keyboard.press('Space');
  await page.keyboard.press('Space');
  await expect(cautions(page)).toBeVisible();
  await tabTo(/^Tables/);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('dialog', { name: 'Tables' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('dialog', { name: 'Tables' })).toBeHidden();

  async function focused(on: typeof page): Promise<string> {
    return on.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? '');
  }
});
