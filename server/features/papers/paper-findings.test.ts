import { describe, expect, it } from 'vitest';

import { itemContentSchema, type ItemContent } from '#shared/engine/index.ts';
import type { BuiltPaper, ItemFacts } from '../../workers/task-types.ts';
import { coincidences, findInPaper, type PaperToCheck } from './paper-findings.ts';
import type { PlaceRecord } from './queries.ts';

const METRES = 'metres';
const VOLTS = 'volts';

const part = (marks: number, scheme: number[]) => ({
  id: 'a',
  kind: 'written' as const,
  text: 'Explain.',
  marks,
  scheme: scheme.map((each) => ({ text: 'a point', marks: each })),
});

function place(position: number, given: Partial<PlaceRecord> & { parts?: unknown[] } = {}): PlaceRecord {
  const { parts = [part(3, [2, 1])], ...columns } = given;
  return {
    id: 100 + position,
    position,
    draw: 5,
    itemId: position,
    itemCode: `EG-00${position}`,
    itemState: 'approved',
    topicId: 1,
    topicCode: 'EG',
    topicName: 'Electron guns',
    revisionId: position,
    revision: 1,
    content: itemContentSchema.parse({ title: 'Gun', stem: 'A gun.', parts }),
    approvedRevision: 1,
    ...columns,
  };
}

const noFacts: ItemFacts = { answers: [], printed: [], undefinedParts: [] };
const soundDraw = { gridSize: 25, open: false, exists: true, kept: true, compiles: true };

function check(
  places: PlaceRecord[],
  given: Partial<Omit<PaperToCheck, 'built'>> & { built?: Partial<BuiltPaper> } = {},
) {
  const marks = places.reduce(
    (sum, { content }) => sum + content.parts.reduce((all, one) => all + one.marks, 0),
    0,
  );
  const { built, ...rest } = given;
  return findInPaper({
    paper: { targetMarks: marks },
    places,
    otherUses: [],
    ...rest,
    built: {
      sheet: { marks } as BuiltPaper['sheet'],
      scheme: {} as BuiltPaper['scheme'],
      draws: places.map(() => soundDraw),
      facts: places.map(() => noFacts),
      ...built,
    },
  });
}

const content = (given: Partial<ItemContent>): ItemContent => ({ ...place(1).content, ...given });

