import { describe, expect, it } from 'vitest';

import { itemContentSchema, type ItemContent } from '#shared/engine/index.ts';
import { compareContent } from './compare-content.ts';

const item = (change: Partial<ItemContent> = {}): ItemContent => ({
  ...itemContentSchema.parse({
    title: 'Gun',
    stem: 'The p.d. is {{V}} in air.',
    script: 'V = draw(1 V, 2 V, 1 V)\nE = e * V',
    parts: [
      { id: 'a', kind: 'numeric', text: 'Find E.', marks: 2, answer: { quantity: 'E', unit: 'J' } },
      { id: 'b', kind: 'written', text: 'Explain.' },
    ],
  }),
  ...change,
});
const changed = (change: Partial<ItemContent>): ReturnType<typeof compareContent> =>
  compareContent(item(), item(change));

describe('what changed between two versions', () => {
  it('is nothing when they are equal', () => {
    expect(changed({})).toEqual([]);
  });

  it('is told word by word in texts', () => {
    const [stem] = changed({ stem: 'The p.d. is {{V}} in vacuum.' });
    expect(stem).toMatchObject({ kind: 'words', label: 'Stem' });
    const runs = stem?.kind === 'words' ? stem.runs : [];
    expect(runs.filter((run) => run.kind !== 'same')).toEqual([
      { kind: 'removed', text: 'air' },
      { kind: 'added', text: 'vacuum' },
    ]);
  });

  it('is told line by line in the script', () => {
    const [script] = changed({ script: 'V = draw(1 V, 2 V, 1 V)\nE = 2 * e * V' });
    const runs = script?.kind === 'lines' ? script.runs : [];
    expect(runs.map((run) => [run.kind, run.text])).toEqual([
      ['same', 'V = draw(1 V, 2 V, 1 V)\n'],
      ['removed', 'E = e * V\n'],
      ['added', 'E = 2 * e * V\n'],
    ]);
  });

  it('names a changed band in words', () => {
    const before = item();
    const after = structuredClone(before);
    const part = after.parts[0];
    if (part?.kind === 'numeric') part.answer.band = { kind: 'absolute', plusMinus: 0.05, unit: 'm s^-1' };
    expect(compareContent(before, after)).toEqual([
      {
        key: 'a.band',
        label: 'Part (a), band',
        kind: 'value',
        before: '± 2\u202f%',
        after: '± 0.05\u202fm\u202fs⁻¹',
      },
    ]);
  });

  it('tells parts that were added, taken out and moved', () => {
    const parts = item().parts;
    expect(changed({ parts: parts.slice(0, 1) }).map((change) => change.key)).toEqual(['b.removed']);
    expect(compareContent(item({ parts: parts.slice(1) }), item()).map((change) => change.key)).toEqual([
      'a.added',
      'b.place',
    ]);
  });
});
