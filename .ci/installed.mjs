// Whether node_modules holds what the lock asks for. npm writes node_modules/.package-lock.json last, so that an
// interrupted installation does not count as one.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Packages of the lock that are missing from node_modules or stand there in another version; null: nothing installed. */
export function missingPackages(folder) {
  const wanted = packagesIn(join(folder, 'package-lock.json'));
  let present;
  try {
    present = packagesIn(join(folder, 'node_modules', '.package-lock.json'));
  } catch {
    return null;
  }
  return Object.entries(wanted)
    .filter(([path, { version, optional }]) => path !== '' && !optional && present[path]?.version !== version)
    .map(([path, { version }]) => `${path.replace(/^.*node_modules\//, '')} ${version}`);
}

function packagesIn(file) {
  return JSON.parse(readFileSync(file, 'utf8')).packages;
}
