import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from '@playwright/test';
import { cautions, cell, downloaded, openDemo, pasteBlock, verdict } from './support.ts';

test('typing stiffness follows at once and makes the caution about the drift go away', async ({ page }) => {
  await openDemo(page);
  await expect(cautions(page)).toContainText('Limit exceeded: storey 2');
  await cell(page, 2, 'stiffness').click();
  const before = await verdict(page).textContent();
  await page.keyboard.type('520');
  await expect(verdict(page)).not.toHaveText(before ?? '');
  await expect(cautions(page)).not.toContainText('Limit exceeded: storey 2');
  await page.keyboard.press('Escape');
  await expect(verdict(page)).toHaveText(before ?? '');
  await page.keyboard.type('600');
  await page.keyboard.press('Enter');
  await expect(cautions(page)).not.toContainText('storey 2, 1.');
  await page.keyboard.press('Control+Z');
  await expect(verdict(page)).toHaveText(before ?? '');
});

test('a block of ten rows is pasted, asks for a taller frame, and is undone in one step', async ({ page }) => {
  await openDemo(page);
  await cell(page, 8, 'height').click();
  await pasteBlock(
    page,
    Array.from({ length: 10 }, (_, i) => [3.2, 5000 + 10 * i, 300 + 20 * i]),
  );
  await page.getByRole('button', { name: 'Make it 10 storeys' }).click();
  await expect(cell(page, 10, 'weight')).toContainText(/5\s?000/);
  await expect(cell(page, 1, 'stiffness')).toContainText('480');
  await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
  await page.keyboard.press('Control+Z');
  await expect(cell(page, 10, 'weight')).toHaveCount(0);
  await expect(cell(page, 8, 'weight')).toContainText(/5\s?350/);
});

test('a bad cell refuses the whole block and names itself; the document stays as it was', async ({ page }) => {
  await openDemo(page);
  await cell(page, 8, 'height').click();
  await pasteBlock(page, [
    [3.2, 5000],
    [3.3, 'heavy'],
  ]);
  await expect(page.getByRole('dialog')).toContainText('heavy');
  await page.keyboard.press('Escape');
  await expect(cell(page, 8, 'height')).toContainText('3.60');
});

