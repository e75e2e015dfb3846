import { createServer } from 'node:net';
import { defineConfig } from '@playwright/test';
import { findChromium } from '../.ci/browser.mjs';

/** A preview of our own on a free port: the tests run beside `npm start`. Workers inherit the choice. */
process.env.SWAYBOOK_E2E_PORT ??= String(await freePort());
const address = `http://127.0.0.1:${process.env.SWAYBOOK_E2E_PORT}`;
const executablePath = await findChromium();

export default defineConfig({
  testDir: '.',
  outputDir: '../test-results',
  workers: 2,
  retries: 0,
  // Two shared cores: a limit for what hangs, not for what is slow.
  timeout: 180_000,
  expect: { timeout: 30_000 },
  forbidOnly: true,
  reporter: [['list'], ['json', { outputFile: '../.cache/playwright.json' }]],
  webServer: {
    command: `npx vite preview --host 127.0.0.1 --port ${process.env.SWAYBOOK_E2E_PORT} --strictPort`,
    cwd: '..',
    url: address,
  },
  use: {
    baseURL: address,
    viewport: { width: 1600, height: 1000 },
    trace: 'retain-on-failure',
    launchOptions: {
      ...(executablePath === null ? {} : { executablePath }),
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
});

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() =>
        address !== null && typeof address === 'object' ? resolve(address.port) : reject(new Error('no free port')),
      );
    });
  });
}
