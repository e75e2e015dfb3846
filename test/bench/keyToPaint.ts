import { type ChildProcess, spawn } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { chromium, type Page } from '@playwright/test';
import { findChromium } from '../../.ci/browser.mjs';
import { CHROMIUM_ARGS } from './browser.ts';
import { suiteFile } from './suite.ts';

const PORT = 4719;
const CACHE = '.cache/bench';

declare global {
  interface Window {
    bench: { key: number; waits: number[]; longTasks: { start: number; length: number }[] };
  }
}

/**
 * From the keydown's own time stamp to after the frame in which the drift bars carry the new answer, in the built page with the
 * real engine; and the tasks over 50 ms on the page's thread while typing, playing and importing a million samples.
 */
export async function benchPage(): Promise<void> {
  mkdirSync(CACHE, { recursive: true });
  const server = spawn('npx', ['vite', 'preview', '--port', String(PORT), '--strictPort'], {
    stdio: 'ignore',
    detached: true,
  });
  const browser = await chromium.launch({ executablePath: (await findChromium()) ?? undefined, args: CHROMIUM_ARGS });
  try {
    for (const [storeys, motions, yields] of [
      [20, 11, false],
      [20, 11, true],
      [60, 44, false],
    ] as const) {
      const page = await opened(
        await browser.newContext({ viewport: { width: 1600, height: 1000 } }).then((c) => c.newPage()),
        storeys,
        motions,
        yields,
      );
      const waits = await typeKeys(page, Math.floor(storeys / 2));
      const tasks = await page.evaluate(() => window.bench.longTasks.splice(0).map(({ length }) => Math.round(length)));
      console.log(
        `  ${storeys} ${yields ? 'yielding ' : ''}storeys, ${motions} motions: median ${at(waits, 0.5)} ms, 95th percentile ${at(waits, 0.95)} ms over ${waits.length} keys; tasks over 50 ms while typing: ${listed(tasks)}`,
      );
      if (yields) await timeEvidence(page, Math.floor(storeys / 2));
      else if (storeys === 20) await playAndImport(page);
      await page.close();
    }
  } finally {
    await browser.close();
    stop(server);
  }
}

async function opened(page: Page, storeys: number, motions: number, yields: boolean): Promise<Page> {
  await page.addInitScript(() => {
    window.bench = { key: 0, waits: [], longTasks: [] };
    new PerformanceObserver((list) => {
      for (const entry of list.getEntries())
        window.bench.longTasks.push({ start: entry.startTime, length: entry.duration });
    }).observe({ entryTypes: ['longtask'] });
    addEventListener('keydown', (event) => (window.bench.key = event.timeStamp), { capture: true });
    new MutationObserver((changes) => {
      const { bench } = window;
      if (bench.key === 0) return;
      // A bar that was grey (a run that was slow) comes as a new element, one that was current gets another width. (No inner
      // function has a name here: the loader would wrap it in a helper that the page does not have.)
      const drawn = changes.flatMap(({ type, target, addedNodes }) =>
        type === 'attributes' ? [target] : [...addedNodes],
      );
      if (!drawn.some((node) => node instanceof Element && node.classList.contains('drift-bar'))) return;
      const started = bench.key;
      bench.key = 0;
      requestAnimationFrame(() => {
        const { port1, port2 } = new MessageChannel();
        port1.onmessage = () => bench.waits.push(performance.now() - started);
        port2.postMessage(null);
      });
    }).observe(document, { subtree: true, childList: true, attributes: true, attributeFilter: ['width'] });
  });
  for (let tries = 0; ; tries++) {
    try {
      await page.goto(`http://localhost:${PORT}/`);
      break;
    } catch (error) {
      if (tries > 50) throw error;
      await page.waitForTimeout(200);
    }
  }
  await page
    .getByText(/^Storey \d+ governs/)
    .first()
    .waitFor();
  const file = `${CACHE}/suite-${storeys}-${motions}${yields ? '-yielding' : ''}.swaybook.json`;
  writeFileSync(file, suiteFile(storeys, motions, yields));
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: /^open/i }).first().click();
  await (await chooser).setFiles(file);
  await page
    .getByText(new RegExp(`${storeys} storeys`))
    .first()
    .waitFor();
  await page.waitForTimeout(3000);
  await page.evaluate(() => window.bench.longTasks.splice(0));
  return page;
}

