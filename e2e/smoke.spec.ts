import { expect, test } from '@playwright/test';

test('opens with the demo computed, says nothing on the console and asks no other machine', async ({
  page,
  baseURL,
}) => {
  const said: string[] = [];
  const elsewhere: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') said.push(message.text());
  });
  page.on('pageerror', (error) => said.push(String(error)));
  page.on('request', (request) => {
    const { protocol, origin } = new URL(request.url());
    if (protocol.startsWith('http') && origin !== baseURL) elsewhere.push(request.url());
  });
  await page.goto('/');
  await expect(page.getByText(/^Storey \d+ governs: \d\.\d\d of the limit$/)).toBeVisible();
  expect(said).toEqual([]);
  expect(elsewhere).toEqual([]);
});
