import { describe, expect, it } from 'vitest';

import { itemContentSchema, type ItemContent } from '#shared/engine/index.ts';
import { blankPart } from '../draft/blank-parts.ts';
import { withoutPart, withPart } from '../draft/edit-content.ts';
import { chosen, differences, mergeVersions } from './merge.ts';

const base = itemContentSchema.parse({
  title: 'Gun',
  stem: 'Old stem.',
  script: 'V = draw(1 V, 2 V, 1 V)',
  parts: [blankPart('numeric', 'a'), blankPart('written', 'b')],
});
const marked = (content: ItemContent, id: string, marks: number): ItemContent =>
  withPart(content, id, (part) => ({ ...part, marks }));

describe('two versions of a draft', () => {
  it('differ nowhere when they are equal', () => {
    expect(differences(base, structuredClone(base), null)).toEqual([]);
  });

  it('are told apart field by field and part by part', () => {
    const mine = marked(base, 'a', 3);
    const theirs = { ...marked(base, 'b', 4), stem: 'New stem.' };
    const found = differences(mine, theirs, base);
    expect(found.map((difference) => [difference.label, difference.suggestion])).toEqual([
      ['Stem', 'theirs'],
      ['Part (a)', 'mine'],
      ['Part (b)', 'theirs'],
    ]);
  });

  it('come together without loss when each changed something else', () => {
    const mine = marked(base, 'a', 3);
    const theirs = { ...marked(base, 'b', 4), stem: 'New stem.' };
    const merged = mergeVersions(mine, theirs, differences(mine, theirs, base), {});
    expect(merged.stem).toBe('New stem.');
    expect(merged.parts.map((part) => part.marks)).toEqual([3, 4]);
  });

  it('follow the choice where both changed the same', () => {
    const mine = { ...base, script: 'mine' };
    const theirs = { ...base, script: 'theirs' };
    const found = differences(mine, theirs, base);
    expect(found.map((difference) => chosen(difference, {}))).toEqual(['mine']);
    expect(mergeVersions(mine, theirs, found, { script: 'theirs' }).script).toBe('theirs');
  });

  it('can both keep their own form of a part', () => {
    const mine = marked(base, 'a', 3);
    const theirs = marked(base, 'a', 5);
    const found = differences(mine, theirs, base);
    const merged = mergeVersions(mine, theirs, found, { 'part.a': 'both' });
    expect(merged.parts.map((part) => [part.id, part.marks])).toEqual([
      ['a', 3],
      ['a-2', 5],
      ['b', 1],
    ]);
  });

  it('keep a part that only one added, where it stood', () => {
    const added = {
      ...base,
      parts: [base.parts[0] ?? blankPart('numeric', 'a'), blankPart('numeric', 'c'), ...base.parts.slice(1)],
    };
    const found = differences(base, added, base);
    expect(mergeVersions(base, added, found, {}).parts.map((part) => part.id)).toEqual(['a', 'c', 'b']);
    expect(mergeVersions(base, added, found, { 'part.c': 'mine' }).parts.map((part) => part.id)).toEqual([
      'a',
      'b',
    ]);
  });

  it('notice a removal by one side and leave figures with a place', () => {
    const theirs = {
      ...base,
      figures: [{ figureId: 1, alternativeText: '', caption: '', widthPercent: 60, place: 'b' }],
    };
    const mine = withoutPart(base, 'b');
    const merged = mergeVersions(mine, theirs, differences(mine, theirs, base), {});
    expect(merged.parts.map((part) => part.id)).toEqual(['a']);
    expect(merged.figures.map((figure) => figure.place)).toEqual(['stem']);
  });

  it('tell a new order, and take it over when asked', () => {
    const theirs = { ...base, parts: [...base.parts].reverse() };
    const found = differences(base, theirs, base);
    expect(found.map((difference) => difference.key)).toEqual(['order']);
    expect(mergeVersions(base, theirs, found, {}).parts.map((part) => part.id)).toEqual(['b', 'a']);
    expect(mergeVersions(base, theirs, found, { order: 'mine' }).parts.map((part) => part.id)).toEqual([
      'a',
      'b',
    ]);
  });

  it('suggest mine where the common ground is unknown', () => {
    const found = differences({ ...base, stem: 'A' }, { ...base, stem: 'B' }, null);
    expect(found.map((difference) => difference.suggestion)).toEqual(['mine']);
  });
});
