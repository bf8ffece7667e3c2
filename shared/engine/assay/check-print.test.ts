import { describe, expect, it } from 'vitest';
import type { ItemContent } from '../item/content.ts';
import { itemWith, plain, reportOf } from './assay-fixture.ts';
import type { FigureFacts } from './context.ts';
import { mathsMistakes } from './maths-mistakes.ts';

const SCRIPT = 'Va = draw(150 V, 300 V, 10 V)\nd = draw(10.0 mm, 20.0 mm, 0.5 mm)\nE = Va / d';
const PART = { quantity: 'E', unit: 'kV m^-1' };
const sound = (): ItemContent => itemWith(SCRIPT, [PART], { stem: 'A p.d. of {{Va}} over {{d}}.' });
const print = (item: ItemContent, figures: readonly FigureFacts[] = []) =>
  reportOf(item, { figures }).findings.filter(({ check }) => check === 'print');
const codes = (item: ItemContent, figures: readonly FigureFacts[] = []) =>
  print(item, figures).map(({ code }) => code);

describe('printing', () => {
  it('of a sound item has nothing to tell', () => {
    expect(print(sound())).toEqual([]);
  });

  it.each([
    ['an unknown name', '{{Vb}}', 'The script has no quantity “Vb”'],
    ['a unit that does not fit', '{{Va to mm}}', 'cannot be printed in mm'],
    ['a hole that never closes', '{{Va', 'never closes'],
  ])('stops at %s', (_name, hole, words) => {
    const found = print({ ...sound(), stem: `A p.d. of ${hole}` }).find(
      ({ code }) => code === 'hole-mistake',
    );
    expect(found).toMatchObject({ severity: 'blocker', place: { field: 'stem' } });
    expect(found?.statement).toContain(words);
  });

  it('stops at holes in the mark scheme and in figures too', () => {
    const item = sound();
    const [part] = item.parts;
    if (part === undefined) throw new Error('The item has a part.');
    part.scheme = [{ text: '{{Ee}}', marks: 1 }];
    expect(codes(item)).toEqual(['hole-mistake']);
    expect(codes(sound(), [{ figureId: 1, svg: '<text>{{dd}}</text>' }])).toEqual(['hole-mistake']);
    expect(codes(sound(), [{ figureId: 1, svg: '<text>{{d}}</text>' }])).toEqual([]);
  });

  it('stops where the answer has the wrong unit or no quantity', () => {
    expect(codes(itemWith(SCRIPT, [{ quantity: 'E', unit: 'V' }]))).toContain('unit-mismatch');
    expect(codes(itemWith(SCRIPT, [{ quantity: 'x', unit: 'V' }]))).toContain('answer-missing');
    expect(codes(itemWith(SCRIPT, [{ quantity: '', unit: 'V' }]))).toContain('answer-missing');
  });

  it('stops where the marks do not add up', () => {
    const item = sound();
    const [part] = item.parts;
    if (part !== undefined) part.marks = 3;
    expect(print(item)).toMatchObject([{ code: 'marks-do-not-add-up', severity: 'blocker' }]);
    expect(print(item)[0]?.statement).toBe(
      'Part (a) carries 3 marks, but the lines of its mark scheme add up to 1.',
    );
  });

  it('stops at figures without words or place', () => {
    const figure = {
      figureId: 7,
      caption: '',
      widthPercent: 60,
      place: 'stem',
      alternativeText: 'Two plates',
    };
    const stored = [{ figureId: 7, svg: null }];
    expect(codes({ ...sound(), figures: [figure] }, stored)).toEqual([]);
    expect(codes({ ...sound(), figures: [{ ...figure, alternativeText: ' ' }] }, stored)).toEqual([
      'alternative-text-missing',
    ]);
    expect(codes({ ...sound(), figures: [{ ...figure, place: 'gone' }] }, stored)).toEqual([
      'figure-missing',
    ]);
  });

  it('questions an answer that the candidate can read', () => {
    const item = { ...sound(), stem: 'A p.d. of {{Va}} over {{d}} makes a field of {{E}}.' };
    expect(print(item)).toMatchObject([{ code: 'answer-printed', severity: 'caution' }]);
  });

  it('questions a result that is printed rounded and used in full', () => {
    const item = (field: string) =>
      itemWith(
        `Va = draw(150 V, 300 V, 10 V)\nd = 12.0 mm\nE = ${field}\nF = e * E`,
        [{ quantity: 'F', unit: 'N' }],
        {
          stem: 'Plates {{d}} apart have a field of {{E to kV m^-1, 2 sf}}.',
        },
      );
    expect(print(item('Va / d'))).toMatchObject([
      { code: 'printed-in-full', severity: 'caution', place: { quantity: 'E', span: { line: 3 } } },
    ]);
    expect(print(item('given(Va / d, 2)'))).toEqual([]);
  });

  it('questions a value that is shown no finer than it is stated, or not stated', () => {
    const shows = (figures: number, text?: string) =>
      itemWith(SCRIPT, [{ ...PART, figures, shows: 2, ...(text === undefined ? {} : { text }) }]);
    expect(codes(shows(2))).toContain('show-that-figures');
    expect(codes(shows(3))).not.toContain('show-that-figures');
    expect(codes(shows(3, 'Show it.'))).toContain('value-not-stated');
  });
});

