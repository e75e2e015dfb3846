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

// The manifest does not list what a worker is built of: its file and what that imports statically, from the text.
const beside = 'dist/assets';
const ofWorkers = new Set();
const follow = (name) => {
  if (ofWorkers.has(name)) return;
  ofWorkers.add(name);
  const text = readFileSync(`${beside}/${name}`, 'utf8');
  for (const [, imported] of text.matchAll(/(?:from|import)\s*"\.\/([^"]+\.js)"/g)) follow(imported);
};
for (const name of readdirSync(beside)) if (/^worker-.*\.js$/.test(name)) follow(name);
const scripts = [...first]
  .filter((file) => file.endsWith('.js'))
  .concat([...ofWorkers].map((name) => `assets/${name}`));

if (ofWorkers.size === 0) throw new Error('dist/assets holds no worker');
if (first.size === 0) throw new Error('dist/.vite/manifest.json names no entry');

export default [
  {
    name: 'first view, scripts (brotli)',
    path: scripts.map((name) => `dist/${name}`),
    limit: '180 kB',
    brotli: true,
  },
];
