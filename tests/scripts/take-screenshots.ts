/**
 * Makes the pictures of the README's tour from the running product: start it with `npm start` on a fresh demo,
 * then run `npx tsx tests/scripts/take-screenshots.ts http://localhost:3000`.
 */
import path from 'node:path';
import { fileURLToPath } from 'node:url';

import { type Browser, chromium } from 'playwright-core';

import { DEMO_PASSWORD, demoPeople } from '#server/db/seed/demo-people.ts';

const FOLDER = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../public/tour');
const address = process.argv[2] ?? 'http://localhost:3000';

interface Picture {
  name: string;
  /** What must be there before the picture is taken. */
  shows: string;
  role: keyof typeof demoPeople;
  path: string;
  /** The item to open from there. */
  code?: string;
}

const PICTURES: readonly Picture[] = [
  { name: 'bank', shows: 'table tbody tr', role: 'writer', path: '/bank' },
  { name: 'bench', shows: '.scale-strip svg', role: 'writer', path: '/bank?search=EG-001', code: 'EG-001' },
  {
    name: 'findings',
    shows: '.scale-strip svg',
    role: 'writer',
    path: '/bank?search=PE-002',
    code: 'PE-002',
  },
  { name: 'review', shows: 'main a', role: 'reviewer', path: '/desk' },
  { name: 'paper', shows: 'table tbody tr', role: 'setter', path: '/papers/1' },
];

async function take(browser: Browser, picture: Picture): Promise<void> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 960 }, colorScheme: 'light' });
  const page = await context.newPage();
  await page.goto(address);
  await page.getByLabel('E-mail address').fill(demoPeople[picture.role].email);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: 'Desk', exact: true }).waitFor();
  await page.goto(address + picture.path);
  if (picture.code !== undefined) await page.getByRole('link', { name: picture.code }).click();
  await page.locator(picture.shows).first().waitFor();
  await page.waitForLoadState('networkidle');
  await page.screenshot({ path: path.join(FOLDER, `${picture.name}.png`) });
  await context.close();
}

const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
try {
  for (const picture of PICTURES) await take(browser, picture);
} finally {
  await browser.close();
}
