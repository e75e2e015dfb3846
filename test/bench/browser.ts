import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { chromium, type Page } from '@playwright/test';
import { findChromium } from '../../.ci/browser.mjs';
import type * as Kernel from './kernelCases.ts';

declare global {
  interface Window {
    kernel: typeof Kernel;
  }
}

export const CHROMIUM_ARGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Opens an empty page in Chromium with a module loaded as `window.kernel`. */
export async function inBrowser(module: string, use: (page: Page) => Promise<void>): Promise<void> {
  const server = createServer((request, response) => {
    if (request.url === '/kernel.js') {
      response.setHeader('content-type', 'text/javascript');
      response.end(readFileSync(module));
    } else {
      response.setHeader('content-type', 'text/html');
      response.end('<!doctype html><script type="module">window.kernel = await import("/kernel.js");</script>');
    }
  }).listen(0);
  const browser = await chromium.launch({
    executablePath: (await findChromium()) ?? undefined,
    args: CHROMIUM_ARGS,
  });
  try {
    const page = await browser.newPage();
    await page.goto(`http://localhost:${(server.address() as AddressInfo).port}/`);
    await page.waitForFunction(() => window.kernel !== undefined);
    await use(page);
  } finally {
    await browser.close();
    server.close();
  }
}
