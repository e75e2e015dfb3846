import { execFileSync } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { build } from 'vite';
import { inBrowser } from './browser.ts';
import { KERNEL_CASES, kernelProblem, timeKernel, twinInput, YIELDING_CASES, yieldingInput } from './kernelCases.ts';

const CACHE = '.cache/bench';
const ROUNDS = 5;

/**
 * March in Node and in Chromium against the C twin, turn and turn about in one run. Figures are microseconds a
 * run of 4,000 steps; ratios are what to keep. The least of the rounds' medians is quoted: the machine is shared.
 */
export async function benchKernel(): Promise<void> {
  mkdirSync(CACHE, { recursive: true });
  const twin = compileTwin('march');
  await build({
    configFile: false,
    logLevel: 'silent',
    build: {
      target: 'es2023',
      outDir: CACHE,
      emptyOutDir: false,
      lib: { entry: 'test/bench/kernelCases.ts', formats: ['es'], fileName: 'kernel' },
    },
  });
  console.log('March, microseconds a run of 4,000 steps (least of the medians of rounds in turn)');
  await inBrowser(join(CACHE, 'kernel.js'), async (page) => {
    let average = Number.NaN;
    for (const [index, which] of KERNEL_CASES.entries()) {
      const { problem } = kernelProblem(which);
      const input = twinInput(problem, 41);
      const best = { node: Number.POSITIVE_INFINITY, chromium: Number.POSITIVE_INFINITY, c: Number.POSITIVE_INFINITY };
      for (let round = 0; round < ROUNDS; round++) {
        if (twin) {
          const [times, drifts] = execFileSync(twin, { input }).toString().split('\n');
          best.c = Math.min(best.c, Number(times.split(' ')[0]));
          if (round === 0)
            same(drifts.trim().split(' ').map(Number), timeKernel(which, () => performance.now()).peakDrift);
        }
        best.node = Math.min(best.node, timeKernel(which, () => performance.now()).median);
        const there = await page.evaluate(
          (at) => window.kernel.timeKernel(window.kernel.KERNEL_CASES[at], () => performance.now()).median,
          index,
        );
        best.chromium = Math.min(best.chromium, there);
      }
      if (which.storeys === 20 && which.name.startsWith('average acceleration, Rayleigh')) average = best.chromium;
      const against = twin
        ? `C ${best.c.toFixed(0)}; Chromium / C ${(best.chromium / best.c).toFixed(2)}, Node / C ${(best.node / best.c).toFixed(2)}`
        : 'no C compiler here: twin skipped';
      const family =
        Number.isFinite(average) && which.storeys === 20
          ? `; over average acceleration ${(best.chromium / average).toFixed(2)}`
          : '';
      console.log(
        `  ${which.name}: Chromium ${best.chromium.toFixed(0)}, Node ${best.node.toFixed(0)}, ${against}${family}`,
      );
    }
    await benchYielding(page);
  });
}

/** March of yielding frames against the C twin of the same algorithm, and against full Newton in C. */
async function benchYielding(page: Page): Promise<void> {
  const twin = compileTwin('yielding');
  console.log('March of yielding frames, the same way');
  for (const [index, which] of YIELDING_CASES.entries()) {
    const best = { node: Number.POSITIVE_INFINITY, chromium: Number.POSITIVE_INFINITY, c: Number.POSITIVE_INFINITY };
    let newton = Number.POSITIVE_INFINITY;
    for (let round = 0; round < ROUNDS; round++) {
      if (twin) {
        const run = (full: boolean) =>
          execFileSync(twin, { input: yieldingInput(which, full, 41) })
            .toString()
            .split('\n');
        const [times, drifts] = run(false);
        best.c = Math.min(best.c, Number(times.split(' ')[0]));
        newton = Math.min(newton, Number(run(true)[0].split(' ')[0]));
        if (round === 0)
          // Exponentials of two libraries differ in their last figure, and a yielding frame makes it grow.
          same(drifts.trim().split(' ').map(Number), timeKernel(which, () => performance.now()).peakDrift, 1e-6);
      }
      best.node = Math.min(best.node, timeKernel(which, () => performance.now()).median);
      const there = await page.evaluate(
        (at) => window.kernel.timeKernel(window.kernel.YIELDING_CASES[at], () => performance.now()).median,
        index,
      );
      best.chromium = Math.min(best.chromium, there);
    }
    const against = twin
      ? `C ${best.c.toFixed(0)}, full Newton in C ${newton.toFixed(0)}; Chromium / C ${(best.chromium / best.c).toFixed(2)}, Node / C ${(best.node / best.c).toFixed(2)}, Chromium / full Newton ${(best.chromium / newton).toFixed(2)}`
      : 'no C compiler here: twin skipped';
    console.log(`  ${which.name}: Chromium ${best.chromium.toFixed(0)}, Node ${best.node.toFixed(0)}, ${against}`);
  }
}

/** gcc -O3 where there is one, else null. */
function compileTwin(name: 'march' | 'yielding'): string | null {
  const out = join(CACHE, name);
  try {
    execFileSync('gcc', ['-O3', '-std=gnu11', '-o', out, `test/bench/c/${name}.c`, '-lm'], { stdio: 'pipe' });
    return `./${out}`;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

/** The twin must do the same work: its answers agree to rounding. */
function same(c: readonly number[], js: readonly number[], tolerance = 1e-9): void {
  for (const [i, value] of js.entries()) {
    if (!(Math.abs(c[i] - value) <= tolerance * Math.abs(value)))
      throw new Error(`twin: storey ${i} drift ${c[i]}, here ${value}`);
  }
}
