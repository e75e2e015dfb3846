import { existsSync, readFileSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';

interface TextFile {
  readonly name: string;
  readonly mimeType: string;
  readonly buffer: Buffer;
}

function fileOf(name: string, content: string | Buffer): TextFile {
  return { name, mimeType: 'text/plain', buffer: Buffer.from(content) };
}

/** A decaying sine as rows of five values [g] under a heading that says interval, unit and count. */
function headed(name: string, count: number, interval = '0.02'): TextFile {
  const values = sine(count).map((value) => value.toFixed(4).padStart(10));
  const rows = Array.from({ length: Math.ceil(count / 5) }, (_, i) => values.slice(5 * i, 5 * i + 5).join(''));
  return fileOf(name, [`Test slab, interval ${interval} s, unit (g), ${count} values`, ...rows, ''].join('\n'));
}

function sine(count: number): number[] {
  return Array.from(
    { length: count },
    (_, i) => 0.2 * Math.sin(i / 5) * Math.exp(-(((i - count / 3) / (count / 6)) ** 2)),
  );
}

const dialog = (page: Page) => page.getByRole('dialog', { name: 'Add records' });
const files = (page: Page) => dialog(page).getByRole('navigation', { name: 'Files' });
const row = (page: Page, name: string) =>
  dialog(page)
    .locator('dl > div')
    .filter({ has: page.getByText(name, { exact: true }) });
const undo = (page: Page) => page.getByRole('button', { name: /^Undo/ });

async function open(page: Page): Promise<void> {
  await page.goto('/');
  await expect(page.getByRole('button', { name: 'Add records' }).first()).toBeVisible();
}

async function pick(page: Page, ...chosen: readonly TextFile[]): Promise<void> {
  if (!(await dialog(page).isVisible())) await page.getByRole('button', { name: 'Add records' }).first().click();
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    dialog(page)
      .getByRole('button', { name: /^(Choose files|More files)$/ })
      .click(),
  ]);
  await chooser.setFiles([...chosen]);
}

async function drop(page: Page, ...dropped: readonly TextFile[]): Promise<void> {
  const data = await page.evaluateHandle(
    (list) => {
      const transfer = new DataTransfer();
      for (const { name, text } of list) transfer.items.add(new File([text], name, { type: 'text/plain' }));
      return transfer;
    },
    dropped.map(({ name, buffer }) => ({ name, text: buffer.toString() })),
  );
  await page.locator('body').dispatchEvent('dragenter', { dataTransfer: data });
  await expect(page.getByText('Records and projects can be dropped anywhere')).toBeVisible();
  await page.locator('body').dispatchEvent('drop', { dataTransfer: data });
}

/** Names of the motions, as the motions screen lists them. */
async function motionNames(page: Page): Promise<string[]> {
  await page
    .getByRole('navigation', { name: 'Steps' })
    .getByRole('button', { name: /^Motions/ })
    .click();
  const names = page.getByRole('textbox', { name: /^Name of / });
  await expect(names.first()).toBeVisible();
  return names.evaluateAll((inputs) => inputs.map((input) => (input as HTMLInputElement).value));
}

test('a record comes in by the picker: what was read stands beside the file, adding is one undo step', async ({
  page,
}) => {
  await open(page);
  const before = await motionNames(page);
  await pick(page, headed('slab-090.txt', 401));
  await expect(dialog(page).getByText('Test slab, interval 0.02 s')).toBeVisible();
  await expect(dialog(page).getByLabel('Interval, s')).toHaveValue('0.02');
  await expect(dialog(page).getByLabel('Unit', { exact: true })).toHaveValue('g');
  await expect(row(page, 'Samples')).toContainText('401');
  await expect(row(page, 'Samples')).toContainText('8.00 s');
  await expect(row(page, 'Peak')).toContainText('0.20 g');
  await dialog(page).getByRole('button', { name: 'Add 1 record' }).click();
  await expect(dialog(page)).toBeHidden();
  expect(await motionNames(page)).toEqual([...before, 'Slab 090']);
  await undo(page).click();
  expect(await motionNames(page)).toEqual(before);
});

test('several records dropped on the page come in together, a taken name gets a number', async ({ page }) => {
  await open(page);
  const before = await motionNames(page);
  await drop(page, headed('slab.txt', 300), headed('slab.acc', 350), headed('roof.txt', 401));
  await expect(files(page).getByRole('listitem')).toHaveCount(3);
  await dialog(page).getByRole('button', { name: 'Add 3 records' }).click();
  await expect(dialog(page)).toBeHidden();
  expect(await motionNames(page)).toEqual([...before, 'Slab', 'Slab (2)', 'Roof']);
});

