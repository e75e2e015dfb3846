// Where the tests find their Chromium: one answer for the preparation and for the Playwright configuration.
import { existsSync } from 'node:fs';

const USUAL = {
  linux: [
    '/usr/bin/chromium',
    '/usr/bin/chromium-browser',
    '/usr/bin/google-chrome-stable',
    '/usr/bin/google-chrome',
    '/snap/bin/chromium',
  ],
  darwin: [
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
    '/Applications/Chromium.app/Contents/MacOS/Chromium',
  ],
  win32: ['C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe'],
};

/** The environment variable, else the usual system paths, else Playwright's own download, else null. */
export async function findChromium() {
  const named = process.env.SWAYBOOK_CHROMIUM;
  if (named) {
    if (!existsSync(named)) throw new Error(`SWAYBOOK_CHROMIUM names ${named}, which is not there`);
    return named;
  }
  const usual = (USUAL[process.platform] ?? []).find((path) => existsSync(path));
  if (usual) return usual;
  const { chromium } = await import('@playwright/test');
  const own = chromium.executablePath();
  return existsSync(own) ? own : null;
}
