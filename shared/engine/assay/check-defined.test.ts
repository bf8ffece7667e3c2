import { describe, expect, it } from 'vitest';
import { findingsOf, itemWith, reportOf } from './assay-fixture.ts';

const LENGTH = [{ quantity: 'x', unit: 'm' }];

describe('values that do not exist', () => {
  it.each([
    ['division by zero', 'a = draw(0 m, 4 m, 1 m)\nx = (2 m)^2 / a', 'it divides by “a”, which is zero'],
    [
      'the root of a negative number',
      'a = draw(-1 m^2, 4 m^2, 1 m^2)\nx = sqrt(a)',
      'it takes the root of “a”, which is negative',
    ],
    [
      'a sine beyond one',
      'a = draw(0.8, 1.1, 0.1)\nb = asin(a)\nx = b * 1 m',
      'it asks for the angle whose sine is “a”, which is 1.10: no sine lies beyond one',
    ],
    [
      'a logarithm of nothing',
      'a = draw(0, 4, 1)\nx = ln(a) * 1 m',
      'it takes the logarithm of “a”, which is zero',
    ],
    ['overflow', 'a = draw(1, 9, 1)\nx = exp(a * 1000) * 1 m', 'grows beyond all bounds'],
  ])('%s stops the item and tells the cause', (_name, script, cause) => {
    const [found, ...others] = findingsOf(itemWith(script, LENGTH), 'undefined-value');
    expect(found).toMatchObject({ severity: 'blocker', check: 'defined' });
    expect(found?.statement).toContain(cause);
    // What follows from the undefined value is not told again.
    expect(others).toEqual([]);
  });

  it('tells the draw, the number of draws and the line', () => {
    const [found] = findingsOf(
      itemWith('a = draw(-2 m^2, 2 m^2, 1 m^2)\nx = sqrt(a)', LENGTH),
      'undefined-value',
    );
    expect(found).toMatchObject({
      worstDraw: 1,
      otherDraws: [2],
      drawCount: 2,
      place: { span: { line: 2 } },
    });
  });

  it('are passed over on draws that a require discards', () => {
    const script = 'a = draw(-1 m^2, 4 m^2, 1 m^2)\nrequire(a > 0 m^2)\nx = sqrt(a)';
    const report = reportOf(itemWith(script, LENGTH));
    expect(report.findings.filter(({ check }) => check === 'defined')).toEqual([]);
    expect(report).toMatchObject({ drawsAssayed: 6, drawsDiscarded: 2, coverage: 'all 6 draws' });
  });
});

describe('conditions', () => {
  it('that keep no draw stop the item', () => {
    const item = itemWith('a = draw(1 m, 4 m, 1 m)\nx = 2 * a\nrequire(x > 9 m)', LENGTH);
    expect(findingsOf(item, 'no-draw-kept')).toMatchObject([{ severity: 'blocker' }]);
  });

  it('that discard nearly everything are told, with the share', () => {
    const item = itemWith('a = draw(1 m, 100 m, 1 m)\nx = 2 * a\nrequire(x > 190 m)', LENGTH);
    const [found] = findingsOf(item, 'most-draws-discarded');
    expect(found?.statement).toBe('The conditions discard 95.0 % of the draws; 5 are left.');
    const loose = itemWith('a = draw(1 m, 100 m, 1 m)\nx = 2 * a\nrequire(x > 100 m)', LENGTH);
    expect(findingsOf(loose, 'most-draws-discarded')).toEqual([]);
  });
});

describe('a script that does not compile', () => {
  it('stops the item at the place of the mistake', () => {
    const item = itemWith('a = 1 m\nx = a + 1 s', LENGTH);
    expect(() => reportOf(item)).toThrow(/cannot be added/);
  });
});
