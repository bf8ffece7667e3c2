import { describe, expect, it } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import { searchText } from './search-text.ts';

const content = itemContentSchema.parse({
  title: 'Deflected beam',
  stem: 'A beam crosses plates {{L}} long at {{v to Mm s^-1, 2 sf}}.',
  script: 'secretname = draw(1 m, 2 m, 1 m)',
  parts: [
    {
      id: 'a',
      kind: 'written',
      text: 'Describe the path.',
      scheme: [{ text: 'a parabola', marks: 1 }],
    },
  ],
  figures: [{ figureId: 1, alternativeText: 'Two plates.', caption: 'Apparatus' }],
});

describe('what a search looks through', () => {
  it('holds code, title and every printed text', () => {
    const text = searchText('DP-001', content);
    for (const words of [
      'DP-001',
      'Deflected beam',
      'A beam crosses plates',
      'Describe the path.',
      'Two plates.',
    ])
      expect(text).toContain(words);
  });

  it('holds nothing of script, mark scheme or holes', () => {
    const text = searchText('DP-001', content);
    for (const words of ['secretname', 'parabola', '{{', 'sf']) expect(text).not.toContain(words);
  });
});