/** 20 keys to warm up, then 100: figures of random stiffness in a cell; a number's first key and its point are not counted. */
async function typeKeys(page: Page, storey: number): Promise<number[]> {
  await page
    .getByRole('row', { name: new RegExp(`storey ${storey}\\b`, 'i') })
    .getByRole('gridcell', { name: /stiffness/i })
    .click();
  let seed = 7;
  const figure = () => {
    seed = (Math.imul(seed, 1664525) + 1013904223) >>> 0;
    return String(1 + Math.floor((seed / 2 ** 32) * 9));
  };
  const waits: number[] = [];
  while (waits.length < 120) {
    await page.keyboard.press('Escape');
    for (const [i, key] of [figure(), figure(), figure(), '.', figure(), figure()].entries()) {
      const before = await page.evaluate(() => window.bench.waits.length);
      await page.keyboard.press(key);
      if (key === '.' || i === 0) {
        await page.waitForTimeout(400);
        await page.evaluate(() => {
          window.bench.key = 0;
        });
        continue;
      }
      await page.waitForFunction((count) => window.bench.waits.length > count, before, { timeout: 10_000 });
      waits.push(await page.evaluate(() => window.bench.waits[window.bench.waits.length - 1]));
      await page.waitForTimeout(150);
    }
  }
  await page.keyboard.press('Escape');
  return waits.slice(20, 120).sort((a, b) => a - b);
}

/** From the answer to one more key to the step errors of all motions in the foot. */
async function timeEvidence(page: Page, storey: number): Promise<void> {
  await page
    .getByRole('row', { name: new RegExp(`storey ${storey}\\b`, 'i') })
    .getByRole('gridcell', { name: /stiffness/i })
    .click();
  const waits: number[] = [];
  for (const figure of '6123456789') {
    await page.keyboard.press('Escape');
    await page.keyboard.press('5');
    await page.waitForTimeout(1500);
    await page.evaluate(() => window.bench.waits.splice(0));
    await page.keyboard.press(figure);
    await page.waitForFunction(() => window.bench.waits.length > 0);
    const started = Date.now();
    await page.getByText(/^step error/).waitFor();
    waits.push(Date.now() - started);
  }
  waits.sort((a, b) => a - b);
  console.log(
    `  evidence after the answer: median ${at(waits, 0.5)} ms, longest ${at(waits, 1)} ms over ${waits.length} keys`,
  );
}

async function playAndImport(page: Page): Promise<void> {
  const tasks = () => page.evaluate(() => window.bench.longTasks.splice(0).map(({ length }) => Math.round(length)));
  await tasks();
  await page.getByRole('button', { name: /^play/i }).click();
  await page.waitForTimeout(5000);
  console.log(`  playing for 5 s: tasks over 50 ms: ${listed(await tasks())}`);
  await page
    .getByRole('button', { name: /^(pause|stop)/i })
    .first()
    .click();
  const file = `${CACHE}/million.txt`;
  const rows = Array.from({ length: 125_000 }, (_, r) =>
    Array.from({ length: 8 }, (_, k) =>
      (0.1 * Math.sin((8 * r + k) / 9) * Math.exp(-(8 * r + k) / 4e5)).toFixed(5).padStart(10),
    ).join(''),
  );
  writeFileSync(file, `NPTS= 1000000, DT= .005 SEC, UNITS: G\n${rows.join('\n')}\n`);
  const chooser = page.waitForEvent('filechooser');
  await page.keyboard.press('Escape');
  await page
    .getByRole('button', { name: /add records/i })
    .first()
    .click();
  const choose = page.getByRole('button', { name: /choose files|more files/i }).first();
  await Promise.race([chooser.catch(() => null), choose.waitFor().then(() => choose.click())]);
  await (await chooser).setFiles(file);
  const started = Date.now();
  await page.getByRole('button', { name: /^add 1 record/i }).click({ timeout: 60_000 });
  await page.waitForTimeout(3000);
  console.log(
    `  importing 1,000,000 samples (${((Date.now() - started) / 1000 - 3).toFixed(1)} s to added): tasks over 50 ms: ${listed(await tasks())}`,
  );
}

function at(sorted: readonly number[], share: number): string {
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))].toFixed(0);
}

function listed(tasks: readonly number[]): string {
  return tasks.length === 0 ? 'none' : `${tasks.length} (${tasks.join(', ')} ms)`;
}

function stop(server: ChildProcess): void {
  if (server.pid !== undefined) process.kill(-server.pid);
}
