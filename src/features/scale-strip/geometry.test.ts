import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { PartScale, StripMark } from '#shared/engine/index.ts';
import { bandInterval, END_ROOM, errorToX, scaleRange, stripGeometry, xToError } from './geometry.ts';
import { placeLabels } from './lanes.ts';
import { tidyStep, ticksBetween } from './ticks.ts';
import { keyStep, movedEnd, takesAllRoutes, withTrialBand } from './trial.ts';
import { describeMark, describeScale, percentText } from './words.ts';

const mark = (kind: StripMark['kind'], relativeError: number, more: Partial<StripMark> = {}): StripMark => ({
  kind,
  label: `${kind} at ${relativeError}`,
  relativeError,
  furthest: relativeError,
  draw: 1,
  insideBand: false,
  ...more,
});
const scale = (marks: StripMark[]): PartScale => ({
  partId: 'p1',
  quantity: 'v',
  unit: 'm s^-1',
  band: { below: 0.02, above: 0.02 },
  routeSpread: { below: -0.004, above: 0.003 },
  worstRoute: '',
  worstRouteDraw: null,
  marks,
  recommended: { percent: 1, verdict: 'wide', reason: '' },
});

describe('the ticks of a scale', () => {
  it('stand on 1, 2 and 5 times a power of ten', () => {
    expect([0.0007, 0.011, 0.04, 0.051, 3, 1].map(tidyStep)).toEqual([0.001, 0.02, 0.05, 0.1, 5, 1]);
    expect(tidyStep(Number.NaN)).toBe(1);
  });

  it('are whole multiples of their step, without floating-point dust, and include zero', () => {
    const ticks = ticksBetween(-0.03, 0.03, 6);
    expect(ticks.map((tick) => tick.value)).toContain(0);
    expect(ticks.filter((tick) => tick.major).map((tick) => tick.value)).toEqual([
      -0.03, -0.02, -0.01, 0, 0.01, 0.02, 0.03,
    ]);
    expect(ticksBetween(1, 1, 5)).toEqual([]);
  });
});

describe('positions on the strip', () => {
  it('put the model answer at the centre and turn back into the same error', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1, max: 1, noNaN: true }),
        fc.integer({ min: 200, max: 2000 }),
        fc.double({ min: 1e-4, max: 10, noNaN: true }),
        (share, width, range) => {
          const error = share * range;
          expect(xToError(errorToX(error, width, range), width, range)).toBeCloseTo(error, 8);
          expect(errorToX(0, width, range)).toBe(width / 2);
        },
      ),
    );
  });

  it('take the band with whatever signs it comes', () => {
    expect(bandInterval({ below: -0.01, above: 0.02 })).toEqual({ low: -0.01, high: 0.02 });
    expect(bandInterval({ below: 0.01, above: 0.02 })).toEqual({ low: -0.01, high: 0.02 });
  });

  it('gather what is out of range at its own end, the nearest first', () => {
    const geometry = stripGeometry(
      scale([mark('slip', 1), mark('nearMiss', 0.41), mark('slip', -0.5), mark('nearMiss', 0.05)]),
      600,
    );
    expect(geometry.marks.map((placed) => placed.mark.relativeError)).toEqual([0.05]);
    expect(
      geometry.gathered.map((end) => [end.side, end.marks.map((entry) => entry.mark.relativeError)]),
    ).toEqual([
      ['low', [-0.5]],
      ['high', [0.41, 1]],
    ]);
    expect(geometry.gathered.every((end) => end.x < END_ROOM || end.x > 600 - END_ROOM)).toBe(true);
  });

  it('lose no slip or near miss, and keep everything within the width', () => {
    const errors = fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { maxLength: 40 });
    fc.assert(
      fc.property(errors, fc.integer({ min: 320, max: 1400 }), (values, width) => {
        const marks = values.map((value) => mark('nearMiss', value));
        const geometry = stripGeometry(scale(marks), width);
        const gathered = geometry.gathered.flatMap((end) => end.marks);
        expect(geometry.marks.length + gathered.length).toBe(values.length);
        for (const placed of geometry.marks) {
          expect(placed.x).toBeGreaterThanOrEqual(geometry.left);
          expect(placed.x).toBeLessThanOrEqual(geometry.right);
        }
      }),
    );
  });

  it('bring the nearest wrong working onto the scale when it is close to the band', () => {
    expect(scaleRange(scale([mark('slip', 0.06)]), { low: -0.02, high: 0.02 })).toBeGreaterThan(0.06);
    expect(scaleRange(scale([mark('slip', 2)]), { low: -0.02, high: 0.02 })).toBeLessThan(0.06);
  });

  it('point the way that the wrong working reads', () => {
    const geometry = stripGeometry(scale([mark('slip', 0.03), mark('slip', -0.03)]), 600);
    expect(geometry.marks.map((placed) => placed.direction)).toEqual([-1, 1]);
  });

  it('put a working without a finite error at an end', () => {
    const geometry = stripGeometry(scale([mark('nearMiss', Number.POSITIVE_INFINITY)]), 600);
    expect(geometry.gathered.map((end) => end.side)).toEqual(['high']);
  });
});

