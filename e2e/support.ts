import { readFileSync } from 'node:fs';
import { expect, type Page } from '@playwright/test';

/** Opens the app and waits until the demo is computed. */
export async function openDemo(page: Page): Promise<void> {
  await page.goto('/');
  await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
}

/** The sentence above the answers. */
export const verdict = (page: Page) => page.locator('.verdict .headline');

/** A cell of the sheet; storeys count from the ground, 1 first. */
export function cell(page: Page, storey: number, column: string) {
  return page.getByRole('gridcell', { name: new RegExp(`^Storey ${storey}, ${column}`) });
}

/** What a caution line says, all of them. */
export const cautions = (page: Page) => page.getByRole('region', { name: /cautions/i });

/** Puts a block on the clipboard as a spreadsheet does, and pastes it with the keys. */
export async function pasteBlock(page: Page, rows: readonly (readonly (string | number)[])[]): Promise<void> {
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.evaluate((text) => navigator.clipboard.writeText(text), rows.map((row) => row.join('\t')).join('\n'));
  await page.keyboard.press('Control+V');
}

/** Clicks what starts a download and gives its text. */
export async function downloaded(page: Page, start: () => Promise<void>): Promise<{ name: string; text: string }> {
  const [download] = await Promise.all([page.waitForEvent('download'), start()]);
  return { name: download.suggestedFilename(), text: readFileSync(await download.path(), 'utf8') };
}

/** Lets the picker take a file. */
export async function pickFile(
  page: Page,
  start: () => Promise<void>,
  file: string | { name: string; mimeType: string; buffer: Buffer },
): Promise<void> {
  const [chooser] = await Promise.all([page.waitForEvent('filechooser'), start()]);
  await chooser.setFiles(file);
}