describe('printed numbers', () => {
  it('are noted where another prefix would read better', () => {
    const item = (least: string, most: string, step: string) =>
      itemWith(`d = draw(${least}, ${most}, ${step})\nx = 2 * d`, [{ quantity: 'x', unit: 'm' }], {
        stem: 'A rod of {{d}}.',
      });
    const [found] = print(item('0.010 m', '0.090 m', '0.001 m'));
    expect(found).toMatchObject({ code: 'awkward-number', severity: 'note', worstDraw: 1, drawCount: 81 });
    expect(plain(found?.statement)).toBe('On draw 1 “d” prints as 0.010 m; 81 draws show it.');
    expect(print(item('10 mm', '90 mm', '1 mm'))).toEqual([]);
  });

  it('in standard form are as large as they like', () => {
    const item = itemWith(
      'f = draw(5.0e14 Hz, 9.0e14 Hz, 0.1e14 Hz)\nx = h * f',
      [{ quantity: 'x', unit: 'J' }],
      {
        stem: 'Light of {{f}}.',
      },
    );
    expect(print(item)).toEqual([]);
  });

  it('with open zeros are noted where figures are enforced', () => {
    const item = (enforceFigures: boolean) =>
      itemWith(SCRIPT, [{ ...PART, enforceFigures }], { stem: 'A p.d. of {{Va}} over {{d}}.' });
    expect(print(item(true))).toMatchObject([{ code: 'ambiguous-zeros', severity: 'note' }]);
    expect(print(item(false))).toEqual([]);
  });
});

describe('formulas', () => {
  it.each([
    ['$\\frac{1}{2}mv^2$', 0],
    ['A price of \\$5 and `$x`', 0],
    ['$$\nE = \\left(\\frac{V}{d}\\right)\n$$', 0],
    ['$v = {{v}}$', 0],
    ['$\\frac{1{2}$', 1],
    ['$E = \\left( V$', 1],
    ['$x^$', 1],
    ['Half a $formula', 1],
    ['$\\begin{array}{c} 1 $', 1],
    ['$a}$', 1],
  ])('%s has %d mistakes', (text, count) => {
    expect(mathsMistakes(text)).toHaveLength(count);
  });

  it('stop the item at the text in which they stand', () => {
    expect(print({ ...sound(), stem: 'So $\\frac{1{2}$.' })).toMatchObject([
      { code: 'maths-mistake', severity: 'blocker', place: { field: 'stem' } },
    ]);
  });
});