test('unreadable and ambiguous texts stay in their cell, with words; no answer is shown as current meanwhile', async ({
  page,
}) => {
  await openDemo(page);
  await cell(page, 3, 'height').click();
  await page.keyboard.type('4 furlong');
  await expect(verdict(page)).toHaveText(/^Out of date/);
  await expect(page.locator('.cell-line')).toContainText('furlong');
  await page.keyboard.press('Escape');
  await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
  await page.keyboard.type('4,200');
  await expect(page.locator('.cell-line').getByRole('button', { name: /4\.2 m/ })).toBeVisible();
  await page
    .locator('.cell-line')
    .getByRole('button', { name: /^4\.2 m/ })
    .click();
  await expect(cell(page, 3, 'height')).toContainText('4.20');
  // A pasted column that can be read two ways: the key that is pressed next does nothing.
  await cell(page, 3, 'weight').click();
  await pasteBlock(page, [['1,000']]);
  const dialog = page.getByRole('dialog', { name: /How are the commas meant/ });
  await expect(dialog.getByRole('button', { name: 'Do not paste' })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(dialog).toBeHidden();
  await expect(cell(page, 3, 'weight')).not.toHaveText(/^1/);
});

test('zero, negative and absurd values are refused at the cell', async ({ page }) => {
  await openDemo(page);
  for (const column of ['height', 'weight', 'stiffness']) {
    await cell(page, 4, column).click();
    for (const text of ['0', '-3']) {
      await page.keyboard.type(text);
      await expect(verdict(page)).toHaveText(/^Out of date/);
      await page.keyboard.press('Escape');
      await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
    }
  }
});

test('the storey table that is taken away holds the numbers of the batch command', async ({ page }) => {
  await openDemo(page);
  const project = await downloaded(page, () => page.getByRole('button', { name: 'Save the project file' }).click());
  expect(project.name).toMatch(/\.swaybook\.json$/);
  await page.getByRole('button', { name: 'Tables' }).click();
  const dialog = page.getByRole('dialog', { name: 'Tables' });
  await dialog.getByText('N, m, kg').click();
  await expect(dialog.getByRole('button', { name: /^Download storey-response/ })).toBeEnabled();
  const suite = await downloaded(page, () => dialog.getByRole('button', { name: /^Download storey-response/ }).click());
  await dialog.getByRole('navigation', { name: 'Tables' }).getByRole('button').nth(1).click();
  const table = await downloaded(page, () =>
    dialog.getByRole('button', { name: /^Download storey-response-by-motion/ }).click(),
  );

  const folder = mkdtempSync(join(tmpdir(), 'swaybook-'));
  writeFileSync(join(folder, project.name), project.text);
  const out = join(folder, 'out');
  execFileSync('npm', ['run', '--silent', 'batch', '--', 'respond', join(folder, project.name), '--out', out]);
  const response = JSON.parse(readFileSync(join(out, 'response.json'), 'utf8'));
  const numbers = new Set(table.text.split(/[\r\n,]+/).map((text) => Number(text).toPrecision(8)));
  expect(response.runs.length).toBe(7);
  for (const run of response.runs) {
    for (const storey of run.storeys) {
      for (const key of ['peakDriftRatio', 'peakDrift', 'peakShear']) {
        expect(numbers.has(Number(storey[key]).toPrecision(8)), `${run.motion} ${key} ${storey[key]}`).toBe(true);
      }
    }
  }
  expect(readFileSync(join(out, 'storey-response-by-motion.csv'), 'utf8')).toBe(table.text);
  expect(readFileSync(join(out, 'storey-response.csv'), 'utf8')).toBe(suite.text);
  const means = new Set(suite.text.split(/[\r\n,]+/).map((text) => Number(text).toPrecision(8)));
  for (const { mean, ratio } of response.envelope.storeys) {
    for (const value of [mean, ratio]) expect(means.has(Number(value).toPrecision(8)), `suite ${value}`).toBe(true);
  }
});

test('a reload finds everything, a half-typed cell included', async ({ page }) => {
  await openDemo(page);
  await cell(page, 5, 'stiffness').click();
  await page.keyboard.type('512');
  await page.keyboard.press('Enter');
  await page.getByRole('rowheader', { name: /^6/ }).click();
  await page.keyboard.type('Maternity ward');
  await page.keyboard.press('Enter');
  await cell(page, 2, 'height').click();
  await page.keyboard.type('4.3');
  // The answer follows the typing, and what was typed is kept, a moment after it.
  await page.waitForTimeout(1000);
  await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
  const shown = await verdict(page).textContent();
  await page.reload();
  await expect(verdict(page)).toHaveText(shown ?? '');
  await expect(cell(page, 5, 'stiffness')).toContainText('512');
  await expect(page.getByRole('grid')).toContainText('Maternity ward');
  await expect(page.locator('input:focus, .editing input').first()).toHaveValue('4.3');
});

test('a broken project file lists all its faults and changes nothing', async ({ page }) => {
  await openDemo(page);
  const broken = JSON.stringify({
    format: 'swaybook',
    version: 1,
    title: 'x',
    frame: {
      storeys: [{ name: 'a', height: -1, mass: 0, stiffness: 1e8, law: { kind: 'elastic' }, colour: 'red' }],
      damping: { kind: 'none' },
      pDelta: false,
    },
    motions: [],
    analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.4 }, step: 0.01 },
    limits: { drift: 0.02, source: '' },
  });
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Open a project file' }).click(),
  ]);
  await chooser.setFiles({ name: 'broken.swaybook.json', mimeType: 'application/json', buffer: Buffer.from(broken) });
  const dialog = page.getByRole('dialog');
  for (const place of [/height/i, /weight|mass/i, /colour/, /gamma/i]) await expect(dialog).toContainText(place);
  await page.keyboard.press('Escape');
  await expect(verdict(page)).toHaveText(/^Storey 2 governs/);
});
