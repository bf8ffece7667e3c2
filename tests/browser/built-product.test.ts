import { chromium, type Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { startBuiltServer, type BuiltServer } from '#tests/support/built-server.ts';

let server: BuiltServer;
let browser: Browser;

beforeAll(async () => {
  server = await startBuiltServer('built_product');
  browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
});

afterAll(async () => {
  await browser.close();
  await server.stop();
});

describe('the built product', () => {
  it('shows its sign-in screen without an error in the browser', async () => {
    const page = await browser.newPage();
    const errors: string[] = [];
    page.on('pageerror', (error) => errors.push(error.message));
    await page.goto(server.url);
    await page.getByLabel('Password').waitFor();
    expect(errors).toEqual([]);
  });
});
