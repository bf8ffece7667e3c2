import type { PartScale } from '#shared/engine/index.ts';
import type { Interval } from './geometry.ts';
import { tidyStep } from './ticks.ts';

/**
 * The scale as it would be with another band: which wrong workings fall inside, and whether every route
 * does. The assay of the changed item remains the judgement; this is its preview.
 */
export function withTrialBand(scale: PartScale, band: Interval): PartScale {
  return {
    ...scale,
    band: { below: band.low, above: band.high },
    marks: scale.marks.map((mark) => ({
      ...mark,
      insideBand: mark.relativeError >= band.low && mark.relativeError <= band.high,
    })),
  };
}

/** Whether all rounding routes lie within the band. */
export function takesAllRoutes(scale: PartScale, band: Interval): boolean {
  const { below, above } = scale.routeSpread;
  return Math.min(below, above) >= band.low && Math.max(below, above) <= band.high;
}

/** A band end moved by keys or pointer: never past the model answer, held to tidy thousandths of a percent. */
export function movedEnd(band: Interval, end: 'low' | 'high', to: number): Interval {
  const tidy = Math.round(to * 1e5) / 1e5;
  return end === 'low' ? { ...band, low: Math.min(0, tidy) } : { ...band, high: Math.max(0, tidy) };
}

/** How far one press of an arrow key moves a band end: about a hundredth of the scale, tidy. Dragging goes in the same steps. */
export function keyStep(range: number): number {
  return Math.max(1e-5, tidyStep(range / 100));
}
