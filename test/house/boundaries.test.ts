import { spawnSync } from 'node:child_process';
import { copyFileSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

/** The three ways in which an import can be written. */
const FORMS = {
  plain: (target: string) => `import { thing } from '${target}';\n\nexport const trial = thing;\n`,
  'type-only': (target: string) => `import type { Thing } from '${target}';\n\nexport type Trial = Thing;\n`,
  dynamic: (target: string) => `export const trial = () => import('${target}');\n`,
};

const FORBIDDEN: [string, string][] = [
  ['core/units', '../motion/motion.ts'],
  ['core/linalg', '../frame/frame.ts'],
  ['core/standards', '../checks/limits.ts'],
  ['core/motion/layouts', '../../doors.ts'],
  ['core/frame', '../dynamics/march.ts'],
  ['core/frame', 'ml-matrix'],
  ['core/dynamics/laws', '../../spectrum/spectrum.ts'],
  ['core/spectrum', '../checks/envelope.ts'],
  ['core/checks', '../report/table.ts'],
  ['core/sizing', '../report/table.ts'],
  ['core/report', '../../document/project.ts'],
  ['core', 'react'],
  ['core', 'node:fs'],
  ['document', '../engine/protocol.ts'],
  ['document', 'zustand/vanilla'],
  ['engine', '../state/results.ts'],
  ['state', '../ui/App.tsx'],
  ['batch', '../engine/inline.ts'],
  ['ui/sheet', '../../engine/pool.ts'],
];

const ALLOWED: [string, string][] = [
  ['core/dynamics', '../frame/frame.ts'],
  ['core/linalg', 'ml-matrix'],
  ['core/report', '../checks/envelope.ts'],
  ['document', '../core/doors.ts'],
  ['batch', '../document/case.ts'],
  ['batch', 'node:fs'],
  ['state', '../engine/protocol.ts'],
  ['ui/sheet', '../../state/results.ts'],
];

describe('[HOUSE-1] imports go up the list only', () => {
  const folder = mkdtempSync(join(tmpdir(), 'boundaries-'));
  let refused: Set<string>;

  beforeAll(() => {
    copyFileSync('biome.json', join(folder, 'biome.json'));
    copyFileSync('.gitignore', join(folder, '.gitignore'));
    for (const [room, target] of [...FORBIDDEN, ...ALLOWED]) {
      for (const [form, text] of Object.entries(FORMS)) {
        const file = join(folder, fileOf(room, target, form));
        mkdirSync(dirname(file), { recursive: true });
        writeFileSync(file, text(target));
      }
    }
    const { stdout } = spawnSync(
      resolve('node_modules/.bin/biome'),
      ['lint', '--only=style/noRestrictedImports', '--reporter=json', '--max-diagnostics=none'],
      { cwd: folder, encoding: 'utf8' },
    );
    const { diagnostics } = JSON.parse(stdout) as { diagnostics: { category: string; location: { path: string } }[] };
    refused = new Set(
      diagnostics
        .filter(({ category }) => category === 'lint/style/noRestrictedImports')
        .map(({ location }) => location.path.replaceAll('\\', '/')),
    );
  });

  afterAll(() => rmSync(folder, { recursive: true }));

  test.each(FORBIDDEN)('%s may not take %s', (room, target) => {
    for (const form of Object.keys(FORMS)) expect(refused).toContain(fileOf(room, target, form));
  });

  test.each(ALLOWED)('%s may take %s', (room, target) => {
    for (const form of Object.keys(FORMS)) expect(refused).not.toContain(fileOf(room, target, form));
  });
});

function fileOf(room: string, target: string, form: string): string {
  return `src/${room}/trial-${target.replace(/\W+/g, '-')}-${form}.ts`;
}
