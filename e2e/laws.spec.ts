import { expect, type Page, test } from '@playwright/test';
import { cell, downloaded, openDemo, pasteBlock, pickFile, verdict } from './support.ts';

const answer = (page: Page, storey: number, what: string) =>
  page.getByRole('gridcell', { name: new RegExp(`^Storey ${storey}, ${what}`) });
const panel = (page: Page) => page.getByRole('dialog', { name: /^Law of storey/ });
/** Marks of the storeys in the drawn frame, from the ground up: 0 none, 1 yielded, 2 past yield. */
const marks = (page: Page) =>
  page.locator('.dots').evaluateAll((dots) => dots.map((dot) => dot.getAttribute('data-mark')));

/** The example with all its storeys elastic, by the panel of one law and the keys. */
async function makeElastic(page: Page): Promise<void> {
  await cell(page, 2, 'law').click();
  await panel(page)
    .getByRole('radio', { name: /^Elastic/ })
    .click();
  await panel(page)
    .getByRole('radio', { name: /^all 8/ })
    .click();
  await page.keyboard.press('Escape');
  await expect(answer(page, 2, 'ductility')).toHaveCount(0);
}

test('a storey made to yield by a typed strength: ductility, residual drift and a mark; one step of undo', async ({
  page,
}) => {
  await openDemo(page);
  await makeElastic(page);
  await expect(cell(page, 2, 'strength')).toHaveText('none');
  expect(await marks(page)).toEqual(Array(8).fill('0'));
  await cell(page, 2, 'hardening').focus();
  await cell(page, 2, 'strength').click();
  await page.keyboard.type('9000');
  await expect(page.locator('.cell-line')).toContainText(/makes it bilinear.*yields at 19\.8 mm, 0\.47 %/);
  await page.keyboard.press('Enter');
  await expect(cell(page, 2, 'law')).toHaveAccessibleName(/bilinear/);
  await expect(answer(page, 2, 'ductility')).toHaveText(/^[1-9]\d*\.\d$/);
  await expect(answer(page, 1, 'ductility')).toHaveText('none');
  await expect(answer(page, 2, 'residual')).toHaveText(/^\d\.\d\d$/);
  // At the end of the run it has yielded and is not past yield any more, or still is: marked either way.
  await page.getByRole('slider', { name: /^Time cursor/ }).focus();
  await page.keyboard.press('End');
  await expect.poll(async () => (await marks(page))[1]).toMatch(/[12]/);
  expect((await marks(page))[0]).toBe('0');
  await page.keyboard.press('Home');
  await expect.poll(async () => (await marks(page))[1]).toBe('0');
  await page.keyboard.press('Control+Z');
  await expect(cell(page, 2, 'strength')).toHaveText('none');
  await expect(cell(page, 2, 'law')).toHaveAccessibleName(/elastic/);
});

test('a law by keys alone: chosen, typed, the same for all, drawn, faults at the input', async ({ page }) => {
  await openDemo(page);
  await page.keyboard.press('ArrowRight');
  await expect(cell(page, 2, 'law')).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(panel(page).getByRole('radio', { name: /^Peak-oriented/ })).toBeFocused();
  const drawing = panel(page).getByRole('img', { name: /^Force and drift/ });
  await expect(drawing).toHaveAccessibleName(/peak-oriented/);
  await page.keyboard.press('ArrowDown');
  await expect(drawing).toHaveAccessibleName(/bouc-wen/);
  await page.keyboard.press('Tab');
  await expect(panel(page).getByRole('textbox', { name: /Strength/ })).toBeFocused();
  await page.keyboard.type('-5');
  await expect(panel(page)).toContainText(/must be above 0|more than 0|> 0/);
  await expect(verdict(page)).toHaveText(/^Out of date/);
  await page.keyboard.press('Escape');
  await expect(panel(page)).toBeVisible();
  await expect(verdict(page)).not.toHaveText(/^Out of date/);
  for (let i = 0; i < 3; i++) await page.keyboard.press('Tab');
  await expect(panel(page).getByRole('textbox', { name: /beta/ })).toBeFocused();
  await page.keyboard.type('0.8');
  await page.keyboard.press('Enter');
  await expect(panel(page).getByRole('textbox', { name: /gamma/ })).toHaveValue('0.20');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Tab');
  await page.keyboard.press('ArrowRight');
  await expect(cell(page, 8, 'law')).toHaveAccessibleName(/bouc-wen/);
  await expect(cell(page, 8, 'strength')).toContainText(/2\s?900/);
  await page.keyboard.press('Escape');
  await expect(cell(page, 2, 'law')).toBeFocused();
  await page.keyboard.press('Control+Z');
  await expect(cell(page, 8, 'law')).toHaveAccessibleName(/peak-oriented/);
});

