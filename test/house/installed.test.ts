import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, expect, test } from 'vitest';
import { missingPackages } from '../../.ci/installed.mjs';

const folder = mkdtempSync(join(tmpdir(), 'installed-'));
afterEach(() => rmSync(folder, { recursive: true }));

test('compares what npm installed with the lock, package by package', () => {
  const lock = (packages: object) => JSON.stringify({ packages });
  writeFileSync(
    join(folder, 'package-lock.json'),
    lock({
      '': { name: 'here' },
      'node_modules/a': { version: '1.0.0' },
      'node_modules/@b/c': { version: '2.0.0' },
      'node_modules/only-elsewhere': { version: '1.0.0', optional: true },
    }),
  );
  expect(missingPackages(folder)).toBeNull();

  mkdirSync(join(folder, 'node_modules'));
  expect(missingPackages(folder)).toBeNull();

  const installed = join(folder, 'node_modules', '.package-lock.json');
  writeFileSync(installed, lock({ 'node_modules/a': { version: '0.9.0' } }));
  expect(missingPackages(folder)).toEqual(['a 1.0.0', '@b/c 2.0.0']);

  writeFileSync(installed, lock({ 'node_modules/a': { version: '1.0.0' }, 'node_modules/@b/c': { version: '2.0.0' } }));
  expect(missingPackages(folder)).toEqual([]);
});
