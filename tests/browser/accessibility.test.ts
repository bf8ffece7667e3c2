import { AxeBuilder } from '@axe-core/playwright';
import { type Browser, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { DEMO_PASSWORD, demoPeople } from '#server/db/seed/demo-people.ts';
import { type BuiltServer, startBuiltServer } from '#tests/support/built-server.ts';

let server: BuiltServer;
let browser: Browser;

beforeAll(async () => {
  server = await startBuiltServer('accessibility');
  browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
});

afterAll(async () => {
  await browser.close();
  await server.stop();
});

type DemoRole = keyof typeof demoPeople;

/** The screens that each role uses daily. */
const SCREENS: readonly [role: DemoRole, paths: readonly string[]][] = [
  ['writer', ['/desk', '/bank', '/items/1', '/items/2']],
  ['reviewer', ['/reviews/1']],
  ['setter', ['/papers', '/papers/1', '/papers/2']],
  ['administrator', ['/people', '/records']],
];

/** Serious faults of the page as it stands, one line each. axe-core holds the rules of WCAG 2.2 (W3C). */
async function seriousFaults(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(
      ({ id, nodes }) =>
        `${id}: ${nodes
          .slice(0, 3)
          .map((node) => node.target.join(' '))
          .join('; ')}`,
    );
}

describe('the screens', () => {
  it.each(SCREENS)(
    'of the %s break no serious rule of WCAG 2.2 AA, with the lamp on or off',
    async (role, paths) => {
      const context = await browser.newContext({ reducedMotion: 'reduce' });
      const page = await context.newPage();
      await page.goto(server.url);
      await page.getByLabel('E-mail address').fill(demoPeople[role].email);
      await page.getByLabel('Password').fill(DEMO_PASSWORD);
      await page.getByRole('button', { name: 'Sign in' }).click();
      await page.getByRole('link', { name: 'Desk', exact: true }).waitFor();
      const faults: string[] = [];
      for (const path of paths) {
        await page.goto(server.url + path);
        await page.locator('h1').first().waitFor();
        await page.waitForLoadState('networkidle');
        for (const colorScheme of ['light', 'dark'] as const) {
          await page.emulateMedia({ colorScheme });
          faults.push(...(await seriousFaults(page)).map((fault) => `${path}, ${colorScheme}: ${fault}`));
        }
      }
      expect(faults).toEqual([]);
      await context.close();
    },
  );
});