test('laws, strengths and hardening are pasted, filled down and copied like any column', async ({ page }) => {
  await openDemo(page);
  await cell(page, 3, 'law').focus();
  await cell(page, 3, 'strength').click();
  await pasteBlock(page, [
    [8100, 4],
    [8800, 2],
  ]);
  await expect(cell(page, 2, 'strength')).toContainText(/8\s?800/);
  await expect(cell(page, 3, 'hardening')).toHaveText('4');
  await cell(page, 3, 'strength').click();
  await page.keyboard.press('ArrowLeft');
  await expect(cell(page, 3, 'law')).toBeFocused();
  await pasteBlock(page, [['flag', 8200, 5]]);
  await expect(cell(page, 3, 'law')).toHaveAccessibleName(/flag/);
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Control+D');
  await expect(cell(page, 2, 'law')).toHaveAccessibleName(/flag/);
  await expect(cell(page, 2, 'strength')).toContainText(/8\s?800/);
  await page.keyboard.press('Control+C');
  const copied = await page.evaluate(() => navigator.clipboard.readText());
  expect(copied).toBe('flag\nflag');
  await cell(page, 1, 'strength').click();
  await page.keyboard.press('ArrowLeft');
  await pasteBlock(page, [['plastic']]);
  await expect(page.getByRole('dialog', { name: /not pasted/ })).toContainText('no law');
});

test('a collapse is named with storey and time; its three mends', async ({ page }) => {
  await openDemo(page);
  await cell(page, 8, 'strength').click();
  await pasteBlock(
    page,
    [1000, 1600, 2000, 2400, 2700, 3000, 3200, 3300].map((strength) => [strength, 0]),
  );
  await expect(verdict(page)).toHaveText(/did not finish/);
  await expect(page.locator('.verdict .detail')).toHaveText(
    /^storey \d lost its stability at \d+\.\d\d s, drift \d+\.\d %$/,
  );
  await expect(page.getByRole('rowheader', { name: /unstable in [A-G]/ })).toHaveCount(1);
  await expect(answer(page, 5, 'no answer')).toHaveText('none');
  const show = page.getByRole('button', { name: /^Show [A-G] at/ });
  const time = /at (\d+\.\d\d) s/.exec((await show.textContent()) ?? '')?.[1] ?? '';
  await show.click();
  await expect(page.getByRole('slider', { name: /^Time cursor/ })).toHaveAttribute('aria-valuetext', new RegExp(time));
  await expect(page.getByRole('button', { name: /^step 0\.005 s/ })).toBeVisible();
  await page.getByRole('button', { name: /^Halve the step/ }).click();
  await expect(page.getByRole('button', { name: /^step 0\.0025 s/ })).toBeVisible();
  await expect(verdict(page)).toHaveText(/did not finish/);
  const leave = page.getByRole('button', { name: /^Leave [A-G] out$/ });
  const letter = /Leave ([A-G])/.exec((await leave.textContent()) ?? '')?.[1];
  await leave.click();
  const reason = page.getByRole('textbox', { name: /Why . is left out/ });
  await expect(reason).toBeFocused();
  await expect(reason).toHaveValue('');
  await page.keyboard.press('Enter');
  await expect(reason).toBeVisible();
  await reason.fill('its site is another');
  await page.keyboard.press('Enter');
  await expect(reason).toHaveCount(0);
  await expect(page.locator('[role="grid"] :focus')).toHaveCount(1);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: /^Motions/ })).toContainText('1 left out');
  await expect(page.getByRole('button', { name: `Leave ${letter} out` })).toHaveCount(0);
  await page.keyboard.press('Control+Shift+Digit2');
  await expect(page.getByRole('textbox', { name: /left out/ })).toHaveValue('its site is another');
});

