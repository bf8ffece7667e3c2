import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

/** Relative luminance and contrast as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const share = parseInt(hex.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(a: string, b: string): number {
  const [light = 0, dark = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light + 0.05) / (dark + 0.05);
}

const css = readFileSync(new URL('./tokens.css', import.meta.url), 'utf8');
const themes = Array.from(css.matchAll(/:root(\[data-lamp='off'\])? \{([^}]*)\}/g), ([, off, body = '']) => ({
  name: off === undefined ? 'lamp on' : 'lamp off',
  tokens: new Map(
    Array.from(body.matchAll(/--color-([\w-]+): (#\w{6})/g), ([, name = '', hex = '']) => [name, hex]),
  ),
}));
const TEXT = ['ink', 'muted', 'accent', 'brass', 'lead', 'slate'];

describe.each(themes)('with the $name', ({ tokens }) => {
  it.each(TEXT)('%s can be read on paper and on the sheet (WCAG 2.2 AA, 4.5 : 1)', (name) => {
    for (const ground of ['paper', 'sheet']) {
      expect(contrast(tokens.get(name) ?? '', tokens.get(ground) ?? '')).toBeGreaterThanOrEqual(4.5);
    }
  });
  it('the words on the primary button can be read', () => {
    expect(contrast(tokens.get('accent-text') ?? '', tokens.get('accent') ?? '')).toBeGreaterThanOrEqual(4.5);
  });
});

it('has both lamp settings with the same roles', () => {
  expect(themes.map(({ tokens }) => [...tokens.keys()])).toEqual([
    expect.arrayContaining(TEXT),
    expect.arrayContaining(TEXT),
  ]);
});