test('a value with a comma stops its file at its line; the mend reads on, the other file is not held up', async ({
  page,
}) => {
  await open(page);
  const before = await motionNames(page);
  const whole = headed('gannet-315.txt', 401);
  const text = whole.buffer.toString().split('\n');
  text[60] = text[60].replace('.', ',');
  await pick(page, headed('corran-045.txt', 401), fileOf('gannet-315.txt', text.join('\n')));
  await expect(files(page)).toContainText('stopped at line 61');
  await files(page)
    .getByRole('button', { name: /^gannet-315/ })
    .click();
  await expect(dialog(page).getByRole('alert')).toContainText('Line 61, value 1');
  await expect(dialog(page).getByRole('radio').first()).toBeChecked();
  await expect(dialog(page).getByRole('button', { name: 'Add the other one' })).toBeEnabled();
  await dialog(page).getByRole('button', { name: 'Mend and read on' }).click();
  await expect(files(page)).not.toContainText('stopped');
  await expect(dialog(page).getByRole('region', { name: 'Mends' })).toContainText('Line 61');
  await dialog(page).getByRole('button', { name: 'Add 2 records' }).click();
  await expect(dialog(page)).toBeHidden();
  expect(await motionNames(page)).toEqual([...before, 'Corran 045', 'Gannet 315']);
});

test('a typed value takes the place of a word among the figures', async ({ page }) => {
  await open(page);
  const text = headed('word.txt', 401).buffer.toString().split('\n');
  text[50] = text[50].replace(/\S+/, 'void');
  await pick(page, fileOf('word.txt', text.join('\n')));
  await dialog(page)
    .getByRole('radio', { name: /^Type the value/ })
    .check();
  await expect(dialog(page).getByRole('button', { name: 'Mend and read on' })).toBeDisabled();
  await dialog(page)
    .getByRole('textbox', { name: /^Type the value/ })
    .fill('0.0123');
  await dialog(page).getByRole('button', { name: 'Mend and read on' }).click();
  await expect(dialog(page).getByRole('region', { name: 'Mends' })).toContainText('void, taken as 0.0123');
  await expect(dialog(page).getByRole('button', { name: 'Add 1 record' })).toBeEnabled();
});

test('an interval typed against the file waits until the user says which of the two counts', async ({ page }) => {
  await open(page);
  await pick(page, headed('slab.txt', 401));
  const interval = dialog(page).getByLabel('Interval, s');
  const say = async (text: string) => {
    await interval.fill(text);
    await page.keyboard.press('Enter');
    await expect(dialog(page).getByRole('alert')).toContainText(`line 1 says 0.02 s, the answer is ${text} s`);
    await expect(dialog(page).getByRole('button', { name: /^Add/ })).toHaveCount(0);
  };
  await say('0.01');
  await dialog(page).getByRole('button', { name: 'Mend and read on' }).click();
  await expect(files(page)).toContainText('8.00 s');
  await expect(interval).toHaveValue('0.02');
  await say('0.005');
  await dialog(page)
    .getByRole('radio', { name: /^Take 0.005 s, as answered/ })
    .check();
  await dialog(page).getByRole('button', { name: 'Mend and read on' }).click();
  await expect(files(page)).toContainText('2.00 s');
  await expect(interval).toHaveValue('0.005');
});

test('interval and unit are answered before a bare column of values is added, all by keyboard', async ({ page }) => {
  await open(page);
  const before = await motionNames(page);
  const values = sine(500).map((value) => (981 * value).toFixed(3));
  await page.getByRole('button', { name: 'Add records' }).first().focus();
  await page.keyboard.press('Enter');
  await expect(dialog(page).getByRole('button', { name: 'Choose files' })).toBeFocused();
  await page.keyboard.press('Tab');
  await page.keyboard.press('Enter');
  await expect(dialog(page).getByRole('textbox')).toBeFocused();
  await page.keyboard.press('Escape');
  await dialog(page).getByRole('button', { name: 'Paste samples' }).focus();
  await page.keyboard.press('Enter');
  await expect(dialog(page).getByRole('textbox')).toBeFocused();
  await page.keyboard.insertText(values.join('\n'));
  await page.keyboard.press('Control+Enter');
  await expect(files(page)).toContainText('asks for its interval and unit');
  await expect(dialog(page).getByRole('button', { name: /^Add/ })).toBeDisabled();
  const interval = dialog(page).getByLabel('Interval, s');
  await reach(page, interval);
  await page.keyboard.type('0.01');
  await page.keyboard.press('Enter');
  await expect(files(page)).toContainText('asks for its unit');
  const unit = dialog(page).getByLabel('Unit', { exact: true });
  await reach(page, unit);
  await page.keyboard.type('cm');
  await expect(unit).toHaveValue('cm/s2');
  await expect(files(page)).toContainText('4.99 s');
  await page.keyboard.press('Control+Enter');
  await expect(dialog(page)).toBeHidden();
  expect(await motionNames(page)).toEqual([...before, 'Pasted samples']);
});

/** Walks by F6 and Tab until the control has the focus. */
async function reach(page: Page, control: ReturnType<Page['getByLabel']>): Promise<void> {
  const focused = () => control.evaluate((element) => element === document.activeElement);
  for (let step = 0; step < 40 && !(await focused()); step++) await page.keyboard.press(step < 1 ? 'F6' : 'Tab');
  await expect(control).toBeFocused();
}

