import { compileExpression, evaluateExpression } from '../compile/expressions.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import type { BlockValues } from '../compile/compiled-script.ts';
import { fromSI } from '../units/convert.ts';
import { sameDimension } from '../units/dimension.ts';
import { roundToFigures } from '../units/rounding.ts';
import { Tally } from './check.ts';
import type { AssayContext, AssayPart } from './context.ts';
import { nearMissesOf, type NearMiss } from './near-misses.ts';
import { bandsOfBlock, within } from './part-marking.ts';
import { followRoute, routesOf, type Route } from './routes.ts';

/** How far a working's answers lie from the model answer over the draws, as relative errors. */
interface Reach {
  /** Signed, closest to the model answer. */
  closest: number;
  /** Signed, furthest from it. */
  furthest: number;
  /** Draw of the closest approach, and the two answers there, in the answer's unit. */
  draw: number;
  value: number;
  answer: number;
  /** Draws on which the answer lies in the band. */
  inside: Tally;
}

interface MeasuredRoute {
  route: Route;
  reach: Reach;
  /** Draws on which this honest answer falls outside the band. */
  outside: Tally;
  /** On the worst of these, in the answer's unit: the route's answer, the model answer and the band. */
  worst: { value: number; answer: number; from: number; to: number } | null;
}

interface MeasuredWorking {
  kind: 'slip' | 'nearMiss';
  label: string;
  /** Whether it has the dimension of the answer. */
  fits: boolean;
  reach: Reach;
}

/** Everything that is measured of one part over the draws. */
export interface PartMeasure {
  part: AssayPart;
  routes: MeasuredRoute[];
  workings: MeasuredWorking[];
  /** Extremes of all routes, relative to the model answer, signed. */
  below: number;
  above: number;
  worstRoute: Route | null;
  worstRouteDraw: number | null;
  /** Narrowest band over the draws, relative, positive. */
  bandBelow: number;
  bandAbove: number;
  bandMistake: boolean;
  drawsFollowed: number;
  /** Every so many-th kept draw is followed. */
  stride: number;
  visit: (block: BlockValues) => void;
}

/** Evaluations of one part's routes that an assay affords. */
const ROUTE_BUDGET = 300_000;

const newReach = (): Reach => ({
  closest: Infinity,
  furthest: 0,
  draw: 0,
  value: NaN,
  answer: NaN,
  inside: new Tally(),
});

function note(reach: Reach, draw: number, value: number, answer: number, from: number, to: number): void {
  const error = (value - answer) / Math.abs(answer);
  if (!Number.isFinite(error)) return;
  if (Math.abs(error) < Math.abs(reach.closest)) {
    reach.closest = error;
    reach.draw = draw;
    reach.value = value;
    reach.answer = answer;
  }
  if (Math.abs(error) > Math.abs(reach.furthest)) reach.furthest = error;
  if (within(value, from, to)) reach.inside.add(draw, -Math.abs(error));
}

/** Picks every `stride`-th kept draw of a block, evaluated in full. */
function thin(context: AssayContext, block: BlockValues, stride: number, offset: number): BlockValues | null {
  const chosen: number[] = [];
  let at = offset;
  for (let index = 0; index < block.draws.length; index += 1) {
    if (block.kept[index] === 0) continue;
    if (at % stride === 0) chosen.push(block.draws[index] ?? 0);
    at += 1;
  }
  if (chosen.length === 0) return null;
  return evaluateBlock(context.script, Float64Array.from(chosen), { conditions: false });
}

interface Wrong {
  working: MeasuredWorking;
  miss: NearMiss;
}

function slipsOf(context: AssayContext, { part, info }: AssayPart): Wrong[] {
  return part.answer.slips.flatMap((slip): Wrong[] => {
    const { expression } = compileExpression(context.script, slip.expression);
    if (expression?.shape.kind !== 'scalar') return [];
    const label = slip.name || slip.expression;
    const fits = sameDimension(expression.dimension, info.dimension);
    return [
      {
        working: { kind: 'slip', label, fits, reach: newReach() },
        miss: { label, expression, factor: 1, fits },
      },
    ];
  });
}

/** Two workings whose answers agree so well on every draw are one. */
const SAME = 1e-9;

function sameColumns(a: Float64Array, b: Float64Array): boolean {
  return a.every((value, index) => {
    const other = b[index] ?? NaN;
    return Math.abs(value - other) <= SAME * Math.abs(other) || (Number.isNaN(value) && Number.isNaN(other));
  });
}

