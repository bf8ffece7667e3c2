import { createHash } from 'node:crypto';

import { describe, expect, it } from 'vitest';

import { isIntact, openSeal, type SealedPaper, sealText } from './seal.ts';

const front = {
  organisation: 'Invented Board',
  code: 'P-001',
  title: 'Fields − and “beams”',
  subtitle: '',
  marks: 6,
  sealHash: null,
};
const paper: SealedPaper = {
  form: 1,
  engineVersion: '1.0.0',
  sheet: { ...front, durationMinutes: 75, instructions: [], dataSheet: [], items: [] },
  scheme: { ...front, items: [] },
  items: [],
};

describe('a seal', () => {
  it('is the SHA-256 of a text that does not depend on the order of keys', () => {
    const { canonical, hash } = sealText(paper);
    const turned = Object.fromEntries(Object.entries(paper).reverse()) as unknown as SealedPaper;
    expect(sealText(turned)).toEqual({ canonical, hash });
    expect(hash).toBe(createHash('sha256').update(canonical, 'utf8').digest('hex'));
    expect(
      canonical.startsWith('{"engineVersion":"1.0.0","form":1,"items":[],"scheme":{"code":"P-001"'),
    ).toBe(true);
  });

  it('gives back exactly what was sealed', () => {
    const { canonical, hash } = sealText(paper);
    expect(openSeal({ canonical, sha256: hash })).toEqual(paper);
  });

  it('is broken by any change, and then nothing of it is given', () => {
    const { canonical, hash } = sealText(paper);
    for (const changed of [canonical.replace('75', '76'), `${canonical} `, '']) {
      const seal = { canonical: changed, sha256: hash };
      expect(isIntact(seal)).toBe(false);
      expect(openSeal(seal)).toBeNull();
    }
  });
});
