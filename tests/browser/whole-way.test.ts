import { readFile } from 'node:fs/promises';

import { type Browser, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { DEMO_PASSWORD, demoPeople } from '#server/db/seed/demo-people.ts';
import { compileScript, evaluateDraw } from '#shared/engine/index.ts';
import { type BuiltServer, startBuiltServer } from '#tests/support/built-server.ts';
import { readBack } from '#tests/support/pandoc.ts';

/** The invented item of this test: the de Broglie wavelength of electrons from a gun. */
const ITEM = {
  title: 'Wavelength of electrons from a gun',
  script: ['Va = draw(150 V, 300 V, 10 V)', 'lambda = h / sqrt(2 * m_e * e * Va)'],
  stem: 'Electrons are accelerated from rest through {{Va}} and strike a crystal.',
  question: 'Calculate the wavelength of the electrons.',
  line: '$\\lambda = h/\\sqrt{2 m e V}$ used, answer with unit',
};

let server: BuiltServer;
let browser: Browser;

beforeAll(async () => {
  server = await startBuiltServer('whole_way');
  browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
});

afterAll(async () => {
  await browser.close();
  await server.stop();
});

/** A browser of one person's own, signed in. */
async function signInAs(role: keyof typeof demoPeople): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, acceptDownloads: true });
  const page = await context.newPage();
  page.setDefaultTimeout(30_000);
  await page.goto(server.url);
  await page.getByLabel('E-mail address').fill(demoPeople[role].email);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: 'Desk', exact: true }).waitFor();
  return page;
}

/** The answer as a candidate would write it, worked out here from the definition and not from the product. */
function wavelengthInPicometres(volts: number): string {
  // h, m_e and e: CODATA 2022.
  const metres = 6.62607015e-34 / Math.sqrt(2 * 9.1093837139e-31 * 1.602176634e-19 * volts);
  return `${(metres * 1e12).toPrecision(3)} pm`;
}

/** Volts that a sheet prints, as "210 V". */
async function printedVolts(page: Page): Promise<number> {
  const text = await page.locator('.sheet').first().innerText();
  const volts = /through\s+(\d+)\s*V/.exec(text)?.[1];
  if (volts === undefined) throw new Error(`The sheet prints no p.d.: ${text}`);
  return Number(volts);
}

