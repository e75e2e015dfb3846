import { expect, type Page, test } from '@playwright/test';

const cursor = (page: Page) => page.getByRole('slider', { name: 'Time cursor' });
const timeOf = async (page: Page) => Number(await cursor(page).getAttribute('aria-valuenow'));

test.beforeEach(async ({ page }) => {
  await page.goto('/');
  await expect(page.getByText(/^Storey \d+ governs: \d\.\d\d of the limit$/)).toBeVisible();
  await expect(page.getByRole('button', { name: /^Base shear, / })).toBeVisible();
});

test('the time cursor by pointer and by keyboard', async ({ page }) => {
  const box = await cursor(page).boundingBox();
  if (box === null) throw new Error('the time cursor has no place');
  const end = Number(await cursor(page).getAttribute('aria-valuemax'));

  await page.mouse.move(box.x + 0.2 * box.width, box.y + 60);
  await page.mouse.down();
  await page.mouse.move(box.x + 0.5 * box.width, box.y + 60, { steps: 4 });
  await page.mouse.up();
  await expect.poll(() => timeOf(page)).toBeCloseTo(0.5 * end, 1);

  await page.keyboard.press('Home');
  await expect.poll(() => timeOf(page)).toBe(0);
  await page.keyboard.press('P');
  await expect(page.getByText(/now, the peak$/)).toBeVisible();
  const peak = await timeOf(page);
  await page.keyboard.press('Shift+ArrowRight');
  await expect.poll(() => timeOf(page)).toBeGreaterThan(peak);

  await page.keyboard.press('Home');
  await page.keyboard.press('Space');
  await expect(page.getByRole('button', { name: 'Pause' })).toBeVisible();
  await expect.poll(() => timeOf(page)).toBeGreaterThan(0.3);
  await page.keyboard.press('Space');
  await expect(page.getByRole('button', { name: 'Play' })).toBeVisible();
});

test('panels change what they show and give their numbers', async ({ page }) => {
  await page.getByRole('button', { name: /^Energy, / }).click();
  await page.getByRole('menuitemcheckbox', { name: 'Floor acceleration' }).click();
  await expect(
    page.getByRole('img', { name: /^Floor acceleration, g, floor \d+, total, over time: peak/ }),
  ).toBeVisible();

  await page.getByRole('button', { name: /^Mode shapes/ }).click();
  await page.getByRole('menuitem', { name: 'Show as table' }).click();
  const table = page.getByRole('dialog', { name: 'Mode shapes, 1 at the roof' });
  await expect(table.getByRole('columnheader', { name: /^Mode 1, / })).toBeVisible();
  await expect(table.getByRole('row').nth(1).getByRole('cell').nth(2)).toHaveText('1.000');
  await page.keyboard.press('Escape');
  await expect(table).toBeHidden();
});

test('the analysis dialog says what a scheme brings, and undo takes it back', async ({ page }) => {
  const dialog = page.getByRole('dialog', { name: 'Analysis' });
  for (const [choice, section] of [
    [/^P-Delta/, 'P-Delta'],
    [/^step /, 'Step'],
    [/^Rayleigh/, 'Damping'],
  ] as const) {
    await page.locator('.foot.evidence').getByRole('button', { name: choice }).click();
    await expect(dialog.getByRole('region', { name: section }).locator(':focus')).toBeInViewport({ ratio: 1 });
    await page.keyboard.press('Escape');
  }
  await page.getByRole('button', { name: /^Newmark/ }).click();
  await expect(dialog.getByText('stable at any step')).toBeVisible();
  await dialog.getByLabel('Scheme').selectOption('Central difference');
  await expect(dialog.getByText(/^stable up to a step of 0\.\d+ s for this frame$/)).toBeVisible();
  await dialog.getByLabel('Scheme').selectOption('Generalized-α');
  await dialog.getByLabel('Spectral radius').fill('0.5');
  await expect(dialog.getByText('the highest modes keep 0.50 of their amplitude a step')).toBeVisible();
  await dialog.getByLabel('Spectral radius').fill('2');
  await expect(dialog.getByLabel('Spectral radius')).toHaveAttribute('aria-invalid', 'true');
  await dialog.getByLabel('Spectral radius').press('Escape');
  await dialog.getByRole('button', { name: 'Close' }).last().click();
  await expect(page.getByRole('button', { name: /^generalized-α/ })).toBeVisible();
  await page.keyboard.press('Control+z');
  await page.keyboard.press('Control+z');
  await expect(page.getByRole('button', { name: /^Newmark/ })).toBeVisible();
});

test('a motion left out asks for its reason, and the suite says so', async ({ page }) => {
  await page.getByRole('button', { name: /^Motions/ }).click();
  const boxes = page.getByRole('checkbox', { name: /^Use / });
  await expect(boxes.first()).toBeVisible();
  const count = await boxes.count();
  await boxes.nth(1).uncheck();
  await page.keyboard.type('recorded on soft soil');
  await page.keyboard.press('Enter');
  await expect(page.getByText(`${count - 1} records in use, 1 left out`)).toBeVisible();
  await page.getByRole('button', { name: /^Response/ }).click();
  await expect(page.getByText(new RegExp(`${count - 1} of ${count} motions`)).first()).toBeVisible();
  await page.getByRole('button', { name: /^Bring . back$/ }).click();
  await expect(page.getByText(new RegExp(`${count - 1} of ${count} motions`))).toHaveCount(0);
  await expect(page.locator('[role="grid"] :focus')).toHaveCount(1);
});