/** Answers of a wrong working on the draws of a block, in the answer's unit. */
function answersOf({ miss }: Wrong, part: AssayPart, sample: BlockValues): Float64Array {
  return evaluateExpression(miss.expression, sample).map((value) => fromSI(value * miss.factor, part.unit));
}

/** Leaves out near misses that are the right answer under another name, or an earlier wrong one. */
function distinct(
  wrong: readonly Wrong[],
  part: AssayPart,
  sample: BlockValues,
  answers: Float64Array,
): Wrong[] {
  const seen = [answers];
  return wrong.filter((entry) => {
    const column = answersOf(entry, part, sample);
    const known = seen.some((other) => sameColumns(column, other));
    if (!known) seen.push(column);
    return entry.working.kind === 'slip' || !known;
  });
}

/** A measure of one part that is fed block by block. */
export function measurePart(context: AssayContext, part: AssayPart): PartMeasure {
  const figures = part.part.answer.figures;
  const routes = routesOf(context, part).map((route): MeasuredRoute => ({
    route,
    reach: newReach(),
    outside: new Tally(),
    worst: null,
  }));
  let wrong = [
    ...slipsOf(context, part),
    ...nearMissesOf(context, part).map((miss): Wrong => ({
      working: { kind: 'nearMiss', label: miss.label, fits: miss.fits, reach: newReach() },
      miss,
    })),
  ];
  const each = routes.length + wrong.length;
  const stride = Math.max(1, Math.ceil((context.plan.count * each) / ROUTE_BUDGET));
  let passed = 0;

  const measure: PartMeasure = {
    part,
    routes,
    workings: [],
    below: 0,
    above: 0,
    worstRoute: null,
    worstRouteDraw: null,
    bandBelow: Infinity,
    bandAbove: Infinity,
    bandMistake: false,
    drawsFollowed: 0,
    stride,
    visit: (block) => {
      const sample = thin(context, block, stride, passed);
      for (const kept of block.kept) passed += kept;
      if (sample === null) return;
      const bands = bandsOfBlock(part, sample);
      if (bands === null) {
        measure.bandMistake = true;
        return;
      }
      measure.drawsFollowed += sample.draws.length;
      for (let index = 0; index < sample.draws.length; index += 1) {
        const answer = bands.answers[index] ?? NaN;
        const size = Math.abs(answer) || 1;
        measure.bandBelow = Math.min(measure.bandBelow, (answer - (bands.from[index] ?? NaN)) / size);
        measure.bandAbove = Math.min(measure.bandAbove, ((bands.to[index] ?? NaN) - answer) / size);
      }
      for (const entry of routes) {
        const column = followRoute(context, part, entry.route, sample);
        for (let index = 0; index < column.length; index += 1) {
          const answer = bands.answers[index] ?? NaN;
          const value = roundToFigures(fromSI(column[index] ?? NaN, part.unit), figures);
          const draw = sample.draws[index] ?? 0;
          const from = bands.from[index] ?? NaN;
          const to = bands.to[index] ?? NaN;
          const error = (value - answer) / Math.abs(answer || 1);
          if (!Number.isFinite(error)) continue;
          note(entry.reach, draw, value, answer, from, to);
          if (!within(value, from, to)) {
            if (Math.abs(error) > entry.outside.worstBadness) entry.worst = { value, answer, from, to };
            entry.outside.add(draw, Math.abs(error));
          }
          if (Math.abs(error) > Math.max(measure.above, -measure.below)) {
            measure.worstRoute = entry.route;
            measure.worstRouteDraw = draw;
          }
          measure.below = Math.min(measure.below, error);
          measure.above = Math.max(measure.above, error);
        }
      }
      if (measure.workings.length === 0) {
        wrong = distinct(wrong, part, sample, bands.answers);
        measure.workings = wrong.map(({ working }) => working);
      }
      for (const entry of wrong) {
        const column = answersOf(entry, part, sample);
        for (let index = 0; index < column.length; index += 1) {
          note(
            entry.working.reach,
            sample.draws[index] ?? 0,
            column[index] ?? NaN,
            bands.answers[index] ?? NaN,
            bands.from[index] ?? NaN,
            bands.to[index] ?? NaN,
          );
        }
      }
    },
  };
  return measure;
}
