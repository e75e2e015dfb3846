// Runs before `npm start` and `npm test`, with nothing but Node: installs the packages of the lock when they are not all
// there, and with --browser a Chromium when none is found. Says in one line what it does; silent when nothing is to do.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { findChromium } from './browser.mjs';
import { missingPackages } from './installed.mjs';

const top = dirname(dirname(fileURLToPath(import.meta.url)));

const missing = missingPackages(top);
if (missing === null || missing.length > 0) {
  const why = missing === null ? 'nothing is installed yet' : `missing: ${missing.slice(0, 3).join(', ')}`;
  say(`installing the packages of package-lock.json (${why})`);
  // Development packages are asked for by name: NODE_ENV=production would leave them out, and the build needs them.
  must('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']);
}

const chromium = () =>
  findChromium().catch((fault) => {
    say(fault.message);
    process.exit(1);
  });

if (process.argv.includes('--browser') && (await chromium()) === null) {
  if (existsSync('/etc/debian_version') && process.getuid?.() === 0) {
    say("installing Debian's chromium (no browser found; SWAYBOOK_CHROMIUM may name one)");
    if (run('apt-get', ['update', '-q']) === 0) run('apt-get', ['install', '-y', '-q', 'chromium']);
  }
  if ((await chromium()) === null) {
    say("installing Playwright's chromium (no browser found; SWAYBOOK_CHROMIUM may name one)");
    must('npx', ['playwright', 'install', 'chromium']);
  }
}

function say(what) {
  console.error(`prepare: ${what}`);
}

function run(command, args) {
  const { status, error } = spawnSync(command, args, {
    cwd: top,
    stdio: ['ignore', 'inherit', 'inherit'],
    shell: process.platform === 'win32',
  });
  if (error) say(`${command} cannot be run: ${error.message}`);
  return status ?? 1;
}

function must(command, args) {
  const status = run(command, args);
  if (status !== 0) {
    say(`${command} ${args.join(' ')} ended with ${status}`);
    process.exit(status);
  }
}
