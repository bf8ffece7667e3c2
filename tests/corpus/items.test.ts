import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

import { assayReportText } from '#server/assay-report-text.ts';
import { assayItem, itemContentSchema } from '#shared/engine/index.ts';

const FOLDER = new URL('items/', import.meta.url);

/** Items of the corpus and the findings, by code, that an examiner expects; none for the sound ones. */
const EXPECTED: Readonly<Record<string, readonly string[]>> = {
  'fine-beam-tube': [],
  'stopping-electrons': [],
  'hovering-drop': [],
  'electron-past-light': ['faster-than-light', 'law-broken', 'marks-do-not-add-up'],
  'deflected-beam': ['answer-does-not-vary', 'beam-hits-plate', 'printed-in-full'],
  'two-near-lengths': ['hole-mistake', 'no-band-fits', 'route-outside-band', 'slip-inside-band'],
};

const read = (name: string) =>
  itemContentSchema.parse(JSON.parse(readFileSync(new URL(`${name}.json`, FOLDER), 'utf8')));

describe('the items of the corpus', () => {
  it('are all expected', () => {
    const files = readdirSync(FOLDER).filter((file) => file.endsWith('.json'));
    expect(files.map((file) => file.replace('.json', '')).sort()).toEqual(Object.keys(EXPECTED).sort());
  });

  it.each(Object.entries(EXPECTED))('%s is told its faults and nothing else', (name, codes) => {
    const { report } = assayItem(read(name));
    expect([...new Set(report.findings.map(({ code }) => code))].sort()).toEqual(codes);
  });

  // The whole report stands beside the item, so that any change of it is seen and read.
  it.each(Object.keys(EXPECTED))('%s has its report on file', async (name) => {
    const { title, ...content } = read(name);
    const { report } = assayItem({ title, ...content });
    await expect(assayReportText(title, report)).toMatchFileSnapshot(`items/${name}.report.txt`);
  });
});