describe('the checks of a paper', () => {
  it('find nothing wrong with a sound paper', () => {
    expect(check([place(1), place(2)])).toEqual([]);
  });

  it.each([
    [10, 'The paper carries 3 marks, 7 short of the target of 10.', 'Add items, or lower the target.'],
    [2, 'The paper carries 3 marks, 1 over the target of 2.', 'Take items off, or raise the target.'],
  ])('find a total that is not the target of %d', (targetMarks, statement, cure) => {
    expect(check([place(1)], { paper: { targetMarks } })).toMatchObject([
      { code: 'total-off-target', severity: 'blocker', statement, cure },
    ]);
  });

  it('find a paper without items, and say nothing of its total', () => {
    expect(check([], { paper: { targetMarks: 60 } })).toMatchObject([
      { code: 'no-items', severity: 'blocker' },
    ]);
  });

  it.each([
    ['draw-missing', { ...soundDraw, exists: false }, []],
    ['draw-discarded', { ...soundDraw, kept: false }, []],
    ['draw-discarded', { ...soundDraw, compiles: false }, []],
    ['draw-undefined', soundDraw, ['b', 'c']],
  ])('find %s', (code, draw, undefinedParts) => {
    const found = check([place(1)], {
      built: { draws: [draw], facts: [{ ...noFacts, undefinedParts }] },
    });
    expect(found).toMatchObject([{ code, severity: 'blocker', placeIds: [101] }]);
  });

  it('find a newer approved revision and a withdrawn item', () => {
    expect(check([place(1, { approvedRevision: 2 })])).toMatchObject([
      { code: 'newer-revision', severity: 'caution' },
    ]);
    expect(check([place(1, { itemState: 'withdrawn', approvedRevision: null })])).toMatchObject([
      { code: 'item-withdrawn', severity: 'blocker' },
    ]);
    // A new draft of an item that stays approved is no reason.
    expect(check([place(1, { itemState: 'drafting' })])).toEqual([]);
  });

  it('find marks that the mark scheme does not give', () => {
    const found = check([place(1, { parts: [part(3, [2, 1]), { ...part(2, [1]), id: 'b' }] })]);
    expect(found).toMatchObject([
      {
        code: 'marks-do-not-add-up',
        severity: 'blocker',
        statement: 'Item 1 (EG-001) part (b) carries 2 marks, but its mark scheme gives 1.',
      },
    ]);
  });

  it('find a figure without alternative text', () => {
    const figure = { figureId: 1, alternativeText: ' ', caption: '', widthPercent: 60, place: 'stem' };
    expect(check([place(1, { content: content({ figures: [figure] }) })])).toMatchObject([
      { code: 'alternative-text-missing', severity: 'blocker' },
    ]);
  });

  it('find practical work, with its hazard and deference to local rules', () => {
    const practical = content({ practical: true, stem: 'Use an extra-high tension supply.' });
    const [found] = check([place(1, { content: practical })]);
    expect(found).toMatchObject({ code: 'practical-item', severity: 'caution' });
    expect(found?.statement).toMatch(/High-tension supply/);
    expect(found?.cure).toMatch(/competent person’s risk assessment/);
  });

  it('find where an item stands on another paper, with the same values or others', () => {
    const use = { itemId: 1, paperCode: 'P-007' };
    expect(check([place(1)], { otherUses: [{ ...use, draw: 6 }] })).toMatchObject([
      { code: 'item-on-other-paper', severity: 'note' },
    ]);
    expect(check([place(1)], { otherUses: [{ ...use, draw: 5 }] })).toMatchObject([
      { code: 'same-draw-on-other-paper', severity: 'caution' },
    ]);
  });

  it('tell the gravest first', () => {
    const found = check([place(1, { approvedRevision: 2 })], {
      paper: { targetMarks: 9 },
      otherUses: [{ itemId: 1, paperCode: 'P-007', draw: 1 }],
    });
    expect(found.map(({ severity }) => severity)).toEqual(['blocker', 'caution', 'note']);
  });
});

describe('an answer that another item prints', () => {
  const answer = {
    partId: 'a',
    letter: 'a',
    text: '12.0 mm',
    answerSI: 0.012,
    fromSI: 0.0117,
    toSI: 0.0123,
    dimension: METRES,
  };
  const prints = (valueSI: number, dimension = METRES) => ({
    ...noFacts,
    printed: [{ text: '12.1 mm', valueSI, dimension }],
  });

  it('is found where the value lies in its band and is of its kind', () => {
    expect(coincidences([{ ...noFacts, answers: [answer] }, prints(0.0121)])).toEqual([
      { printedBy: 1, answers: 0, letter: 'a', text: '12.1 mm' },
    ]);
    const found = check([place(1), place(2)], {
      built: { facts: [{ ...noFacts, answers: [answer] }, prints(0.0121)] },
    });
    expect(found).toMatchObject([{ code: 'answer-given-away', severity: 'caution', placeIds: [102, 101] }]);
    expect(found[0]?.statement).toBe(
      'Item 2 (EG-002) prints 12.1 mm, which would be accepted for item 1 (EG-001) part (a).',
    );
  });

  it.each([
    ['outside the band', prints(0.0124), METRES],
    ['of another kind', prints(0.0121, VOLTS), METRES],
    ['a bare number', prints(0.0121), null],
  ])('is not found %s', (_name, other, dimension) => {
    expect(coincidences([{ ...noFacts, answers: [{ ...answer, dimension }] }, other])).toEqual([]);
  });

  it('does not count within one item, whose own assay looks at that', () => {
    expect(coincidences([{ ...prints(0.0121), answers: [answer] }])).toEqual([]);
  });
});
