import { expect, type Page, test } from '@playwright/test';
import { cautions, cell, openDemo } from './support.ts';

const evidenceLine = (page: Page) => page.getByRole('region', { name: 'Evidence', exact: true });
const openAnalysis = (page: Page) =>
  evidenceLine(page)
    .getByRole('button', { name: /^step / })
    .click();

test('the evidence says how good the numbers are, by motion and by mode', async ({ page }) => {
  await openDemo(page);
  await expect(evidenceLine(page)).toContainText('step error');
  await page.getByRole('button', { name: /^Evidence: / }).click();
  const dialog = page.getByRole('dialog', { name: 'How good are these numbers?' });
  await expect(dialog).toContainText(
    /Drifts are converged to 0\.\d %, storey shears to 0\.\d+ % and floor accelerations to 0\.\d %; energy balances to/,
  );
  await expect(dialog.getByRole('region', { name: 'Evidence by motion' }).getByRole('row')).toHaveCount(1 + 7);
  await expect(dialog.getByRole('region', { name: /each mode$/ }).getByRole('row')).toHaveCount(1 + 8);
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: /^Evidence: / })).toBeFocused();
});

test('a step that is too long is cautioned; by halving the tool finds one and says why', async ({ page }) => {
  await openDemo(page);
  await openAnalysis(page);
  await page.getByRole('radio', { name: 'Parts of each interval' }).click();
  await page.getByRole('textbox', { name: 'Parts of the interval' }).fill('1');
  await page.getByRole('button', { name: 'Close', exact: true }).last().click();
  await expect(evidenceLine(page)).toContainText('step 0.005 to 0.02 s, the interval');
  await expect(cautions(page)).toContainText('halve the step');
  await openAnalysis(page);
  await page.getByRole('radio', { name: 'By halving (auto)' }).click();
  await expect(page.getByText('the first with a step error under 1 %').first()).toBeVisible();
  await page.getByRole('button', { name: 'Close', exact: true }).last().click();
  await expect(evidenceLine(page)).toContainText(', by halving');
  await expect(cautions(page)).not.toContainText('halve the step');
});

test('schemes stand side by side, and one is taken into the analysis as one step', async ({ page }) => {
  await openDemo(page);
  await openAnalysis(page);
  await page.getByRole('button', { name: 'Compare schemes' }).click();
  const dialog = page.getByRole('dialog', { name: 'Compare schemes' });
  await expect(dialog.getByText(/^28 of 28 runs done/)).toBeVisible();
  await expect(dialog).toContainText('below zero: the scheme takes less than the physical damping');
  await dialog.getByRole('button', { name: /^Use this: generalized-α, spectral radius 0.8, step 0.01 s/ }).click();
  await expect(dialog.getByRole('button', { pressed: true })).toHaveText('in use');
  await page.keyboard.press('Escape');
  await expect(evidenceLine(page)).toContainText('generalized-α, spectral radius 0.8');
  await page.keyboard.press('Control+z');
  await expect(evidenceLine(page)).toContainText('Newmark, β ¼, γ ½');
  await expect(evidenceLine(page)).toContainText('step 0.005 s');
});

test('panels show the loop of a yielding storey, what each storey took out, and the damping of the modes', async ({
  page,
}) => {
  await openDemo(page);
  await cell(page, 2, 'height').click();
  await expect(page.getByText('first yield')).toBeVisible();
  const right = page.getByRole('button', { name: /: choose what is shown$/ }).last();
  for (const [choice, title] of [
    ['Damping by period', 'Damping ratio of each mode'],
    ['Ductility profile', 'Ductility over the height'],
    ['Energy by storey', /^Energy by storey, under /],
  ] as const) {
    await right.click();
    await page.getByRole('menuitemcheckbox', { name: choice }).click();
    await right.click();
    await page.getByRole('menuitem', { name: 'Show as table' }).click();
    await expect(page.getByRole('dialog', { name: title }).getByRole('row')).toHaveCount(1 + 8);
    await page.keyboard.press('Escape');
  }
});

test('a table that is wider than its place says so, until its end is in sight', async ({ page }) => {
  await openDemo(page);
  await page.getByRole('button', { name: 'Tables' }).click();
  const dialog = page.getByRole('dialog', { name: 'Tables' });
  const words = dialog.getByText('The table goes on sideways');
  const faded = (side: '::before' | '::after') =>
    dialog.locator('.sideways').evaluate((frame, pseudo) => getComputedStyle(frame, pseudo).opacity, side);
  const seen: boolean[] = [];
  await expect(dialog.locator('.table-view')).toBeVisible();
  const names = await dialog.getByRole('navigation', { name: 'Tables' }).getByRole('button').all();
  for (const name of names) {
    await name.click();
    const table = dialog.locator('.table-view');
    const wide = await table.evaluate(({ scrollWidth, clientWidth }) => scrollWidth > clientWidth + 1);
    await expect(words).toBeVisible({ visible: wide });
    seen.push(wide);
    if (!wide) continue;
    await expect.poll(() => faded('::after')).toBe('1');
    await table.evaluate((part) => part.scrollTo({ left: part.scrollWidth }));
    await expect.poll(() => faded('::after')).toBe('0');
    await expect.poll(() => faded('::before')).toBe('1');
  }
  expect(seen).toContain(true);
});
