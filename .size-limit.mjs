// What a first view loads: the page's entry with all that it imports statically, and the worker. Chunks that are only
// reached by a dynamic import (the plots' library) come after the answers' first paint and are not counted.
import { readdirSync, readFileSync } from 'node:fs';

const manifest = JSON.parse(readFileSync('dist/.vite/manifest.json', 'utf8'));

const first = new Set();
const visit = (key) => {
  const { file, imports = [] } = manifest[key];
  if (first.has(file)) return;
  first.add(file);
  imports.forEach(visit);
};
for (const [key, chunk] of Object.entries(manifest)) if (chunk.isEntry) visit(key);

const lazy = new Set(
  Object.values(manifest)
    .map(({ file }) => file)
    .filter((file) => !first.has(file)),
);
// The manifest does not list workers: every script that it does not know to be lazy counts.
const scripts = readdirSync('dist/assets', { recursive: true })
  .map((name) => `assets/${name}`)
  .filter((name) => name.endsWith('.js') && !lazy.has(name));

if (first.size === 0) throw new Error('dist/.vite/manifest.json names no entry');

export default [
  {
    name: 'first view, scripts (brotli)',
    path: scripts.map((name) => `dist/${name}`),
    limit: '180 kB',
    brotli: true,
  },
];