test('cancelled, the document is as it was', async ({ page }) => {
  await open(page);
  const before = await motionNames(page);
  await pick(page, headed('slab.txt', 401));
  await expect(dialog(page).getByRole('button', { name: 'Add 1 record' })).toBeEnabled();
  await page.keyboard.press('Escape');
  await expect(dialog(page)).toBeHidden();
  await expect(undo(page)).toBeDisabled();
  expect(await motionNames(page)).toEqual(before);
  await pick(page, headed('other.txt', 401));
  await expect(files(page).getByRole('listitem')).toHaveCount(1);
});

test('files that hold no record say so and can only be left out', async ({ page }) => {
  await open(page);
  const bytes = Buffer.from(Array.from({ length: 4000 }, (_, i) => (i * 73 + (i >> 3)) % 256));
  await pick(page, fileOf('picture.png', bytes), fileOf('empty.txt', ''));
  await files(page)
    .getByRole('button', { name: /^picture/ })
    .click();
  await expect(dialog(page).getByRole('alert')).toBeVisible();
  await expect(dialog(page).getByRole('radio')).toHaveCount(1);
  await files(page)
    .getByRole('button', { name: /^empty/ })
    .click();
  await expect(dialog(page).getByRole('alert')).toContainText('empty');
  await dialog(page).getByRole('button', { name: 'Leave it out' }).click();
  await expect(files(page)).toContainText('left out');
  await expect(dialog(page).getByRole('button', { name: /^Add \d/ })).toHaveCount(0);
});

test('a project file dropped among records is left, with a word', async ({ page }) => {
  await open(page);
  await drop(page, headed('slab.txt', 401), fileOf('frame.swaybook.json', '{}'));
  await expect(files(page).getByRole('listitem')).toHaveCount(1);
  await expect(page.getByText('frame.swaybook.json: drop a project file alone to open it')).toBeAttached();
});

test('a million samples are read, shown thinned and added', async ({ page }) => {
  await open(page);
  const before = await motionNames(page);
  const values = sine(1_000_000).map((value) => value.toFixed(5));
  await pick(page, fileOf('long.txt', `interval 0.005 s, unit (g)\n${values.join('\n')}\n`));
  await expect(files(page)).toContainText(/1\s000\s000 samples/);
  await expect(dialog(page).getByText(/^\d+\s\d+ more lines$/)).toBeVisible();
  await dialog(page).getByRole('button', { name: 'Add 1 record' }).click();
  await expect(dialog(page)).toBeHidden();
  expect(await motionNames(page)).toEqual([...before, 'Long']);
});

test('no accessibility violation in any state of the dialog, light and dark', async ({ page }) => {
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await open(page);
  const check = async (state: string) => {
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.emulateMedia({ colorScheme });
      const { violations } = await new AxeBuilder({ page }).include('dialog').analyze();
      expect(violations.map(({ id, nodes }) => `${state}, ${colorScheme}: ${id} ${nodes[0].html}`)).toEqual([]);
    }
  };
  await page.getByRole('button', { name: 'Add records' }).first().click();
  await expect(dialog(page)).toBeVisible();
  await check('nothing yet');
  const text = headed('word.txt', 401).buffer.toString().split('\n');
  text[50] = text[50].replace(/\S+/, 'void');
  await pick(page, fileOf('word.txt', text.join('\n')), headed('slab.txt', 401), fileOf('bare.txt', '1\n2\n-1\n0\n'));
  await expect(files(page)).toContainText('asks for its interval and unit');
  await expect(dialog(page).getByRole('alert')).toBeVisible();
  await check('stopped');
  await files(page).getByRole('button', { name: /^slab/ }).click();
  await check('read');
  await files(page).getByRole('button', { name: /^bare/ }).click();
  await check('asks');
});

const REAL = new URL('../../shared/records/imperial-valley-1940-ns.txt', import.meta.url);

if (existsSync(REAL)) {
  test('the 1940 record: layout, interval, unit and peak as its heading and its figures say', async ({ page }) => {
    await open(page);
    const before = await motionNames(page);
    await pick(page, fileOf('imperial-valley-1940-ns.txt', readFileSync(REAL)));
    await expect(dialog(page).getByLabel('Interval, s')).toHaveValue('0.02');
    await expect(dialog(page).getByLabel('Unit', { exact: true })).toHaveValue('g');
    await expect(dialog(page).locator('mark')).toContainText(['1559 points', 'spacing of 0.02', 'g']);
    await expect(dialog(page).getByText('0.32 g', { exact: true }).first()).toBeVisible();
    await dialog(page).getByLabel('Name').fill('1940 NS');
    await page.keyboard.press('Control+Enter');
    await expect(dialog(page)).toBeHidden();
    expect(await motionNames(page)).toEqual([...before, '1940 NS']);
  });
}