describe('one item', () => {
  it('goes the whole way from a blank sheet to the downloaded Word files, as four people', async () => {
    // A writer authors it.
    const writer = await signInAs('writer');
    await writer.getByRole('link', { name: 'Bank', exact: true }).click();
    await writer.getByRole('button', { name: 'New item' }).click();
    await writer.getByLabel('Title', { exact: true }).fill(ITEM.title);
    await writer.getByLabel('Topic').last().selectOption({ label: 'Matter waves' });
    await writer.getByRole('button', { name: 'Begin the item' }).click();
    await writer.locator('.cm-content').click();
    for (const line of ITEM.script) {
      await writer.keyboard.type(line);
      await writer.keyboard.press('Escape');
      await writer.keyboard.press('Enter');
    }
    await writer.getByRole('button', { name: 'Edit title, stem and figures' }).click();
    await writer.getByRole('textbox', { name: 'Stem' }).fill(ITEM.stem);
    await writer.getByRole('button', { name: 'Close the stem' }).click();
    await writer.getByRole('button', { name: 'numeric', exact: true }).click();
    await writer.getByRole('textbox', { name: 'Text of part (a)' }).fill(ITEM.question);
    await writer.getByRole('combobox', { name: 'Answer' }).selectOption('lambda');
    await writer.getByRole('textbox', { name: 'Unit', exact: true }).fill('pm');
    await writer.getByRole('textbox', { name: 'Mark scheme line 1', exact: true }).last().fill(ITEM.line);
    await writer
      .getByText(/Saved \d/)
      .first()
      .waitFor();
    expect(await writer.locator('.sheet').first().innerText()).toContain(ITEM.question);
    const itemAddress = new URL(writer.url()).pathname;

    // The server assays it, and it goes to a named reviewer.
    await writer.getByRole('button', { name: 'Send to review' }).click();
    const dialog = writer.getByRole('dialog');
    await dialog.getByText(/no blocker/).waitFor();
    await dialog
      .getByRole('combobox', { name: 'Reviewer' })
      .selectOption({ label: demoPeople.reviewer.name });
    await dialog.getByLabel('Note for the reviewer').fill('Please look at the unit.');
    await dialog.locator('button[type=submit]').click();
    await writer.getByText('In review').first().waitFor();

    // Another person works it before anything of the answer is shown, and approves it.
    const reviewer = await signInAs('reviewer');
    await reviewer.getByRole('link', { name: new RegExp(ITEM.title) }).click();
    await reviewer.getByRole('button', { name: 'Claim and begin' }).click();
    await reviewer.locator('.sheet').first().waitFor();
    const answer = wavelengthInPicometres(await printedVolts(reviewer));
    const before = await reviewer.locator('body').innerText();
    expect(before).not.toContain(answer.split(' ')[0]);
    expect(before).not.toContain('lambda');
    await reviewer.getByLabel('My answer, with its unit').fill(answer);
    await reviewer.getByRole('button', { name: 'Compare', exact: true }).click();
    await reviewer.getByText('✓ agrees').waitFor();
    await reviewer.getByRole('button', { name: 'Show the answers' }).click();
    await reviewer.locator('.scheme').first().waitFor();
    expect(await reviewer.locator('.scheme').first().innerText()).toContain(answer.split(' ')[0]);
    for (const field of await reviewer.getByPlaceholder('why it may stand').all()) {
      await field.fill('Worked through; it may stand.');
    }
    await reviewer.getByLabel('Approve this revision').check();
    await reviewer.getByLabel('A word to the record').fill('Worked through; it agrees.');
    await reviewer.getByRole('button', { name: 'Approve', exact: true }).click();
    await reviewer
      .getByText(/Approved/)
      .first()
      .waitFor();

    // A setter puts it on a paper.
    const setter = await signInAs('setter');
    await setter.getByRole('link', { name: 'Papers', exact: true }).click();
    await setter.getByRole('button', { name: 'New paper' }).click();
    await setter.getByLabel('Title', { exact: true }).fill('Matter waves, short paper');
    await setter.getByLabel('Total marks').fill('1');
    await setter.getByLabel('Time, minutes').fill('5');
    await setter.getByRole('button', { name: 'Begin the paper' }).click();
    await setter.getByRole('button', { name: 'Pick items' }).click();
    await setter.getByRole('checkbox', { name: new RegExp(ITEM.title) }).check();
    await setter.getByRole('button', { name: /Put 1 item/ }).click();
    await setter.getByRole('link', { name: /^MW-/ }).first().waitFor();
    await setter.getByRole('button', { name: 'Propose for sealing' }).click();
    await setter.getByRole('button', { name: 'Propose', exact: true }).click();
    await setter.getByText('Proposed', { exact: false }).first().waitFor();
    const paperAddress = new URL(setter.url()).pathname;
    expect(await setter.getByRole('button', { name: 'Confirm and seal' }).count()).toBe(0);

    // A second person confirms, and the paper is sealed and exported.
    const moderator = await signInAs('moderator');
    await moderator.goto(server.url + paperAddress);
    await moderator.getByRole('button', { name: 'Confirm and seal' }).click();
    await moderator.getByRole('button', { name: 'Seal it' }).click();
    await moderator.getByText(/SHA-256/).waitFor();

    const fetchExport = async (name: string) => {
      const [file] = await Promise.all([
        moderator.waitForEvent('download'),
        moderator.getByRole('button', { name, exact: true }).click(),
      ]);
      return readBack(new Uint8Array(await readFile(await file.path())));
    };
    const paper = await fetchExport('Question paper');
    const scheme = await fetchExport('Mark scheme');
    expect(paper).toContain('strike a crystal');
    expect(paper).toContain(ITEM.question);
    expect(paper).not.toContain('DRAFT');
    const volts = Number(/through (\d+)/.exec(paper)?.[1]);
    expect(scheme).toContain(wavelengthInPicometres(volts).split(' ')[0]);
    expect(scheme).toContain('\\sqrt');

    // Nothing that the item goes through afterwards changes the sealed paper.
    await writer.goto(server.url + itemAddress);
    await writer.getByRole('button', { name: 'Start a new revision' }).click();
    await writer.getByText('Drafting').first().waitFor();
    expect(await fetchExport('Question paper')).toBe(paper);
  });

  it('prints draws that the engine gives on any machine', () => {
    const { script } = compileScript(ITEM.script.join('\n'));
    expect(script && evaluateDraw(script, 1).values['Va']).toBe(150);
  });
});
