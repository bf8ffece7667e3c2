import { describe, expect, it } from 'vitest';

import type { Band } from '#shared/engine/index.ts';
import { blankAnswer } from '../draft/blank-parts.ts';
import { bandAsKind } from './BandEditor.tsx';
import { bandFromStrip } from './band-from-strip.ts';

const answer = (band: Band) => ({ ...blankAnswer(), unit: 'mm', figures: 3, band });
const stretch = { low: -0.03, high: 0.03 };

describe('a band taken from the scale', () => {
  it('keeps the form that the writer chose', () => {
    expect(bandFromStrip(answer({ kind: 'percent', percent: 2 }), stretch, 12.5)).toEqual({
      kind: 'percent',
      percent: 3,
    });
    expect(bandFromStrip(answer({ kind: 'absolute', plusMinus: 1, unit: 'mm' }), stretch, 12.5)).toEqual({
      kind: 'absolute',
      plusMinus: 0.375,
      unit: 'mm',
    });
    // 12.5 mm to three figures: the last figure is 0.1 mm, and 3 % is 0.375 mm.
    expect(bandFromStrip(answer({ kind: 'lastFigure', units: 1 }), stretch, 12.5)).toEqual({
      kind: 'lastFigure',
      units: 3.8,
    });
    expect(
      bandFromStrip(answer({ kind: 'limits', from: 0, to: 0, unit: 'mm' }), { low: -0.02, high: 0.04 }, 12.5),
    ).toEqual({
      kind: 'limits',
      from: 12.25,
      to: 13,
      unit: 'mm',
    });
  });

  it('puts the limits of a negative answer in order', () => {
    expect(
      bandFromStrip(answer({ kind: 'limits', from: 0, to: 0, unit: 'mm' }), { low: -0.1, high: 0.1 }, -10),
    ).toMatchObject({ from: -11, to: -9 });
  });

  it('is refused where the form needs a model answer that is not known', () => {
    expect(bandFromStrip(answer({ kind: 'lastFigure', units: 1 }), stretch, null)).toBeNull();
    expect(bandFromStrip(answer({ kind: 'absolute', plusMinus: 1, unit: 'cm' }), stretch, 1)).toBeNull();
  });

  it('begins anew in the unit of the answer when the writer takes another form', () => {
    expect(bandAsKind('absolute', answer({ kind: 'percent', percent: 2 }))).toEqual({
      kind: 'absolute',
      plusMinus: 0,
      unit: 'mm',
    });
  });
});
