import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { afterEach } from 'vitest';

const TSX = resolve('node_modules/.bin/tsx');
const MAIN = resolve('src/batch/main.ts');

/** The command as a person runs it, in a folder of its own. */
export function batch(folder: string, ...args: string[]) {
  const { status, stdout, stderr } = spawnSync(TSX, [MAIN, ...args], { cwd: folder, encoding: 'utf8' });
  return { status, stdout, lines: stderr.split('\n').filter((line) => line !== '') };
}

/** A new folder for each test, with these files in it; taken away after the test. */
export function folderWith(files: Readonly<Record<string, string | object>>): string {
  const folder = mkdtempSync(join(tmpdir(), 'batch-'));
  open.push(folder);
  for (const [name, content] of Object.entries(files)) {
    mkdirSync(dirname(join(folder, name)), { recursive: true });
    writeFileSync(join(folder, name), typeof content === 'string' ? content : JSON.stringify(content));
  }
  return folder;
}

const open: string[] = [];
afterEach(() => {
  for (const folder of open.splice(0)) rmSync(folder, { recursive: true });
});

/** A record whose heading says all: time and acceleration in cm/s2 at 0.02 s. */
export const TIMED_RECORD = [
  '# time (s), acceleration (cm/s2)',
  ...Array.from({ length: 200 }, (_, i) => `${(0.02 * i).toFixed(2)}, ${(150 * Math.sin(0.3 * i)).toFixed(4)}`),
  '',
].join('\n');

/** One value a line, in g: neither unit nor interval stand in it. */
export const BARE_RECORD = Array.from({ length: 150 }, (_, i) => (0.2 * Math.sin(0.25 * i)).toFixed(6)).join('\n');

/** A project of two storeys under one embedded motion; parts can be put in the place of its own. */
export function projectOf(parts: Readonly<Record<string, unknown>> = {}): object {
  return {
    format: 'swaybook',
    version: 1,
    title: 'Two storeys',
    frame: {
      storeys: [
        { name: 'Ground', height: 4.2, mass: 412_000, stiffness: 1.85e8, law: { kind: 'elastic' } },
        { name: 'Upper', height: 3.6, mass: 380_000, stiffness: 1.4e8, law: { kind: 'elastic' } },
      ],
      damping: { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] },
      pDelta: true,
    },
    motions: [
      {
        name: 'Motion A',
        interval: 0.02,
        acceleration: Array.from({ length: 200 }, (_, i) => 1.5 * Math.sin(0.3 * i)),
        scale: 1.35,
      },
    ],
    analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: { parts: 2 }, tail: 1 },
    limits: { drift: 0.02, source: 'the clause' },
    ...parts,
  };
}
