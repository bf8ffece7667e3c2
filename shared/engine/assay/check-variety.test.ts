import { describe, expect, it } from 'vitest';
import { findingsOf, itemWith, plain, reportOf } from './assay-fixture.ts';
import { sharedAnswerChance } from './shared-answers.ts';

const variety = (item: ReturnType<typeof itemWith>) =>
  reportOf(item).findings.filter(({ check }) => check === 'variety');

describe('answers of different draws', () => {
  it('must differ', () => {
    const item = (factor: string) =>
      itemWith(`a = draw(1, 30, 1)\nx = ${factor} * 1 m`, [{ quantity: 'x', unit: 'm', figures: 2 }]);
    const [found] = variety(item('(a > 15 ? 2 : 5)'));
    expect(found).toMatchObject({ code: 'few-answers', severity: 'caution' });
    expect(found?.statement).toBe('The 30 draws give only 2 different answers to part (a).');
    expect(variety(item('a'))).toEqual([]);
  });

  it('are told to be shared where bands are wide for their range', () => {
    const item = (percent: number) =>
      itemWith('a = draw(1.00 m, 1.60 m, 0.01 m)\nx = 2 * a', [
        { quantity: 'x', unit: 'm', band: { kind: 'percent', percent } },
      ]);
    expect(variety(item(20))).toMatchObject([{ code: 'answers-shared', severity: 'note' }]);
    expect(variety(item(1))).toEqual([]);
  });

  it('have the chance that counting pairs gives', () => {
    // Pairs by hand: of 1, 2, 3, 10 with a reach of 1 the pairs 1-2 and 2-3, of six.
    expect(sharedAnswerChance([1, 2, 3, 10], [1, 1, 1, 1])).toBeCloseTo(2 / 6, 12);
    expect(sharedAnswerChance([5, 5, 5], [0, 0, 0])).toBe(1);
    expect(sharedAnswerChance([7], [1])).toBe(0);
  });
});

describe('unfortunate numbers', () => {
  it('are answers that stand among the givens', () => {
    const item = (from: string) =>
      itemWith(`a = draw(${from}, 4.0 m, 0.5 m)\nb = 2.0 m\nx = a * 2`, [{ quantity: 'x', unit: 'm' }]);
    const [found] = findingsOf(item('0.5 m'), 'answer-equals-given');
    expect(plain(found?.statement)).toBe(
      'The answer to part (a) equals the printed “b” on 1 draw, first on draw 2.',
    );
    expect(findingsOf(item('1.5 m'), 'answer-equals-given')).toEqual([]);
  });

  it('are givens that are equal', () => {
    const item = (condition: string) =>
      itemWith(`a = draw(1.0 m, 4.0 m, 0.5 m)\nb = draw(3.0 m, 6.0 m, 0.5 m)\nx = a * a / b${condition}`, [
        { quantity: 'x', unit: 'm' },
      ]);
    expect(findingsOf(item(''), 'equal-givens')).toMatchObject([{ severity: 'note', drawCount: 3 }]);
    expect(findingsOf(item('\nrequire(a != b)'), 'equal-givens')).toEqual([]);
  });
});
