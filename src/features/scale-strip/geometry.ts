import type { PartScale, StripMark } from '#shared/engine/index.ts';
import { tidyStep, ticksBetween } from './ticks.ts';

/** A stretch of the scale as signed relative errors (−0.02 is 2 % below the model answer). */
export interface Interval {
  low: number;
  high: number;
}

/** A mark that stands on the scale. */
export interface PlacedMark {
  /** Place of the mark in `scale.marks`, by which it is named. */
  index: number;
  mark: StripMark;
  x: number;
  /** Which way the wrong working reads: low (−1) or high (+1) of the model answer. */
  direction: -1 | 1;
  /** x of the furthest that it gets, held to the scale's end. */
  reach: number;
}

/** Marks beyond one end, in order of distance. */
export interface GatheredMarks {
  side: 'low' | 'high';
  x: number;
  marks: { index: number; mark: StripMark }[];
}

export interface StripGeometry {
  width: number;
  /** x of the model answer. */
  centre: number;
  /** Relative error at either end of the scale, above zero. */
  range: number;
  left: number;
  right: number;
  ticks: { x: number; value: number; major: boolean }[];
  band: { x1: number; x2: number };
  routeSpread: { x1: number; x2: number };
  /** x of each rounding route's hairline: the furthest that it gets, held to the scale's ends. */
  routes: { index: number; mark: StripMark; x: number }[];
  marks: PlacedMark[];
  gathered: GatheredMarks[];
}

/** Room at each end for the count of marks out of range, in pixels. */
export const END_ROOM = 44;
/** The scale never shows less than this to either side (0.1 %). */
const LEAST_RANGE = 0.001;
/** Marks up to so many times the band (or the routes) are brought onto the scale. */
const WORTH_SHOWING = 4;

/** The band as signed errors, whatever signs it is given with. */
export function bandInterval(band: PartScale['band']): Interval {
  return { low: -Math.abs(band.below), high: Math.abs(band.above) };
}

/**
 * How far the scale reaches to either side, as a relative error: the band and the routes with room around
 * them, and any slip or near miss within four times that, rounded up to a tidy number.
 */
export function scaleRange(scale: PartScale, band: Interval): number {
  const core = Math.max(
    LEAST_RANGE,
    ...[band.low, band.high, scale.routeSpread.below, scale.routeSpread.above]
      .map(Math.abs)
      .filter(Number.isFinite),
  );
  const near = scale.marks
    .map((mark) => Math.abs(mark.relativeError))
    .filter((distance) => distance <= WORTH_SHOWING * core);
  const wanted = 1.2 * Math.max(core * 1.25, ...near);
  const step = tidyStep(wanted / 5);
  return step * Math.ceil(wanted / step - 1e-9);
}

/** x of a relative error on a scale `width` wide. */
export function errorToX(error: number, width: number, range: number): number {
  return width / 2 + (error / range) * (width / 2 - END_ROOM);
}

/** The relative error at `x`; the inverse of `errorToX`, held to the ends of the scale. */
export function xToError(x: number, width: number, range: number): number {
  const error = ((x - width / 2) / (width / 2 - END_ROOM)) * range;
  return Math.min(range, Math.max(-range, error));
}

const directionOf = (mark: StripMark): -1 | 1 =>
  mark.relativeError < 0 || (mark.relativeError === 0 && mark.furthest < 0) ? -1 : 1;

function gather(scale: PartScale, range: number, left: number, right: number): GatheredMarks[] {
  const beyond = scale.marks
    .map((mark, index) => ({ mark, index }))
    .filter(({ mark }) => mark.kind !== 'route' && !(Math.abs(mark.relativeError) <= range))
    .sort((a, b) => Math.abs(a.mark.relativeError) - Math.abs(b.mark.relativeError));
  const low = beyond.filter(({ mark }) => directionOf(mark) < 0);
  const high = beyond.filter(({ mark }) => directionOf(mark) > 0);
  const ends: GatheredMarks[] = [
    { side: 'low', x: left - END_ROOM / 2, marks: low },
    { side: 'high', x: right + END_ROOM / 2, marks: high },
  ];
  return ends.filter((end) => end.marks.length > 0);
}

/**
 * Everything of a scale strip that is position: `width` in pixels, `band` as shown (perhaps a trial),
 * `range` as from `scaleRange` (kept while a band is dragged, so that the scale stands still).
 */
export function stripGeometry(
  scale: PartScale,
  width: number,
  band: Interval = bandInterval(scale.band),
  range: number = scaleRange(scale, band),
): StripGeometry {
  const left = END_ROOM;
  const right = width - END_ROOM;
  const at = (error: number): number => errorToX(error, width, range);
  const held = (error: number): number => Math.min(right, Math.max(left, at(error)));
  const routes: StripGeometry['routes'] = [];
  const marks: PlacedMark[] = [];
  scale.marks.forEach((mark, index) => {
    if (mark.kind === 'route') {
      routes.push({ index, mark, x: held(mark.furthest) });
    } else if (Math.abs(mark.relativeError) <= range) {
      const x = at(mark.relativeError);
      marks.push({ index, mark, x, direction: directionOf(mark), reach: held(mark.furthest) });
    }
  });
  marks.sort((a, b) => a.x - b.x);
  const majors = width < 480 ? 4 : 8;
  return {
    width,
    centre: width / 2,
    range,
    left,
    right,
    ticks: ticksBetween(-range, range, majors).map((tick) => ({ ...tick, x: at(tick.value) })),
    band: { x1: held(band.low), x2: held(band.high) },
    routeSpread: { x1: held(scale.routeSpread.below), x2: held(scale.routeSpread.above) },
    routes,
    marks,
    gathered: gather(scale, range, left, right),
  };
}
