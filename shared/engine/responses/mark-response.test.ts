import { describe, expect, it } from 'vitest';
import { readUnit } from '../units/read-unit.ts';
import { markResponse, type MarkingTarget } from './mark-response.ts';

function target(changes: Partial<MarkingTarget> = {}): MarkingTarget {
  const reading = readUnit('mT');
  if (!reading.ok) throw new Error(reading.message);
  return {
    value: 1.25e-3,
    unit: reading.unit,
    band: { from: 1.2e-3, to: 1.3e-3 },
    figures: 3,
    enforceFigures: false,
    marks: 2,
    slips: [
      { name: 'Diameter taken for the radius', value: 2.5e-3, marks: 1, guidance: 'Give the method mark.' },
    ],
    nearMisses: [{ name: 'A square left out', value: 3.5e-3 }],
    carriedForward: null,
    ...changes,
  };
}

describe('markResponse', () => {
  it.each([
    ['1.25 mT', 'accepted', 2, 'Inside the band'],
    ['1.25e-3 T', 'accepted', 2, 'Inside the band'],
    ['1.20 mT', 'accepted', 2, 'Inside the band'],
    ['1.3 mT', 'accepted', 2, 'Inside the band'],
    ['1250 µT', 'accepted', 2, 'Inside the band'],
    ['1.25', 'unit', 0, 'is missing'],
    ['1.25 V', 'unit', 0, 'should be mT, not V'],
    ['1.25 T', 'unit', 0, 'it is written in T'],
    ['2.49 mT', 'slip', 1, 'Diameter taken for the radius. Give the method mark.'],
    ['125 mT', 'powerOfTen', 0, '100 times too large'],
    ['0.125 mT', 'powerOfTen', 0, '10 times too small'],
    ['-1.25 mT', 'sign', 0, 'the sign is wrong'],
    ['3.5 mT', 'nearMiss', 0, 'A square left out'],
    ['1.19 mT', 'outside', 0, 'below the model answer'],
    ['1.35 mT', 'outside', 0, '8.0 % above the model answer, 4.0 % beyond the band’s end at 1.300 mT'],
    ['7 V', 'outside', 0, 'does not measure what is asked for'],
    ['two', 'notRead', 0, 'No number'],
  ] as const)('says of “%s”: %s', (text, kind, marks, words) => {
    const verdict = markResponse(target(), text);
    expect(verdict.kind).toBe(kind);
    expect(verdict.marks).toBe(marks);
    expect(verdict.reason).toContain(words);
  });

  it('accepts a missing unit where the answer line prints it', () => {
    expect(markResponse(target({ unitPrinted: true }), '1.25').kind).toBe('accepted');
  });

  it('enforces figures only where asked, and gives ambiguous zeros the benefit', () => {
    expect(markResponse(target({ enforceFigures: true }), '1.3 mT')).toMatchObject({
      kind: 'figures',
      marks: 0,
    });
    expect(markResponse(target({ enforceFigures: true }), '1250 µT').kind).toBe('accepted');
    expect(markResponse(target(), '1.3 mT').kind).toBe('accepted');
  });

  it('accepts what follows rightly from the candidate’s own earlier answer', () => {
    const carriedForward = { value: 2e-3, band: { from: 1.95e-3, to: 2.05e-3 } };
    expect(markResponse(target({ carriedForward }), '2.00 mT')).toMatchObject({
      kind: 'carriedForward',
      marks: 2,
    });
  });

  it('takes negative answers and their bands', () => {
    const negative = target({
      value: -1.25e-3,
      band: { from: -1.3e-3, to: -1.2e-3 },
      slips: [{ name: 'Twice', value: -2.5e-3 }],
    });
    expect(markResponse(negative, '-1.25 mT').kind).toBe('accepted');
    expect(markResponse(negative, '1.25 mT').kind).toBe('sign');
    expect(markResponse(negative, '-2.5 mT').kind).toBe('slip');
    expect(markResponse(negative, '-125 mT').kind).toBe('powerOfTen');
  });
});
