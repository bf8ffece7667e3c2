import type { BlockValues, ConstantPrecision } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import { fromSI, toSI } from '../units/convert.ts';
import { roundToFigures } from '../units/rounding.ts';
import { printingOf } from '../holes/fill-hole.ts';
import type { AssayContext, AssayPart } from './context.ts';

/** One honest way to carry the working. */
export interface Route {
  /** Computed names that are rounded to the part's figures before they are used. */
  rounded: readonly string[];
  constants: Extract<ConstantPrecision, string>;
  /** Earlier show-that values taken as the text states them. */
  stated: readonly StatedValue[];
}

/** A show-that value of an earlier part, as its text states it. */
export interface StatedValue {
  name: string;
  letter: string;
  figures: number;
  /** Rounds a value (SI) as the text prints it. */
  round: (value: number) => number;
}

/** Up to so many intermediates all combinations are tried. */
export const MOST_COMBINED = 8;

function subsets(names: readonly string[]): string[][] {
  if (names.length <= MOST_COMBINED) {
    return Array.from({ length: 2 ** names.length }, (_, bits) =>
      names.filter((_name, index) => (bits & (1 << index)) !== 0),
    );
  }
  return [[], ...names.map((name) => [name]), [...names]];
}

/** Values that earlier show-that parts state and that this part's working rests on. */
export function statedValues(context: AssayContext, part: AssayPart): StatedValue[] {
  const rests = new Set(dependenciesOf(context.script, part.info.name).names);
  const holes = { script: context.script, quantities: context.content.quantities };
  return context.parts
    .filter((earlier) => earlier.index < part.index && rests.has(earlier.info.name))
    .flatMap(({ part: earlier, letter, info }): StatedValue[] => {
      if (earlier.kind !== 'showThat') return [];
      const figures = earlier.statedFigures;
      const printing = printingOf(holes, info.name);
      const unit = 'problem' in printing ? null : printing.unit;
      const round = (value: number) =>
        unit === null
          ? roundToFigures(value, figures)
          : toSI(roundToFigures(fromSI(value, unit), figures), unit);
      return [{ name: info.name, letter, figures, round }];
    });
}

/** Nobody rounds on the way to a whole number to fewer figures than this; common practice. */
const LEAST_ROUTE_FIGURES = 3;

/** The figures that a candidate keeps on the way: the part's own, and enough to reach a whole number. */
export function routeFigures({ part }: AssayPart): number {
  const exact = part.answer.band.kind === 'absolute' && part.answer.band.plusMinus === 0;
  return exact ? Math.max(LEAST_ROUTE_FIGURES, part.answer.figures) : part.answer.figures;
}

/** Every route of a part's working: which results are rounded, which constants and stated values are taken. */
export function routesOf(context: AssayContext, part: AssayPart): Route[] {
  const whole = new Set(
    context.content.quantities.filter(({ role }) => role === 'chargeNumber').map(({ name }) => name),
  );
  const intermediates = part.dependencies.intermediates.filter((name) => {
    const info = context.script.quantities.find((quantity) => quantity.name === name);
    return info?.shape.kind === 'scalar' && !whole.has(name);
  });
  const constants: Route['constants'][] =
    part.dependencies.constants.length === 0 ? ['full'] : ['full', 'dataSheet'];
  const stated = statedValues(context, part);
  const statedChoices = stated.length === 0 ? [[]] : [[], stated];
  return subsets(intermediates).flatMap((rounded) =>
    constants.flatMap((precision) =>
      statedChoices.map((taken) => ({ rounded, constants: precision, stated: taken })),
    ),
  );
}

/** The answers (SI, before the final rounding) that a route gives on the draws of a block. */
export function followRoute(
  context: AssayContext,
  part: AssayPart,
  route: Route,
  block: BlockValues,
): Float64Array {
  const figures = routeFigures(part);
  const pinned = new Map<string, Float64Array>();
  for (const { name, round } of route.stated) {
    const column = block.columns.get(name);
    if (column !== undefined) pinned.set(name, column.map(round));
  }
  const values = evaluateBlock(context.script, block.draws, {
    wanted: [part.info.name],
    conditions: false,
    roundIntermediates: new Map(route.rounded.map((name) => [name, figures])),
    constants: route.constants,
    pinned,
  });
  return values.columns.get(part.info.name) ?? new Float64Array(block.draws.length).fill(NaN);
}

function list(names: readonly string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

/** A route in the words that a candidate would use. */
export function routeInWords(route: Route, part: AssayPart): string {
  const figures = part.part.answer.figures;
  const pieces: string[] = [];
  for (const { name, letter, figures: kept } of route.stated) {
    pieces.push(`taking “${name}” as part (${letter}) states it, to ${kept} figures`);
  }
  const rounded = route.rounded.filter((name) => !route.stated.some((taken) => taken.name === name));
  if (rounded.length > 0) {
    pieces.push(
      `rounding ${list(rounded.map((name) => `“${name}”`))} to ${routeFigures(part)} figures on the way`,
    );
  }
  if (route.constants === 'dataSheet') pieces.push('using the data sheet’s constants');
  if (pieces.length === 0) pieces.push('carrying everything in full');
  return `${pieces.join(', ')}, and rounding the answer to ${figures} ${figures === 1 ? 'figure' : 'figures'}`;
}