test('an isolator under the frame: by the panel, named, with a limit of its own', async ({ page }) => {
  await openDemo(page);
  await cell(page, 1, 'law').click();
  const box = panel(page).getByRole('checkbox', { name: 'Isolator' });
  await box.check();
  await page.keyboard.press('Control+Z');
  await expect(box).not.toBeChecked();
  await box.check();
  await expect(page.getByRole('rowheader', { name: /isolator/ })).toHaveCount(1);
  await panel(page)
    .getByRole('textbox', { name: /isolator displacement/ })
    .fill('80');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Escape');
  await expect(answer(page, 1, 'isolator')).toHaveAccessibleName(
    /displacement \d+ mm, limit 80 mm, \d\.\d\d of its limit/,
  );
  await expect(page.getByRole('img', { name: /^Peak drift ratio/ })).toContainText(/limit 80 mm/);
  await cell(page, 1, 'height').click();
  await page.keyboard.press('Alt+ArrowDown');
  await expect(page.getByRole('rowheader')).toHaveCount(9);
  await expect(page.getByRole('rowheader', { name: /^1.*isolator/ })).toHaveCount(1);
  await cell(page, 1, 'height').click();
  await page.keyboard.press('Alt+Shift+ArrowUp');
  await expect(page.getByText('The isolator stays on the ground')).toBeVisible();
  await expect(page.getByRole('rowheader', { name: /^1.*isolator/ })).toHaveCount(1);
  // A panel that faults make taller stays in the window with all of its controls; it names the source of the law.
  await cell(page, 1, 'law').click();
  await panel(page)
    .getByRole('radio', { name: /^Bouc-Wen/ })
    .click();
  await expect(panel(page)).toContainText('Wen (1976)');
  await panel(page)
    .getByRole('textbox', { name: /Hardening/ })
    .fill('100');
  await page.keyboard.press('Enter');
  await expect(panel(page)).toContainText('is 100 %, must be below 100 %');
  await panel(page).getByRole('textbox', { name: /gamma/ }).fill('0.7');
  await expect(panel(page)).toContainText('must be at most 0.5');
  await expect(page.getByRole('button', { name: /^2 things to settle, first: storey 1, hardening/ })).toBeVisible();
  await expect
    .poll(async () => {
      const box = await panel(page).boundingBox();
      return box === null ? Number.NaN : box.y + box.height;
    })
    .toBeLessThanOrEqual(1000);
});

test('a storey unstable under gravity is refused at its cell', async ({ page }) => {
  await openDemo(page);
  await cell(page, 1, 'stiffness').click();
  await page.keyboard.type('2');
  await expect(page.locator('.cell-line')).toContainText('unstable under gravity');
  await expect(verdict(page)).toHaveText(/^Out of date/);
  await page.keyboard.press('Escape');
  await expect(verdict(page)).toHaveText(/governs/);
  // A weight far above makes it unstable: marked where it was typed too, and the verdict is the way to the storey.
  await cell(page, 8, 'weight').click();
  await page.keyboard.type('9000000');
  await expect(cell(page, 1, 'stiffness')).toHaveAttribute('aria-invalid', 'true');
  await expect(page.getByRole('textbox', { name: 'Storey 8, weight' })).toHaveAttribute('aria-invalid', 'true');
  await expect(page.locator('.cell-line')).toContainText('storey 1 is unstable under gravity');
  await page.keyboard.press('Enter');
  const way = page.getByRole('button', { name: /^8 things to settle, first: storey 1 is unstable under gravity/ });
  await way.click();
  await expect(cell(page, 1, 'stiffness')).toBeFocused();
  await page.keyboard.press('Control+Z');
  await expect(verdict(page)).toHaveText(/governs/);
});

test('a frame of all laws is saved, reloaded and opened again: the same numbers', async ({ page }) => {
  /** The whole table of storeys under each motion, as the file that is taken away. */
  const table = async (): Promise<string> => {
    await page.getByRole('button', { name: 'Tables' }).click();
    const dialog = page.getByRole('dialog', { name: 'Tables' });
    await dialog.getByText('N, m, kg').click();
    await dialog.getByRole('navigation', { name: 'Tables' }).getByRole('button').nth(1).click();
    const button = dialog.getByRole('button', { name: /^Download storey-response-by-motion/ });
    await expect(button).toBeEnabled();
    const { text } = await downloaded(page, () => button.click());
    await page.keyboard.press('Escape');
    return text;
  };
  await openDemo(page);
  for (const [storey, law] of [
    [1, 'Bilinear'],
    [3, 'Bouc-Wen'],
    [4, 'Flag'],
    [8, 'Elastic'],
  ] as const) {
    await cell(page, storey, 'law').click();
    await panel(page)
      .getByRole('radio', { name: new RegExp(`^${law}`) })
      .click();
    await page.keyboard.press('Escape');
  }
  await expect(cell(page, 4, 'law')).toHaveAccessibleName(/flag/i);
  await expect(verdict(page)).toHaveText(/^Storey \d+ governs/);
  await expect(answer(page, 8, 'ductility')).toHaveText('none');
  const [shown, numbers] = [await verdict(page).textContent(), await table()];
  expect(numbers).toMatch(/ductility/i);
  const project = await downloaded(page, () => page.getByRole('button', { name: 'Save the project file' }).click());

  await page.reload();
  await expect(verdict(page)).toHaveText(shown ?? '');
  expect(await table()).toBe(numbers);

  await page.getByRole('button', { name: 'New project' }).click();
  await expect(verdict(page)).not.toHaveText(/governs/);
  const file = { name: project.name, mimeType: 'application/json', buffer: Buffer.from(project.text) };
  await pickFile(page, () => page.getByRole('button', { name: /^Open/ }).first().click(), file);
  await expect(verdict(page)).toHaveText(shown ?? '');
  expect(await table()).toBe(numbers);
});