describe('labels', () => {
  it('never cover one another on a line', () => {
    const errors = fc.array(fc.double({ min: -0.05, max: 0.05, noNaN: true }), { maxLength: 25 });
    fc.assert(
      fc.property(errors, (values) => {
        const { marks } = stripGeometry(scale(values.map((value) => mark('slip', value))), 640);
        const labels = placeLabels(marks, 640, 4);
        for (const one of labels) {
          for (const other of labels) {
            if (one === other || one.lane !== other.lane) continue;
            const start = (label: typeof one): number =>
              label.anchor === 'start' ? label.x : label.x - label.text.length * 6.6;
            const end = (label: typeof one): number => start(label) + label.text.length * 6.6;
            expect(end(one) <= start(other) || end(other) <= start(one)).toBe(true);
          }
        }
      }),
    );
  });

  it('go first to what lies inside the band', () => {
    const marks = [
      mark('nearMiss', 0.0301),
      mark('slip', 0.03),
      mark('nearMiss', 0.01, { insideBand: true }),
    ];
    const placed = placeLabels(stripGeometry(scale(marks), 400).marks, 400, 1);
    expect(placed[0]?.index).toBe(2);
  });
});

describe('a band that is tried', () => {
  it('tells which wrong workings fall inside and whether the routes fit', () => {
    const tried = withTrialBand(scale([mark('slip', 0.03), mark('slip', -0.03)]), {
      low: -0.01,
      high: 0.035,
    });
    expect(tried.marks.map((entry) => entry.insideBand)).toEqual([true, false]);
    expect(takesAllRoutes(tried, { low: -0.004, high: 0.003 })).toBe(true);
    expect(takesAllRoutes(tried, { low: -0.0039, high: 0.003 })).toBe(false);
  });

  it('never turns inside out', () => {
    expect(movedEnd({ low: -0.02, high: 0.02 }, 'low', 0.01)).toEqual({ low: 0, high: 0.02 });
    expect(movedEnd({ low: -0.02, high: 0.02 }, 'high', 0.0312345)).toEqual({ low: -0.02, high: 0.03123 });
    expect(keyStep(0.05)).toBe(0.0005);
  });
});

describe('words', () => {
  it('carry a real minus sign, a plus sign and the percent sign', () => {
    expect([0.021, -0.0004, 0, 1.5, -0.30103].map((error) => percentText(error))).toEqual([
      '+2.1\u202f%',
      '−0.04\u202f%',
      '0\u202f%',
      '+150\u202f%',
      '−30\u202f%',
    ]);
  });

  it('say of a mark what it is, where it stands and whether it would earn the marks', () => {
    expect(describeMark(mark('slip', -0.293, { label: 'half left out', furthest: -0.3, draw: 12 }))).toBe(
      'Slip: half left out, at its closest −29.3\u202f% from the model answer, at its furthest −30\u202f%; outside the band. Draw 12.',
    );
    expect(
      describeScale(scale([mark('nearMiss', 0.01, { insideBand: true })]), { low: -0.02, high: 0.02 }),
    ).toContain('1 slip or near miss, 1 inside the band.');
  });
});
